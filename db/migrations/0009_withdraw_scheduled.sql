-- A revision that is yet to take effect can be stopped (docs/adr/0007).
CREATE OR REPLACE FUNCTION guard_revision() RETURNS trigger LANGUAGE plpgsql AS $$
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
  IF OLD.state <> 'draft' AND OLD.state = NEW.state AND
    (NEW.approved_at, NEW.withdrawn_at, NEW.superseded_at, NEW.effective_from, NEW.review_due)
    IS DISTINCT FROM (OLD.approved_at, OLD.withdrawn_at, OLD.superseded_at, OLD.effective_from, OLD.review_due) THEN
    RAISE EXCEPTION 'the times of a submitted revision move with its state' USING ERRCODE = 'PP001';
  END IF;
  IF (OLD.approved_at IS NOT NULL AND NEW.approved_at IS DISTINCT FROM OLD.approved_at)
    OR (OLD.withdrawn_at IS NOT NULL AND NEW.withdrawn_at IS DISTINCT FROM OLD.withdrawn_at)
    OR (OLD.superseded_at IS NOT NULL AND NEW.superseded_at IS DISTINCT FROM OLD.superseded_at) THEN
    RAISE EXCEPTION 'the time of a signature never changes' USING ERRCODE = 'PP001';
  END IF;
  IF NEW.shop_id <> OLD.shop_id OR NEW.id <> OLD.id OR NEW.recipe_id <> OLD.recipe_id OR NEW.created_by <> OLD.created_by THEN
    RAISE EXCEPTION 'a revision keeps its recipe and author' USING ERRCODE = 'PP001';
  END IF;
  RETURN NEW;
END $$;
