CREATE TABLE "logged_time" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"machine_id" uuid NOT NULL,
	"profile_number" integer NOT NULL,
	"run_id" uuid,
	"coupon_id" uuid,
	"cell_id" uuid,
	"areas" jsonb NOT NULL,
	"pauses_s" double precision DEFAULT 0 NOT NULL,
	"seconds" double precision NOT NULL,
	"counts" boolean DEFAULT true NOT NULL,
	"supersedes_id" uuid,
	"reason" text DEFAULT '' NOT NULL,
	"logged_by_name" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "logged_time_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "logged_time_machine_unique" UNIQUE("shop_id","machine_id","id"),
	CONSTRAINT "logged_time_superseded_once" UNIQUE("shop_id","supersedes_id"),
	CONSTRAINT "logged_time_seconds" CHECK ("logged_time"."pauses_s" >= 0 and "logged_time"."seconds" > "logged_time"."pauses_s"),
	CONSTRAINT "logged_time_subject" CHECK (("logged_time"."run_id" is null) <> ("logged_time"."coupon_id" is null) and ("logged_time"."cell_id" is null or "logged_time"."coupon_id" is not null)),
	CONSTRAINT "logged_time_correction" CHECK (case when "logged_time"."supersedes_id" is null then "logged_time"."counts" else "logged_time"."reason" <> '' end)
);
--> statement-breakpoint
ALTER TABLE "logged_time" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "logged_time" ADD CONSTRAINT "logged_time_machine_fk" FOREIGN KEY ("shop_id","machine_id") REFERENCES "public"."machine"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "logged_time" ADD CONSTRAINT "logged_time_profile_fk" FOREIGN KEY ("shop_id","machine_id","profile_number") REFERENCES "public"."machine_profile"("shop_id","machine_id","number") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "logged_time" ADD CONSTRAINT "logged_time_run_fk" FOREIGN KEY ("shop_id","run_id") REFERENCES "public"."run"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "logged_time" ADD CONSTRAINT "logged_time_coupon_fk" FOREIGN KEY ("shop_id","coupon_id") REFERENCES "public"."coupon"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "logged_time" ADD CONSTRAINT "logged_time_cell_fk" FOREIGN KEY ("shop_id","coupon_id","cell_id") REFERENCES "public"."cell"("shop_id","coupon_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "logged_time" ADD CONSTRAINT "logged_time_supersedes_fk" FOREIGN KEY ("shop_id","machine_id","supersedes_id") REFERENCES "public"."logged_time"("shop_id","machine_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "logged_time" ADD CONSTRAINT "logged_time_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "logged_time_of_machine" ON "logged_time" USING btree ("shop_id","machine_id","created_at");--> statement-breakpoint
CREATE INDEX "logged_time_of_run" ON "logged_time" USING btree ("shop_id","run_id");--> statement-breakpoint
CREATE INDEX "logged_time_of_coupon" ON "logged_time" USING btree ("shop_id","coupon_id");--> statement-breakpoint
CREATE POLICY "logged_time_shop" ON "logged_time" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint

SELECT make_append_only('logged_time'::regclass);
