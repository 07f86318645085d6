CREATE TABLE "part_set_up" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"run_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"lens_id" uuid NOT NULL,
	"entered" jsonb NOT NULL,
	"ground" jsonb NOT NULL,
	"results" jsonb NOT NULL,
	"saved_by_name" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "part_set_up_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "part_set_up_number_unique" UNIQUE("shop_id","run_id","number"),
	CONSTRAINT "part_set_up_number" CHECK ("part_set_up"."number" >= 1)
);
--> statement-breakpoint
ALTER TABLE "part_set_up" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "part_set_up" ADD CONSTRAINT "part_set_up_run_fk" FOREIGN KEY ("shop_id","run_id") REFERENCES "public"."run"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "part_set_up" ADD CONSTRAINT "part_set_up_lens_fk" FOREIGN KEY ("shop_id","lens_id") REFERENCES "public"."lens"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "part_set_up" ADD CONSTRAINT "part_set_up_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE POLICY "part_set_up_shop" ON "part_set_up" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint

SELECT make_append_only('part_set_up'::regclass);--> statement-breakpoint
-- The part of a finished run is history with it; the lock keeps the run from ending between the look and the row.
CREATE FUNCTION guard_part_set_up() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE held text;
BEGIN
  SELECT state INTO held FROM run WHERE shop_id = NEW.shop_id AND id = NEW.run_id FOR SHARE;
  IF held <> 'started' THEN RAISE EXCEPTION 'a finished run takes no other part set-up' USING ERRCODE = 'PP001'; END IF;
  RETURN NEW;
END $$;--> statement-breakpoint
CREATE TRIGGER guarded_rows BEFORE INSERT ON part_set_up FOR EACH ROW EXECUTE FUNCTION guard_part_set_up();
