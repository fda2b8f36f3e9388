-- Who asks, as db/with-actor.ts set it for this transaction. Unset reads as null, and null matches no row.
CREATE FUNCTION app_firm() RETURNS uuid LANGUAGE sql STABLE PARALLEL SAFE AS
  $$ SELECT nullif(current_setting('app.firm_id', true), '')::uuid $$;--> statement-breakpoint
CREATE FUNCTION app_user() RETURNS uuid LANGUAGE sql STABLE PARALLEL SAFE AS
  $$ SELECT nullif(current_setting('app.user_id', true), '')::uuid $$;--> statement-breakpoint
CREATE FUNCTION app_membership() RETURNS uuid LANGUAGE sql STABLE PARALLEL SAFE AS
  $$ SELECT nullif(current_setting('app.membership_id', true), '')::uuid $$;--> statement-breakpoint
CREATE FUNCTION app_grant() RETURNS uuid LANGUAGE sql STABLE PARALLEL SAFE AS
  $$ SELECT nullif(current_setting('app.grant_id', true), '')::uuid $$;--> statement-breakpoint
CREATE FUNCTION app_kind() RETURNS text LANGUAGE sql STABLE PARALLEL SAFE AS
  $$ SELECT nullif(current_setting('app.kind', true), '') $$;--> statement-breakpoint
CREATE FUNCTION app_name() RETURNS text LANGUAGE sql STABLE PARALLEL SAFE AS
  $$ SELECT nullif(current_setting('app.name', true), '') $$;--> statement-breakpoint

-- The firm whose rows a member or a job may work on; null for a recipient and for a visitor.
CREATE FUNCTION app_staff_firm() RETURNS uuid LANGUAGE sql STABLE PARALLEL SAFE AS
  $$ SELECT CASE WHEN app_kind() IN ('member', 'system') THEN app_firm() END $$;--> statement-breakpoint

-- Every table with a firm, and those before it, is forced. The migrating role owns the tables and is the one that
-- security-definer functions run as: its policy lets it through, and the app role can only call it by those functions.
DO $$
DECLARE
  name text;
BEGIN
  FOREACH name IN ARRAY ARRAY[
    'firms', 'memberships', 'adoptions', 'inspections', 'inspection_inspectors', 'visits', 'parties', 'structures',
    'areas', 'panels', 'circuits', 'receptacles', 'photos', 'readings', 'skips', 'notices', 'decisions',
    'report_versions', 'renders', 'report_files', 'grants', 'messages', 'sync_clients', 'mutation_log', 'conflicts',
    'audit_events', 'users', 'sessions', 'link_tokens', 'rate_limits'
  ] LOOP
    EXECUTE format('ALTER TABLE %I ENABLE ROW LEVEL SECURITY', name);
    EXECUTE format('ALTER TABLE %I FORCE ROW LEVEL SECURITY', name);
    EXECUTE format('CREATE POLICY owner_all ON %I TO CURRENT_USER USING (true) WITH CHECK (true)', name);
  END LOOP;

  FOREACH name IN ARRAY ARRAY[
    'memberships', 'adoptions', 'inspections', 'inspection_inspectors', 'visits', 'parties', 'structures', 'areas',
    'panels', 'circuits', 'receptacles', 'photos', 'readings', 'skips', 'notices', 'decisions', 'report_versions',
    'renders', 'report_files', 'grants', 'messages', 'sync_clients', 'mutation_log', 'conflicts', 'audit_events'
  ] LOOP
    EXECUTE format(
      'CREATE POLICY staff_of_firm ON %I TO ohmstead_app
         USING (firm_id = (SELECT app_staff_firm())) WITH CHECK (firm_id = (SELECT app_staff_firm()))', name);
  END LOOP;
END $$;--> statement-breakpoint

CREATE POLICY staff_of_firm ON firms TO ohmstead_app
  USING (id = (SELECT app_staff_firm())) WITH CHECK (id = (SELECT app_staff_firm()));--> statement-breakpoint

-- Names and addresses of people of the firm in hand; never a password hash.
CREATE POLICY people_of_firm ON users FOR SELECT TO ohmstead_app
  USING (EXISTS (
    SELECT 1 FROM memberships WHERE memberships.firm_id = (SELECT app_staff_firm()) AND memberships.user_id = users.id
  ));--> statement-breakpoint

-- The inspection that a recipient's grant opens now: a grant revoked or run out opens none.
CREATE FUNCTION app_granted_inspection() RETURNS uuid LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS
  $$ SELECT inspection_id FROM grants
     WHERE app_kind() = 'recipient' AND firm_id = app_firm() AND id = app_grant()
       AND revoked_at IS NULL AND until > now() $$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION app_granted_inspection() FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION app_granted_inspection() TO ohmstead_app;--> statement-breakpoint

-- A recipient reads what was released of that one inspection, and nothing of the draft.
CREATE POLICY recipient_reads ON inspections FOR SELECT TO ohmstead_app
  USING (firm_id = (SELECT app_firm()) AND id = (SELECT app_granted_inspection()) AND released_at IS NOT NULL);--> statement-breakpoint
CREATE POLICY recipient_reads ON report_versions FOR SELECT TO ohmstead_app
  USING (firm_id = (SELECT app_firm()) AND inspection_id = (SELECT app_granted_inspection()));--> statement-breakpoint
CREATE POLICY recipient_reads ON report_files FOR SELECT TO ohmstead_app
  USING (firm_id = (SELECT app_firm()) AND EXISTS (
    SELECT 1 FROM report_versions v WHERE v.firm_id = report_files.firm_id AND v.id = report_files.report_version_id
      AND v.inspection_id = (SELECT app_granted_inspection())));--> statement-breakpoint
CREATE POLICY recipient_reads ON renders FOR SELECT TO ohmstead_app
  USING (firm_id = (SELECT app_firm()) AND EXISTS (
    SELECT 1 FROM report_versions v WHERE v.firm_id = renders.firm_id AND v.id = renders.report_version_id
      AND v.inspection_id = (SELECT app_granted_inspection())));--> statement-breakpoint
CREATE POLICY recipient_reads ON photos FOR SELECT TO ohmstead_app
  USING (firm_id = (SELECT app_firm()) AND inspection_id = (SELECT app_granted_inspection()) AND EXISTS (
    SELECT 1 FROM report_versions v WHERE v.firm_id = photos.firm_id AND v.inspection_id = photos.inspection_id
      AND position(photos.id::text IN v.snapshot) > 0));--> statement-breakpoint
CREATE POLICY recipient_reads ON grants FOR SELECT TO ohmstead_app
  USING (firm_id = (SELECT app_firm()) AND id = (SELECT app_grant()) AND inspection_id = (SELECT app_granted_inspection()));--> statement-breakpoint
CREATE POLICY recipient_reads ON parties FOR SELECT TO ohmstead_app
  USING (firm_id = (SELECT app_firm()) AND id = (
    SELECT g.party_id FROM grants g
    WHERE g.firm_id = (SELECT app_firm()) AND g.id = (SELECT app_grant())));--> statement-breakpoint
CREATE POLICY recipient_reads ON firms FOR SELECT TO ohmstead_app
  USING (id = (SELECT app_firm()) AND (SELECT app_granted_inspection()) IS NOT NULL);--> statement-breakpoint

-- The least that the web's role needs. Nothing is deleted but who walks and which edition a place enforces.
GRANT SELECT, UPDATE ON firms TO ohmstead_app;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON memberships, inspections, visits, parties, structures, areas, panels, circuits,
  receptacles, photos, skips, renders, grants, messages, sync_clients, conflicts TO ohmstead_app;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON inspection_inspectors, adoptions TO ohmstead_app;--> statement-breakpoint
GRANT SELECT, INSERT ON readings, notices, decisions, report_versions, report_files, mutation_log TO ohmstead_app;--> statement-breakpoint
GRANT UPDATE (withdrawn_at, version) ON readings TO ohmstead_app;--> statement-breakpoint
GRANT SELECT ON audit_events TO ohmstead_app;--> statement-breakpoint
GRANT SELECT (id, email, name) ON users TO ohmstead_app;--> statement-breakpoint
GRANT SELECT ON worker_heartbeats TO ohmstead_app;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON worker_heartbeats TO ohmstead_jobs;--> statement-breakpoint

-- What was recorded is not changed by anyone, the owner included.
CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION 'rows of % are never changed or deleted', TG_TABLE_NAME USING ERRCODE = 'restrict_violation';
END $$;--> statement-breakpoint
CREATE FUNCTION refuse_all_but_withdrawal() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF old.withdrawn_at IS NOT NULL
    OR to_jsonb(new) - 'withdrawn_at' - 'version' IS DISTINCT FROM to_jsonb(old) - 'withdrawn_at' - 'version' THEN
    RAISE EXCEPTION 'a reading is never changed; it can be withdrawn once' USING ERRCODE = 'restrict_violation';
  END IF;
  RETURN new;
END $$;--> statement-breakpoint
DO $$
DECLARE
  name text;
BEGIN
  FOREACH name IN ARRAY ARRAY[
    'report_versions', 'report_files', 'audit_events', 'mutation_log', 'notices', 'decisions'
  ] LOOP
    EXECUTE format('CREATE TRIGGER never_changed BEFORE UPDATE OR DELETE ON %I
      FOR EACH ROW EXECUTE FUNCTION refuse_change()', name);
  END LOOP;
  FOREACH name IN ARRAY ARRAY[
    'report_versions', 'report_files', 'audit_events', 'mutation_log', 'notices', 'decisions', 'readings'
  ] LOOP
    EXECUTE format('CREATE TRIGGER never_emptied BEFORE TRUNCATE ON %I
      FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()', name);
  END LOOP;
END $$;--> statement-breakpoint
CREATE TRIGGER never_deleted BEFORE DELETE ON readings FOR EACH ROW EXECUTE FUNCTION refuse_change();--> statement-breakpoint
CREATE TRIGGER withdrawn_once BEFORE UPDATE ON readings FOR EACH ROW EXECUTE FUNCTION refuse_all_but_withdrawal();
