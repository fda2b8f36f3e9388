-- Adds a job to the worker's queue in the caller's transaction. The app role may not touch the queue itself.
-- A job that names a firm may only be asked for by somebody of that firm.
CREATE FUNCTION enqueue_job(task text, payload json, job_key text DEFAULT NULL, queue text DEFAULT NULL) RETURNS void
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
BEGIN
  IF task NOT IN ('render-report', 'send-mail') THEN
    RAISE EXCEPTION 'there is no task %', task;
  END IF;
  IF (payload ->> 'firmId') IS NOT NULL AND (payload ->> 'firmId')::uuid IS DISTINCT FROM app_firm() THEN
    RAISE EXCEPTION 'a job is asked for by its own firm';
  END IF;
  PERFORM graphile_worker.add_job(
    identifier => task, payload => payload, queue_name => queue, job_key => enqueue_job.job_key, max_attempts => 8);
END $$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION enqueue_job(text, json, text, text) FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION enqueue_job(text, json, text, text) TO ohmstead_app;--> statement-breakpoint

-- The grant that a mailed token or code names, whatever has become of it. The hash alone finds it.
CREATE FUNCTION find_grant_by_secret(secret_hash bytea)
RETURNS TABLE (firm_id uuid, grant_id uuid, inspection_id uuid, party_id uuid, party_name text, token_hash bytea, state text)
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT g.firm_id, g.id, g.inspection_id, g.party_id, p.name, g.token_hash,
    CASE WHEN g.revoked_at IS NOT NULL THEN 'revoked' WHEN g.until <= now() THEN 'expired' ELSE 'ready' END
  FROM grants g JOIN parties p ON p.firm_id = g.firm_id AND p.id = g.party_id
  WHERE g.token_hash = secret_hash OR g.code_hash = secret_hash
  LIMIT 1
$$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION find_grant_by_secret(bytea) FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION find_grant_by_secret(bytea) TO ohmstead_app;--> statement-breakpoint

-- The grant that a browser's cookie names, while it counts. The caller compares the cookie with `token_hash`.
CREATE FUNCTION find_open_grant(wanted uuid)
RETURNS TABLE (firm_id uuid, grant_id uuid, inspection_id uuid, party_id uuid, party_name text, token_hash bytea)
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT g.firm_id, g.id, g.inspection_id, g.party_id, p.name, g.token_hash
  FROM grants g JOIN parties p ON p.firm_id = g.firm_id AND p.id = g.party_id
  WHERE g.id = wanted AND g.revoked_at IS NULL AND g.until > now()
  LIMIT 1
$$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION find_open_grant(uuid) FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION find_open_grant(uuid) TO ohmstead_app;--> statement-breakpoint

-- One more opening of the recipient's own grant, and 90 days from it.
CREATE FUNCTION count_opening() RETURNS void
LANGUAGE sql SECURITY DEFINER SET search_path = public, pg_temp AS $$
  UPDATE grants SET opens = opens + 1, opened_at = now(), until = greatest(until, now() + interval '90 days')
  WHERE app_kind() = 'recipient' AND firm_id = app_firm() AND id = app_grant() AND inspection_id = app_granted_inspection()
$$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION count_opening() FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION count_opening() TO ohmstead_app;--> statement-breakpoint

-- Asks again for every PDF that has been missing for ten minutes and has not failed for good. Answers how many.
CREATE FUNCTION sweep_renders() RETURNS integer
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  lost record;
  found integer := 0;
BEGIN
  FOR lost IN
    SELECT r.firm_id, r.report_version_id, r.locale FROM renders r
    WHERE r.state IN ('waiting', 'rendering') AND r.updated_at < now() - interval '10 minutes'
  LOOP
    PERFORM graphile_worker.add_job(
      identifier => 'render-report',
      payload => json_build_object('firmId', lost.firm_id, 'reportVersionId', lost.report_version_id, 'locale', lost.locale),
      job_key => 'render:' || lost.report_version_id || ':' || lost.locale, max_attempts => 8);
    found := found + 1;
  END LOOP;
  RETURN found;
END $$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION sweep_renders() FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION sweep_renders() TO ohmstead_jobs;
