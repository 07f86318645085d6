-- People, sessions and invitations are needed before any shop is known. The api has no right on these tables: it calls the functions
-- below, each of which does one thing, with a fixed search path. Hashing and token making stay in the api.
CREATE FUNCTION account_person_by_email(p_email text)
  RETURNS TABLE (id uuid, email text, name text, password_hash text, session_version int)
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
  SELECT id, email, name, password_hash, session_version FROM person WHERE lower(email) = lower(p_email)
$$;--> statement-breakpoint
CREATE FUNCTION account_person(p_person uuid)
  RETURNS TABLE (id uuid, email text, name text, password_hash text, session_version int)
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
  SELECT id, email, name, password_hash, session_version FROM person WHERE id = p_person
$$;--> statement-breakpoint
-- False when the address is taken.
CREATE FUNCTION account_create_person(p_person uuid, p_email text, p_name text, p_password_hash text) RETURNS boolean
  LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
BEGIN
  INSERT INTO person (id, email, name, password_hash) VALUES (p_person, p_email, p_name, p_password_hash) ON CONFLICT DO NOTHING;
  RETURN FOUND;
END $$;--> statement-breakpoint
-- Keeps a stored hash up to date with the configured cost; ends no session.
CREATE FUNCTION account_rehash(p_person uuid, p_old_hash text, p_new_hash text) RETURNS void
  LANGUAGE sql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
  UPDATE person SET password_hash = p_new_hash WHERE id = p_person AND password_hash = p_old_hash
$$;--> statement-breakpoint
CREATE FUNCTION account_record_event(p_person uuid, p_kind text, p_address text, p_detail jsonb) RETURNS void
  LANGUAGE sql VOLATILE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
  INSERT INTO account_event (id, person_id, kind, address, detail) VALUES (gen_random_uuid(), p_person, p_kind, p_address::inet, p_detail)
$$;--> statement-breakpoint

-- The shops of one person. The only function here that looks across shops, hence its owner.
CREATE FUNCTION account_memberships(p_person uuid)
  RETURNS TABLE (shop_id uuid, shop_name text, member_id uuid, role text, printed_name text)
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
  SELECT m.shop_id, s.name, m.id, m.role, m.printed_name FROM member m JOIN shop s ON s.id = m.shop_id
  WHERE m.person_id = p_person AND m.state = 'active' ORDER BY lower(s.name), m.shop_id
$$;--> statement-breakpoint
GRANT SELECT (shop_id, id, person_id, role, printed_name, state) ON member TO proofplate_search;--> statement-breakpoint
GRANT SELECT (id, name) ON shop TO proofplate_search;--> statement-breakpoint
GRANT CREATE ON SCHEMA public TO proofplate_search;--> statement-breakpoint
ALTER FUNCTION account_memberships(uuid) OWNER TO proofplate_search;--> statement-breakpoint
REVOKE CREATE ON SCHEMA public FROM proofplate_search;--> statement-breakpoint

-- Addresses of the people of the transaction's shop.
CREATE FUNCTION account_addresses_of_shop() RETURNS TABLE (member_id uuid, email text)
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
  SELECT m.id, p.email FROM member m JOIN person p ON p.id = m.person_id
  WHERE m.shop_id = (SELECT current_setting('app.shop_id')::uuid)
$$;--> statement-breakpoint

CREATE FUNCTION account_open_session(
  p_session uuid, p_person uuid, p_shop uuid, p_member uuid, p_user_agent text, p_token_hash text, p_lives interval, p_idle interval)
  RETURNS void LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
BEGIN
  INSERT INTO session (id, person_id, shop_id, member_id, user_agent, expires_at)
    VALUES (p_session, p_person, p_shop, p_member, left(p_user_agent, 300), now() + p_lives);
  INSERT INTO refresh_token (token_hash, session_id, expires_at) VALUES (p_token_hash, p_session, now() + least(p_idle, p_lives));
END $$;--> statement-breakpoint

-- Who stands behind a session at this moment; no row when it is over, when the person ended all sessions, or when the member was removed.
CREATE FUNCTION account_session(p_session uuid, p_version int)
  RETURNS TABLE (person_id uuid, email text, person_name text, shop_id uuid, member_id uuid, role text, printed_name text)
  LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
DECLARE held session%ROWTYPE; owner_ person%ROWTYPE;
BEGIN
  SELECT * INTO held FROM session s WHERE s.id = p_session AND s.ended_at IS NULL AND s.expires_at > now();
  IF NOT FOUND THEN RETURN; END IF;
  SELECT * INTO owner_ FROM person p WHERE p.id = held.person_id AND p.session_version = p_version;
  IF NOT FOUND THEN RETURN; END IF;
  PERFORM set_config('app.shop_id', held.shop_id::text, true);
  RETURN QUERY SELECT owner_.id, owner_.email, owner_.name, m.shop_id, m.id, m.role, m.printed_name
    FROM member m WHERE m.shop_id = held.shop_id AND m.id = held.member_id AND m.state = 'active';
END $$;--> statement-breakpoint

-- Uses a refresh token. rotated: p_new_hash is its successor. grace: used a moment ago, here is the sealed successor it got.
-- reused: an old token came back, so the session is ended. over: the session or the token has run out. unknown: never given out.
CREATE FUNCTION account_rotate(p_hash text, p_new_hash text, p_sealed text, p_idle interval, p_grace interval)
  RETURNS TABLE (outcome text, session_id uuid, person_id uuid, session_version int, sealed_successor text)
  LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
DECLARE token refresh_token%ROWTYPE; held session%ROWTYPE; version_ int; at_ timestamptz;
BEGIN
  SELECT * INTO token FROM refresh_token t WHERE t.token_hash = p_hash FOR UPDATE;
  IF NOT FOUND THEN RETURN QUERY SELECT 'unknown', NULL::uuid, NULL::uuid, NULL::int, NULL::text; RETURN; END IF;
  SELECT * INTO held FROM session s WHERE s.id = token.session_id FOR UPDATE;
  SELECT p.session_version INTO version_ FROM person p WHERE p.id = held.person_id;
  at_ := clock_timestamp();
  IF held.ended_at IS NOT NULL OR held.expires_at <= at_ THEN
    RETURN QUERY SELECT 'over', held.id, held.person_id, version_, NULL::text; RETURN;
  END IF;
  IF token.used_at IS NULL THEN
    IF token.expires_at <= at_ THEN RETURN QUERY SELECT 'over', held.id, held.person_id, version_, NULL::text; RETURN; END IF;
    UPDATE refresh_token t SET successor = NULL WHERE t.session_id = held.id AND t.used_at < at_ - p_grace AND t.successor IS NOT NULL;
    UPDATE refresh_token t SET used_at = at_, successor = p_sealed WHERE t.token_hash = p_hash;
    INSERT INTO refresh_token (token_hash, session_id, expires_at) VALUES (p_new_hash, held.id, least(at_ + p_idle, held.expires_at));
    UPDATE session s SET last_seen_at = at_ WHERE s.id = held.id;
    RETURN QUERY SELECT 'rotated', held.id, held.person_id, version_, NULL::text; RETURN;
  END IF;
  IF token.used_at > at_ - p_grace AND token.successor IS NOT NULL THEN
    RETURN QUERY SELECT 'grace', held.id, held.person_id, version_, token.successor; RETURN;
  END IF;
  UPDATE session s SET ended_at = at_, ended_because = 'token reused' WHERE s.id = held.id;
  RETURN QUERY SELECT 'reused', held.id, held.person_id, version_, NULL::text;
END $$;--> statement-breakpoint

CREATE FUNCTION account_end_session(p_session uuid, p_because text) RETURNS void
  LANGUAGE sql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
  UPDATE session SET ended_at = now(), ended_because = p_because WHERE id = p_session AND ended_at IS NULL
$$;--> statement-breakpoint
CREATE FUNCTION account_session_of_token(p_hash text) RETURNS TABLE (session_id uuid, person_id uuid)
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
  SELECT s.id, s.person_id FROM refresh_token t JOIN session s ON s.id = t.session_id WHERE t.token_hash = p_hash
$$;--> statement-breakpoint
-- Access tokens carry the version, so raising it ends them at once too.
CREATE FUNCTION account_end_all_sessions(p_person uuid, p_because text) RETURNS void
  LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
BEGIN
  UPDATE person SET session_version = session_version + 1 WHERE id = p_person;
  UPDATE session SET ended_at = now(), ended_because = p_because WHERE person_id = p_person AND ended_at IS NULL;
END $$;--> statement-breakpoint
-- Ends the sessions of one member of the transaction's shop.
CREATE FUNCTION account_end_member_sessions(p_member uuid, p_because text) RETURNS void
  LANGUAGE sql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
  UPDATE session SET ended_at = now(), ended_because = p_because
  WHERE shop_id = (SELECT current_setting('app.shop_id')::uuid) AND member_id = p_member AND ended_at IS NULL
$$;--> statement-breakpoint

-- A new reset link makes the earlier ones useless.
CREATE FUNCTION account_open_reset(p_hash text, p_person uuid, p_lives interval) RETURNS void
  LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
BEGIN
  UPDATE password_reset SET used_at = now() WHERE person_id = p_person AND used_at IS NULL;
  INSERT INTO password_reset (token_hash, person_id, expires_at) VALUES (p_hash, p_person, now() + p_lives);
END $$;--> statement-breakpoint
-- Sets the password and ends every session; null when the link was used or has run out.
CREATE FUNCTION account_reset_password(p_hash text, p_password_hash text) RETURNS uuid
  LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
DECLARE whose uuid;
BEGIN
  UPDATE password_reset SET used_at = now() WHERE token_hash = p_hash AND used_at IS NULL AND expires_at > now()
    RETURNING person_id INTO whose;
  IF whose IS NULL THEN RETURN NULL; END IF;
  UPDATE person SET password_hash = p_password_hash, password_changed_at = now() WHERE id = whose;
  PERFORM account_end_all_sessions(whose, 'password reset');
  RETURN whose;
END $$;--> statement-breakpoint

-- Counts one try before it is made, so that parallel tries cannot pass together. 0: go on. Above 0: seconds to wait.
-- Below 0: too many failures in a row, only a reset helps. Beyond p_free tries each one doubles the pause.
CREATE FUNCTION account_take_try(p_subject text, p_limit int, p_window interval, p_free int, p_row_limit int) RETURNS int
  LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
DECLARE held sign_in_throttle%ROWTYPE; at_ timestamptz;
BEGIN
  INSERT INTO sign_in_throttle (subject) VALUES (p_subject) ON CONFLICT DO NOTHING;
  SELECT * INTO held FROM sign_in_throttle t WHERE t.subject = p_subject FOR UPDATE;
  at_ := clock_timestamp();
  IF held.consecutive_failures >= p_row_limit THEN RETURN -1; END IF;
  IF held.blocked_until > at_ THEN RETURN ceil(extract(epoch FROM held.blocked_until - at_))::int; END IF;
  IF held.window_started_at <= at_ - p_window THEN held.failures := 0; held.window_started_at := at_; END IF;
  held.failures := held.failures + 1;
  UPDATE sign_in_throttle t SET
    failures = held.failures,
    consecutive_failures = t.consecutive_failures + 1,
    window_started_at = held.window_started_at,
    blocked_until = CASE
      WHEN held.failures >= p_limit THEN held.window_started_at + p_window
      WHEN held.failures > p_free THEN at_ + make_interval(secs => least(power(2, held.failures - p_free), 60))
      ELSE NULL END
  WHERE t.subject = p_subject;
  RETURN 0;
END $$;--> statement-breakpoint
-- The try succeeded: an account starts afresh (p_clear), an address only gets this one try back.
CREATE FUNCTION account_try_succeeded(p_subject text, p_clear boolean) RETURNS void
  LANGUAGE sql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
  UPDATE sign_in_throttle SET
    failures = CASE WHEN p_clear THEN 0 ELSE greatest(failures - 1, 0) END,
    consecutive_failures = 0,
    blocked_until = CASE WHEN p_clear THEN NULL ELSE blocked_until END
  WHERE subject = p_subject
$$;--> statement-breakpoint

DO $$ DECLARE f regprocedure; BEGIN
  FOR f IN SELECT oid::regprocedure FROM pg_proc WHERE pronamespace = 'public'::regnamespace AND proname LIKE 'account\_%' LOOP
    EXECUTE format('REVOKE ALL ON FUNCTION %s FROM PUBLIC', f);
    EXECUTE format('GRANT EXECUTE ON FUNCTION %s TO proofplate_app', f);
  END LOOP;
END $$;
