CREATE TABLE "spot_measurement" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"machine_lens_id" uuid NOT NULL,
	"spot_um" double precision NOT NULL,
	"standard_error_um" double precision,
	"method" text NOT NULL,
	"measured_on" date NOT NULL,
	"coupon_id" uuid,
	"fit" jsonb,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "spot_measurement_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "spot_measurement_sizes" CHECK ("spot_measurement"."spot_um" > 0 and coalesce("spot_measurement"."standard_error_um" >= 0, true)),
	CONSTRAINT "spot_measurement_fit_of_coupon" CHECK (("spot_measurement"."coupon_id" is null) = ("spot_measurement"."fit" is null))
);
--> statement-breakpoint
ALTER TABLE "spot_measurement" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "spot_measurement" ADD CONSTRAINT "spot_measurement_lens_fk" FOREIGN KEY ("shop_id","machine_lens_id") REFERENCES "public"."machine_lens"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "spot_measurement" ADD CONSTRAINT "spot_measurement_coupon_fk" FOREIGN KEY ("shop_id","coupon_id") REFERENCES "public"."coupon"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "spot_measurement" ADD CONSTRAINT "spot_measurement_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "spot_measurement_lens" ON "spot_measurement" USING btree ("shop_id","machine_lens_id","created_at");--> statement-breakpoint
CREATE POLICY "spot_measurement_shop" ON "spot_measurement" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint

SELECT make_append_only('spot_measurement'::regclass);
