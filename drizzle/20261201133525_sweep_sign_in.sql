-- Attempts, links and sessions that no longer say anything. Run by the worker's sweep; kept long enough to look into.
CREATE FUNCTION sweep_sign_in() RETURNS integer
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  v_gone integer := 0;
  v_step integer;
BEGIN
  DELETE FROM rate_limits WHERE expire < now() - interval '2 days';
  GET DIAGNOSTICS v_gone = ROW_COUNT;
  DELETE FROM link_tokens WHERE expires_at < now() - interval '60 days';
  GET DIAGNOSTICS v_step = ROW_COUNT;
  v_gone := v_gone + v_step;
  DELETE FROM sessions WHERE least(expires_at, coalesce(revoked_at, expires_at), last_seen_at + interval '12 hours') < now() - interval '60 days';
  GET DIAGNOSTICS v_step = ROW_COUNT;
  RETURN v_gone + v_step;
END $$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION sweep_sign_in() FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION sweep_sign_in() TO ohmstead_app;
