-- What the application may do, and what nobody may undo. Roles come from db/postgres/roles.sql; this runs as proofplate_owner.
REVOKE ALL ON SCHEMA public FROM PUBLIC;--> statement-breakpoint
GRANT USAGE ON SCHEMA public TO proofplate_app, proofplate_search, proofplate_backup, proofplate_worker;--> statement-breakpoint
ALTER DEFAULT PRIVILEGES IN SCHEMA public REVOKE EXECUTE ON FUNCTIONS FROM PUBLIC;--> statement-breakpoint
ALTER TABLE "coupon" ADD CONSTRAINT "coupon_confirms_revision_fk" FOREIGN KEY ("shop_id","confirms_revision_id") REFERENCES "revision"("shop_id","id");--> statement-breakpoint

-- Every tenant table goes through one of these two: row-level security is forced (the owner too), rights are the least that work.
CREATE FUNCTION secure_tenant_table(target regclass, rights text DEFAULT 'SELECT, INSERT, UPDATE') RETURNS void LANGUAGE plpgsql AS $$
BEGIN
  EXECUTE format('ALTER TABLE %s ENABLE ROW LEVEL SECURITY', target);
  EXECUTE format('ALTER TABLE %s FORCE ROW LEVEL SECURITY', target);
  EXECUTE format('REVOKE ALL ON %s FROM proofplate_app', target);
  EXECUTE format('GRANT %s ON %s TO proofplate_app', rights, target);
  EXECUTE format('GRANT SELECT ON %s TO proofplate_backup', target);
END $$;--> statement-breakpoint
CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION '% of % is refused: its rows are permanent', TG_OP, TG_TABLE_NAME USING ERRCODE = 'PP001';
END $$;--> statement-breakpoint
CREATE FUNCTION make_append_only(target regclass) RETURNS void LANGUAGE plpgsql AS $$
BEGIN
  PERFORM secure_tenant_table(target, 'SELECT, INSERT');
  EXECUTE format('CREATE TRIGGER permanent_rows BEFORE UPDATE OR DELETE ON %s FOR EACH ROW EXECUTE FUNCTION refuse_change()', target);
  EXECUTE format('CREATE TRIGGER permanent_table BEFORE TRUNCATE ON %s FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()', target);
END $$;--> statement-breakpoint

SELECT make_append_only(t::regclass) FROM unnest(ARRAY['ledger_event','sign_off','machine_profile','power_calibration','measurement','coupon_correction','deviation','training_record']) t;--> statement-breakpoint
SELECT secure_tenant_table(t::regclass) FROM unnest(ARRAY['shop','code_counter','outbox','member','invitation','ledger_head','lens','machine','machine_lens','material','finish','material_group','effect','caution','coupon','test_grid','cell','cell_rating','photo','recipe','run','hold','setting_request']) t;--> statement-breakpoint
SELECT secure_tenant_table(t::regclass, 'SELECT, INSERT, UPDATE, DELETE') FROM unnest(ARRAY['idempotency_key','revision','revision_evidence','material_group_material']) t;--> statement-breakpoint

-- Known before any shop is: no row-level security, no direct rights. Reached through narrow SECURITY DEFINER functions only.
REVOKE ALL ON person, session, refresh_token, password_reset, sign_in_throttle, account_event FROM proofplate_app;--> statement-breakpoint
GRANT SELECT ON person, session, refresh_token, password_reset, sign_in_throttle, account_event TO proofplate_backup;--> statement-breakpoint
CREATE TRIGGER permanent_rows BEFORE UPDATE OR DELETE ON account_event FOR EACH ROW EXECUTE FUNCTION refuse_change();--> statement-breakpoint
CREATE TRIGGER permanent_table BEFORE TRUNCATE ON account_event FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();--> statement-breakpoint

-- The ledger is one chain per shop: the next event must continue the head.
CREATE FUNCTION continue_ledger() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE head ledger_head%ROWTYPE;
BEGIN
  SELECT * INTO head FROM ledger_head WHERE shop_id = NEW.shop_id FOR UPDATE;
  IF head.shop_id IS NULL OR NEW.seq <> head.seq + 1 OR NEW.previous_hash <> head.hash THEN
    RAISE EXCEPTION 'ledger event % does not continue the chain', NEW.seq USING ERRCODE = 'PP002';
  END IF;
  RETURN NEW;
END $$;--> statement-breakpoint
CREATE TRIGGER continues_chain BEFORE INSERT ON ledger_event FOR EACH ROW EXECUTE FUNCTION continue_ledger();--> statement-breakpoint
CREATE TRIGGER permanent_rows BEFORE DELETE ON ledger_head FOR EACH ROW EXECUTE FUNCTION refuse_change();--> statement-breakpoint
CREATE TRIGGER permanent_table BEFORE TRUNCATE ON ledger_head FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();--> statement-breakpoint

-- Revisions: only a draft changes or goes; afterwards only the state moves, along the arrows of the state machine.
CREATE FUNCTION guard_revision() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE moving text[] := ARRAY['state','version','approved_at','withdrawn_at','superseded_at','effective_from','review_due'];
BEGIN
  IF TG_OP = 'INSERT' THEN
    IF NEW.state <> 'draft' THEN RAISE EXCEPTION 'a revision begins as a draft' USING ERRCODE = 'PP003'; END IF;
    RETURN NEW;
  END IF;
  IF TG_OP = 'DELETE' THEN
    IF OLD.state <> 'draft' THEN RAISE EXCEPTION 'only a draft can be deleted' USING ERRCODE = 'PP001'; END IF;
    RETURN OLD;
  END IF;
  IF OLD.state <> NEW.state AND (OLD.state, NEW.state) NOT IN (
    ('draft','in_review'), ('in_review','approved'), ('in_review','scheduled'), ('in_review','returned'),
    ('scheduled','approved'), ('scheduled','withdrawn'), ('approved','superseded'), ('approved','withdrawn')) THEN
    RAISE EXCEPTION 'a revision cannot go from % to %', OLD.state, NEW.state USING ERRCODE = 'PP003';
  END IF;
  IF OLD.state <> 'draft' AND (to_jsonb(NEW) - moving) IS DISTINCT FROM (to_jsonb(OLD) - moving) THEN
    RAISE EXCEPTION 'a submitted revision never changes' USING ERRCODE = 'PP001';
  END IF;
  IF OLD.state <> 'draft' AND OLD.state <> 'in_review' AND (NEW.effective_from, NEW.review_due) IS DISTINCT FROM (OLD.effective_from, OLD.review_due) THEN
    RAISE EXCEPTION 'the dates of a signed revision never change' USING ERRCODE = 'PP001';
  END IF;
  IF NEW.shop_id <> OLD.shop_id OR NEW.id <> OLD.id OR NEW.recipe_id <> OLD.recipe_id OR NEW.created_by <> OLD.created_by THEN
    RAISE EXCEPTION 'a revision keeps its recipe and author' USING ERRCODE = 'PP001';
  END IF;
  RETURN NEW;
END $$;--> statement-breakpoint
CREATE TRIGGER guarded_rows BEFORE INSERT OR UPDATE OR DELETE ON revision FOR EACH ROW EXECUTE FUNCTION guard_revision();--> statement-breakpoint
CREATE TRIGGER permanent_table BEFORE TRUNCATE ON revision FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();--> statement-breakpoint
CREATE FUNCTION guard_evidence() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE row_ revision_evidence%ROWTYPE; held text;
BEGIN
  IF TG_OP = 'UPDATE' THEN RAISE EXCEPTION 'evidence is linked or unlinked, never changed' USING ERRCODE = 'PP001'; END IF;
  IF TG_OP = 'DELETE' THEN row_ := OLD; ELSE row_ := NEW; END IF;
  SELECT state INTO held FROM revision WHERE shop_id = row_.shop_id AND id = row_.revision_id;
  IF held <> 'draft' THEN RAISE EXCEPTION 'the evidence of a submitted revision never changes' USING ERRCODE = 'PP001'; END IF;
  RETURN row_;
END $$;--> statement-breakpoint
CREATE TRIGGER guarded_rows BEFORE INSERT OR UPDATE OR DELETE ON revision_evidence FOR EACH ROW EXECUTE FUNCTION guard_evidence();--> statement-breakpoint
CREATE TRIGGER permanent_table BEFORE TRUNCATE ON revision_evidence FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();--> statement-breakpoint

-- Coupons: forward only, and sealed for good with all that hangs on them.
CREATE FUNCTION guard_coupon() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'DELETE' THEN RAISE EXCEPTION 'a coupon is never deleted' USING ERRCODE = 'PP001'; END IF;
  IF OLD.state = 'sealed' THEN RAISE EXCEPTION 'a sealed coupon never changes' USING ERRCODE = 'PP001'; END IF;
  IF OLD.state <> NEW.state AND (OLD.state, NEW.state) NOT IN (('planned','marked'), ('marked','inspected'), ('inspected','sealed')) THEN
    RAISE EXCEPTION 'a coupon cannot go from % to %', OLD.state, NEW.state USING ERRCODE = 'PP003';
  END IF;
  IF NEW.shop_id <> OLD.shop_id OR NEW.id <> OLD.id OR NEW.code <> OLD.code THEN
    RAISE EXCEPTION 'a coupon keeps its code' USING ERRCODE = 'PP001';
  END IF;
  RETURN NEW;
END $$;--> statement-breakpoint
CREATE TRIGGER guarded_rows BEFORE UPDATE OR DELETE ON coupon FOR EACH ROW EXECUTE FUNCTION guard_coupon();--> statement-breakpoint
CREATE FUNCTION coupon_is_sealed(shop uuid, coupon_ uuid) RETURNS boolean LANGUAGE sql STABLE AS $$
  SELECT state = 'sealed' FROM coupon WHERE shop_id = shop AND id = coupon_
$$;--> statement-breakpoint
CREATE FUNCTION guard_coupon_part() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE part jsonb; coupon_ uuid;
BEGIN
  IF TG_OP = 'DELETE' THEN RAISE EXCEPTION 'parts of a coupon are never deleted' USING ERRCODE = 'PP001'; END IF;
  part := to_jsonb(NEW);
  coupon_ := (part ->> 'coupon_id')::uuid;
  IF coupon_ IS NULL THEN
    SELECT c.coupon_id INTO coupon_ FROM cell c WHERE c.shop_id = NEW.shop_id AND c.id = (part ->> 'cell_id')::uuid;
  END IF;
  IF coupon_is_sealed(NEW.shop_id, coupon_) THEN
    RAISE EXCEPTION '% of a sealed coupon never changes', TG_TABLE_NAME USING ERRCODE = 'PP001';
  END IF;
  RETURN NEW;
END $$;--> statement-breakpoint
CREATE TRIGGER guarded_rows BEFORE INSERT OR UPDATE OR DELETE ON test_grid FOR EACH ROW EXECUTE FUNCTION guard_coupon_part();--> statement-breakpoint
CREATE TRIGGER guarded_rows BEFORE INSERT OR UPDATE OR DELETE ON cell FOR EACH ROW EXECUTE FUNCTION guard_coupon_part();--> statement-breakpoint
CREATE TRIGGER guarded_rows BEFORE INSERT OR UPDATE OR DELETE ON cell_rating FOR EACH ROW EXECUTE FUNCTION guard_coupon_part();--> statement-breakpoint
CREATE TRIGGER guarded_rows BEFORE INSERT OR UPDATE OR DELETE ON photo FOR EACH ROW EXECUTE FUNCTION guard_coupon_part();--> statement-breakpoint
-- After sealing a measurement may still be added, as a linked record that says why.
CREATE FUNCTION guard_late_measurement() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE coupon_ uuid;
BEGIN
  SELECT c.coupon_id INTO coupon_ FROM cell c WHERE c.shop_id = NEW.shop_id AND c.id = NEW.cell_id;
  IF coupon_is_sealed(NEW.shop_id, coupon_) AND NEW.reason = '' THEN
    RAISE EXCEPTION 'a measurement added to a sealed coupon needs a reason' USING ERRCODE = 'PP001';
  END IF;
  RETURN NEW;
END $$;--> statement-breakpoint
CREATE TRIGGER late_needs_reason BEFORE INSERT ON measurement FOR EACH ROW EXECUTE FUNCTION guard_late_measurement();--> statement-breakpoint
DO $$ DECLARE t text; BEGIN
  FOREACH t IN ARRAY ARRAY['coupon','test_grid','cell','cell_rating','photo','recipe','run','hold'] LOOP
    EXECUTE format('CREATE TRIGGER permanent_table BEFORE TRUNCATE ON %I FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()', t);
  END LOOP;
END $$;--> statement-breakpoint

-- Finished runs and released holds are history; only a bad result may still be told of a run.
CREATE FUNCTION guard_run() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE told text[] := ARRAY['bad_result','version'];
BEGIN
  IF TG_OP = 'DELETE' THEN RAISE EXCEPTION 'a run is never deleted' USING ERRCODE = 'PP001'; END IF;
  IF OLD.state <> 'started' AND (to_jsonb(NEW) - told) IS DISTINCT FROM (to_jsonb(OLD) - told) THEN
    RAISE EXCEPTION 'a finished run never changes' USING ERRCODE = 'PP001';
  END IF;
  RETURN NEW;
END $$;--> statement-breakpoint
CREATE TRIGGER guarded_rows BEFORE UPDATE OR DELETE ON run FOR EACH ROW EXECUTE FUNCTION guard_run();--> statement-breakpoint
CREATE FUNCTION guard_hold() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'DELETE' THEN RAISE EXCEPTION 'a hold is never deleted' USING ERRCODE = 'PP001'; END IF;
  IF OLD.released_at IS NOT NULL THEN RAISE EXCEPTION 'a released hold never changes' USING ERRCODE = 'PP001'; END IF;
  RETURN NEW;
END $$;--> statement-breakpoint
CREATE TRIGGER guarded_rows BEFORE UPDATE OR DELETE ON hold FOR EACH ROW EXECUTE FUNCTION guard_hold();
