DROP INDEX "ledger_event_subject";--> statement-breakpoint
CREATE INDEX "ledger_event_code" ON "ledger_event" USING btree ("shop_id","subject_code","seq");--> statement-breakpoint
CREATE INDEX "ledger_event_actor" ON "ledger_event" USING btree ("shop_id","actor_member_id","seq");--> statement-breakpoint
CREATE INDEX "ledger_event_subject" ON "ledger_event" USING btree ("shop_id","subject_id","seq");