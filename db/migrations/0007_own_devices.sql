-- A signed-in person sets a new password: other devices are signed out at once and reset links that lie about stop working.
CREATE FUNCTION account_change_password(p_person uuid, p_password_hash text, p_kept_session uuid) RETURNS void
  LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
BEGIN
  UPDATE person SET password_hash = p_password_hash, password_changed_at = now() WHERE id = p_person;
  UPDATE password_reset SET used_at = now() WHERE person_id = p_person AND used_at IS NULL;
  UPDATE session SET ended_at = now(), ended_because = 'password changed'
    WHERE person_id = p_person AND id <> p_kept_session AND ended_at IS NULL;
END $$;--> statement-breakpoint
-- Where one person is signed in, the latest use first. A session whose last token has run out can no longer be used.
CREATE FUNCTION account_live_sessions(p_person uuid)
  RETURNS TABLE (id uuid, shop_id uuid, user_agent text, created_at timestamptz, last_seen_at timestamptz, expires_at timestamptz)
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
  SELECT s.id, s.shop_id, s.user_agent, s.created_at, s.last_seen_at, max(t.expires_at)
  FROM session s JOIN refresh_token t ON t.session_id = s.id AND t.used_at IS NULL AND t.expires_at > now()
  WHERE s.person_id = p_person AND s.ended_at IS NULL AND s.expires_at > now()
  GROUP BY s.id ORDER BY s.last_seen_at DESC, s.id
$$;--> statement-breakpoint
-- False when the person has no such session that is still open.
CREATE FUNCTION account_end_own_session(p_person uuid, p_session uuid, p_because text) RETURNS boolean
  LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
BEGIN
  UPDATE session SET ended_at = now(), ended_because = p_because WHERE id = p_session AND person_id = p_person AND ended_at IS NULL;
  RETURN FOUND;
END $$;--> statement-breakpoint
DO $$ DECLARE f regprocedure; BEGIN
  FOREACH f IN ARRAY ARRAY['account_change_password(uuid,text,uuid)', 'account_live_sessions(uuid)', 'account_end_own_session(uuid,uuid,text)']::regprocedure[] LOOP
    EXECUTE format('REVOKE ALL ON FUNCTION %s FROM PUBLIC', f);
    EXECUTE format('GRANT EXECUTE ON FUNCTION %s TO proofplate_app', f);
  END LOOP;
END $$;
