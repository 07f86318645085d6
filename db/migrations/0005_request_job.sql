ALTER TABLE "setting_request" ADD COLUMN "job_reference" text DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE "setting_request" ADD COLUMN "needed_on" date;--> statement-breakpoint
CREATE INDEX "setting_request_recent" ON "setting_request" USING btree ("shop_id","state","created_at");