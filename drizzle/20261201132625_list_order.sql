DROP INDEX "inspections_firm_id_scheduled_at_id_index";--> statement-breakpoint
DROP INDEX "inspections_firm_id_state_scheduled_at_id_index";--> statement-breakpoint
CREATE INDEX "inspections_firm_id_scheduled_at_id_index" ON "inspections" USING btree ("firm_id","scheduled_at","id");--> statement-breakpoint
CREATE INDEX "inspections_firm_id_state_scheduled_at_id_index" ON "inspections" USING btree ("firm_id","state","scheduled_at","id");