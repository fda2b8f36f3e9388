DROP INDEX "inspections_search_words_index";--> statement-breakpoint
CREATE INDEX "inspections_firm_id_state_number_id_index" ON "inspections" USING btree ("firm_id","state","number","id");--> statement-breakpoint
CREATE INDEX "inspections_search_words_index" ON "inspections" USING gin ("search_words") WITH (fastupdate=false);