-- One line of the firm's record, chained to the one before. The hash covers every field; the instant as microseconds.
CREATE FUNCTION audit_hash(
  previous_hash text, firm_id uuid, "order" bigint, inspection_id uuid, actor_kind text, actor_id uuid, actor_name text,
  kind text, detail jsonb, at timestamptz
) RETURNS text LANGUAGE sql IMMUTABLE PARALLEL SAFE AS $$
  SELECT encode(sha256(convert_to(jsonb_build_array(
    previous_hash, firm_id, "order", inspection_id, actor_kind, actor_id, actor_name, kind, detail,
    extract(epoch FROM at)::text
  )::text, 'UTF8')), 'hex')
$$;--> statement-breakpoint

-- The only way into audit_events. Who did it is read from the transaction's actor, never from the caller. Lines of one
-- firm are written one after the other, so the lock is held until the transaction ends: record last.
CREATE FUNCTION record_audit(about uuid, happened text, details jsonb) RETURNS void
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  firm uuid := app_firm();
  last audit_events%ROWTYPE;
  line audit_events%ROWTYPE;
BEGIN
  IF firm IS NULL OR app_kind() IS NULL THEN
    RAISE EXCEPTION 'an audit event needs a firm and somebody who did it';
  END IF;
  IF app_kind() = 'recipient' AND about IS DISTINCT FROM app_granted_inspection() THEN
    RAISE EXCEPTION 'a recipient leaves a trace in the inspection of the grant only';
  END IF;
  PERFORM pg_advisory_xact_lock(hashtextextended('audit ' || firm::text, 0));
  SELECT * INTO last FROM audit_events WHERE firm_id = firm ORDER BY "order" DESC LIMIT 1;
  line.firm_id := firm;
  line."order" := coalesce(last."order", 0) + 1;
  line.inspection_id := about;
  line.actor_kind := app_kind();
  line.actor_id := coalesce(app_membership(), app_grant());
  line.actor_name := coalesce(app_name(), '');
  line.kind := happened;
  line.detail := details;
  line.at := clock_timestamp();
  line.previous_hash := coalesce(last.hash, '');
  line.hash := audit_hash(line.previous_hash, firm, line."order", about, line.actor_kind, line.actor_id,
    line.actor_name, happened, details, line.at);
  INSERT INTO audit_events SELECT line.*;
END $$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION record_audit(uuid, text, jsonb) FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION record_audit(uuid, text, jsonb) TO ohmstead_app;--> statement-breakpoint

-- The firm's inspections for the list. Runs as the owner with the firm in the query itself: row security keeps the
-- planner from using the word index, because text search is not marked leakproof.
CREATE VIEW listed_inspections AS
  SELECT firm_id, id, number, state, address, time_zone, scheduled_at, year_built, search_words
  FROM inspections
  WHERE firm_id = (SELECT app_staff_firm());--> statement-breakpoint
GRANT SELECT ON listed_inspections TO ohmstead_app;
