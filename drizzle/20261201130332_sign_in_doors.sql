-- Doors: the only way of the app role to people, sessions, links and attempts, which belong to no single firm.
-- Each runs as the owner of the tables, with a fixed search path, and says no more than its caller must know.

-- Counts one attempt before it is made. Answers how many seconds to wait; 0 means go on.
-- With p_grows each attempt over the limit doubles the wait, up to an hour; a day of peace forgets it.
CREATE FUNCTION take_attempt(p_key text, p_limit integer, p_window_seconds integer, p_grows boolean) RETURNS integer
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  v_row rate_limits;
  v_now timestamptz := clock_timestamp();
  v_window interval := make_interval(secs => p_window_seconds);
BEGIN
  INSERT INTO rate_limits (key, points, expire) VALUES (p_key, 0, v_now + v_window) ON CONFLICT (key) DO NOTHING;
  SELECT * INTO v_row FROM rate_limits WHERE key = p_key FOR UPDATE;
  IF v_row.expire < v_now - interval '1 day' OR (v_row.expire <= v_now AND (v_row.points < p_limit OR NOT p_grows)) THEN
    v_row.points := 0;
    v_row.expire := v_now + v_window;
  END IF;
  IF v_row.points >= p_limit AND v_row.expire > v_now THEN
    RETURN greatest(1, ceil(extract(epoch FROM v_row.expire - v_now))::integer);
  END IF;
  v_row.points := v_row.points + 1;
  IF v_row.points > p_limit THEN
    v_row.expire := v_now + least(v_window * (2 ^ least(v_row.points - p_limit, 8)), interval '1 hour');
  END IF;
  UPDATE rate_limits SET points = v_row.points, expire = v_row.expire WHERE key = p_key;
  RETURN 0;
END $$;--> statement-breakpoint

CREATE FUNCTION clear_attempts(p_key text) RETURNS void
LANGUAGE sql SECURITY DEFINER SET search_path = public, pg_temp AS $$
  DELETE FROM rate_limits WHERE key = p_key;
$$;--> statement-breakpoint

-- An attempt that succeeded does not count against the address it came from.
CREATE FUNCTION give_back_attempt(p_key text) RETURNS void
LANGUAGE sql SECURITY DEFINER SET search_path = public, pg_temp AS $$
  UPDATE rate_limits SET points = greatest(points - 1, 0) WHERE key = p_key;
$$;--> statement-breakpoint

CREATE FUNCTION is_active_membership(p_membership memberships) RETURNS boolean
LANGUAGE sql STABLE SET search_path = public, pg_temp AS $$
  SELECT p_membership.disabled_at IS NULL AND p_membership.invited_at IS NULL;
$$;--> statement-breakpoint

CREATE FUNCTION find_account(p_email text) RETURNS TABLE (user_id uuid, name text, password_hash text)
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT u.id, u.name, u.password_hash FROM users u
  WHERE u.email = p_email AND u.disabled_at IS NULL AND u.password_hash IS NOT NULL
    AND EXISTS (SELECT FROM memberships m WHERE m.user_id = u.id AND is_active_membership(m));
$$;--> statement-breakpoint

-- Opens a session in the firm asked for, else in the one used last. Answers the firm, or null where the person may enter none.
CREATE FUNCTION open_session(p_id_hash bytea, p_user_id uuid, p_firm_id uuid, p_user_agent text) RETURNS uuid
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  v_firm uuid;
BEGIN
  SELECT m.firm_id INTO v_firm
  FROM memberships m JOIN users u ON u.id = m.user_id
  WHERE m.user_id = p_user_id AND u.disabled_at IS NULL AND is_active_membership(m)
    AND (p_firm_id IS NULL OR m.firm_id = p_firm_id)
  ORDER BY (SELECT max(s.last_seen_at) FROM sessions s WHERE s.user_id = m.user_id AND s.firm_id = m.firm_id) DESC NULLS LAST,
    m.created_at
  LIMIT 1;
  IF v_firm IS NULL THEN
    RETURN NULL;
  END IF;
  INSERT INTO sessions (id_hash, user_id, firm_id, user_agent, expires_at)
  VALUES (p_id_hash, p_user_id, v_firm, left(p_user_agent, 300), now() + interval '30 days');
  RETURN v_firm;
END $$;--> statement-breakpoint

-- Who the session is, as things stand now: idle 12 hours, 30 days in all. Notes when it was last seen, once a minute.
CREATE FUNCTION find_session(p_id_hash bytea)
RETURNS TABLE (firm_id uuid, user_id uuid, membership_id uuid, name text, email text, firm_name text, roles text[], shared_drafts boolean)
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
#variable_conflict use_column
BEGIN
  UPDATE sessions s SET last_seen_at = now()
  WHERE s.id_hash = p_id_hash AND s.revoked_at IS NULL
    AND s.last_seen_at < now() - interval '1 minute' AND s.last_seen_at > now() - interval '12 hours';
  RETURN QUERY
  SELECT f.id, u.id, m.id, u.name, u.email, f.name, m.roles::text[], f.shared_drafts
  FROM sessions s
    JOIN users u ON u.id = s.user_id
    JOIN memberships m ON m.firm_id = s.firm_id AND m.user_id = s.user_id
    JOIN firms f ON f.id = s.firm_id
  WHERE s.id_hash = p_id_hash AND s.revoked_at IS NULL AND s.expires_at > now()
    AND s.last_seen_at > now() - interval '12 hours'
    AND u.disabled_at IS NULL AND is_active_membership(m);
END $$;--> statement-breakpoint

CREATE FUNCTION end_session(p_id_hash bytea) RETURNS void
LANGUAGE sql SECURITY DEFINER SET search_path = public, pg_temp AS $$
  UPDATE sessions SET revoked_at = now() WHERE id_hash = p_id_hash AND revoked_at IS NULL;
$$;--> statement-breakpoint

-- Ends every session of the acting person but one.
CREATE FUNCTION end_own_sessions(p_keep_hash bytea) RETURNS integer
LANGUAGE sql SECURITY DEFINER SET search_path = public, pg_temp AS $$
  WITH ended AS (
    UPDATE sessions SET revoked_at = now()
    WHERE user_id = app_user() AND revoked_at IS NULL AND id_hash IS DISTINCT FROM p_keep_hash RETURNING 1
  ) SELECT count(*)::integer FROM ended;
$$;--> statement-breakpoint

-- A new firm with its first person, who owns it and inspects.
CREATE FUNCTION create_firm(p_firm_id uuid, p_firm_name text, p_time_zone text, p_state_profile state_profile,
  p_user_id uuid, p_membership_id uuid, p_email text, p_name text, p_password_hash text) RETURNS text
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
BEGIN
  INSERT INTO users (id, email, name, password_hash) VALUES (p_user_id, p_email, p_name, p_password_hash)
  ON CONFLICT (email) DO NOTHING;
  IF NOT FOUND THEN
    RETURN 'email-taken';
  END IF;
  INSERT INTO firms (id, name, email, time_zone, state_profile)
  VALUES (p_firm_id, p_firm_name, p_email, p_time_zone, p_state_profile);
  INSERT INTO memberships (firm_id, id, user_id, roles, signature_name)
  VALUES (p_firm_id, p_membership_id, p_user_id, '{owner,inspector}', p_name);
  RETURN 'created';
END $$;--> statement-breakpoint

-- One live link per purpose: a new one ends those before it. Answers the name to greet, or null where nobody may have one.
CREATE FUNCTION request_link(p_email text, p_purpose link_purpose, p_token_hash bytea, p_code_hash bytea, p_seconds integer) RETURNS text
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  v_account record;
BEGIN
  SELECT a.user_id, a.name INTO v_account FROM find_account(p_email) a;
  IF NOT FOUND OR p_purpose NOT IN ('reset', 'sign-in') THEN
    RETURN NULL;
  END IF;
  UPDATE link_tokens SET used_at = now() WHERE user_id = v_account.user_id AND purpose = p_purpose AND used_at IS NULL;
  INSERT INTO link_tokens (token_hash, code_hash, purpose, email, user_id, expires_at)
  VALUES (p_token_hash, p_code_hash, p_purpose, p_email, v_account.user_id, now() + make_interval(secs => least(p_seconds, 600)));
  RETURN v_account.name;
END $$;--> statement-breakpoint

-- What a mailed link is for, without using it up. p_hash is that of the token, or of the e-mail with the short code.
CREATE FUNCTION find_link(p_hash bytea)
RETURNS TABLE (purpose link_purpose, state text, email text, name text, firm_name text, has_password boolean)
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT t.purpose,
    CASE WHEN t.used_at IS NOT NULL THEN 'used' WHEN t.expires_at <= now() THEN 'expired' ELSE 'ready' END,
    t.email, u.name, f.name, u.password_hash IS NOT NULL
  FROM link_tokens t JOIN users u ON u.id = t.user_id LEFT JOIN firms f ON f.id = t.firm_id
  WHERE t.token_hash = p_hash OR t.code_hash = p_hash;
$$;--> statement-breakpoint

-- Uses a link up. Two posts at the same moment: one of them gets the row.
CREATE FUNCTION consume_link(p_hash bytea, p_purpose link_purpose) RETURNS SETOF link_tokens
LANGUAGE sql SET search_path = public, pg_temp AS $$
  UPDATE link_tokens SET used_at = now()
  WHERE (token_hash = p_hash OR code_hash = p_hash) AND purpose = p_purpose AND used_at IS NULL AND expires_at > now()
  RETURNING *;
$$;--> statement-breakpoint

-- Sets a new password by a reset link and ends every session of that person.
CREATE FUNCTION reset_password(p_hash bytea, p_password_hash text) RETURNS TABLE (user_id uuid, email text)
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
#variable_conflict use_column
DECLARE
  v_link link_tokens;
BEGIN
  SELECT * INTO v_link FROM consume_link(p_hash, 'reset');
  IF NOT FOUND THEN
    RETURN;
  END IF;
  UPDATE users SET password_hash = p_password_hash WHERE id = v_link.user_id AND disabled_at IS NULL;
  IF NOT FOUND THEN
    RETURN;
  END IF;
  UPDATE sessions SET revoked_at = now() WHERE user_id = v_link.user_id AND revoked_at IS NULL;
  UPDATE link_tokens SET used_at = now() WHERE user_id = v_link.user_id AND purpose IN ('reset', 'sign-in') AND used_at IS NULL;
  RETURN QUERY SELECT v_link.user_id, v_link.email;
END $$;--> statement-breakpoint

CREATE FUNCTION use_sign_in_link(p_hash bytea) RETURNS uuid
LANGUAGE sql SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT user_id FROM consume_link(p_hash, 'sign-in');
$$;--> statement-breakpoint

-- Joins the firm. A person new to the program sets name and password; one who has a password keeps both.
CREATE FUNCTION accept_invitation(p_hash bytea, p_name text, p_password_hash text)
RETURNS TABLE (user_id uuid, firm_id uuid, email text)
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
#variable_conflict use_column
DECLARE
  v_link link_tokens;
BEGIN
  SELECT * INTO v_link FROM consume_link(p_hash, 'invitation');
  IF NOT FOUND THEN
    RETURN;
  END IF;
  UPDATE users SET password_hash = p_password_hash, name = p_name WHERE id = v_link.user_id AND password_hash IS NULL;
  UPDATE memberships SET invited_at = NULL, signature_name = coalesce(signature_name, p_name)
  WHERE firm_id = v_link.firm_id AND id = v_link.membership_id AND disabled_at IS NULL;
  IF NOT FOUND THEN
    RETURN;
  END IF;
  IF EXISTS (SELECT FROM users WHERE id = v_link.user_id AND password_hash IS NULL) THEN
    RAISE EXCEPTION 'an invitation cannot be accepted without a password';
  END IF;
  RETURN QUERY SELECT v_link.user_id, v_link.firm_id, v_link.email;
END $$;--> statement-breakpoint

CREATE FUNCTION require_acting_owner() RETURNS void
LANGUAGE plpgsql STABLE SET search_path = public, pg_temp AS $$
BEGIN
  IF NOT EXISTS (
    SELECT FROM memberships m
    WHERE m.firm_id = app_firm() AND m.user_id = app_user() AND 'owner' = ANY (m.roles) AND is_active_membership(m)
  ) THEN
    RAISE EXCEPTION 'only an owner of the firm may do this' USING ERRCODE = '42501';
  END IF;
END $$;--> statement-breakpoint

CREATE FUNCTION store_invitation(p_membership memberships, p_email text, p_token_hash bytea, p_code_hash bytea, p_seconds integer) RETURNS void
LANGUAGE sql SET search_path = public, pg_temp AS $$
  UPDATE link_tokens SET used_at = now() WHERE membership_id = p_membership.id AND firm_id = p_membership.firm_id AND used_at IS NULL;
  INSERT INTO link_tokens (token_hash, code_hash, purpose, email, user_id, firm_id, membership_id, expires_at)
  VALUES (p_token_hash, p_code_hash, 'invitation', p_email, p_membership.user_id, p_membership.firm_id, p_membership.id,
    now() + make_interval(secs => least(p_seconds, 604800)));
$$;--> statement-breakpoint

CREATE FUNCTION invite_member(p_membership_id uuid, p_user_id uuid, p_email text, p_name text, p_roles role[],
  p_token_hash bytea, p_code_hash bytea, p_seconds integer) RETURNS text
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  v_user uuid;
  v_membership memberships;
BEGIN
  PERFORM require_acting_owner();
  INSERT INTO users (id, email, name) VALUES (p_user_id, p_email, p_name) ON CONFLICT (email) DO NOTHING;
  SELECT id INTO v_user FROM users WHERE email = p_email;
  INSERT INTO memberships (firm_id, id, user_id, roles, invited_at)
  VALUES (app_firm(), p_membership_id, v_user, p_roles, now())
  ON CONFLICT (firm_id, user_id) DO NOTHING RETURNING * INTO v_membership;
  IF v_membership.id IS NULL THEN
    RETURN 'already-member';
  END IF;
  PERFORM store_invitation(v_membership, p_email, p_token_hash, p_code_hash, p_seconds);
  RETURN 'invited';
END $$;--> statement-breakpoint

-- Sends a waiting invitation again; the earlier link ends.
CREATE FUNCTION renew_invitation(p_membership_id uuid, p_token_hash bytea, p_code_hash bytea, p_seconds integer)
RETURNS TABLE (email text, name text)
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
#variable_conflict use_column
DECLARE
  v_membership memberships;
  v_user users;
BEGIN
  PERFORM require_acting_owner();
  SELECT * INTO v_membership FROM memberships
  WHERE firm_id = app_firm() AND id = p_membership_id AND invited_at IS NOT NULL AND disabled_at IS NULL FOR UPDATE;
  IF NOT FOUND THEN
    RETURN;
  END IF;
  SELECT * INTO v_user FROM users WHERE id = v_membership.user_id;
  PERFORM store_invitation(v_membership, v_user.email, p_token_hash, p_code_hash, p_seconds);
  RETURN QUERY SELECT v_user.email, v_user.name;
END $$;--> statement-breakpoint

-- The e-mail an expired link was mailed to, and what it was for. Only that address may get a new one.
CREATE FUNCTION replace_expired_link(p_old_hash bytea, p_token_hash bytea, p_code_hash bytea)
RETURNS TABLE (purpose link_purpose, email text, name text, firm_name text)
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
#variable_conflict use_column
DECLARE
  v_old link_tokens;
  v_membership memberships;
BEGIN
  SELECT * INTO v_old FROM link_tokens
  WHERE (token_hash = p_old_hash OR code_hash = p_old_hash) AND used_at IS NULL AND expires_at <= now() FOR UPDATE;
  IF NOT FOUND THEN
    RETURN;
  END IF;
  UPDATE link_tokens SET used_at = now() WHERE token_hash = v_old.token_hash;
  IF v_old.purpose = 'invitation' THEN
    SELECT * INTO v_membership FROM memberships
    WHERE firm_id = v_old.firm_id AND id = v_old.membership_id AND invited_at IS NOT NULL AND disabled_at IS NULL;
    IF NOT FOUND THEN
      RETURN;
    END IF;
    PERFORM store_invitation(v_membership, v_old.email, p_token_hash, p_code_hash, 604800);
  ELSIF request_link(v_old.email, v_old.purpose, p_token_hash, p_code_hash, 600) IS NULL THEN
    RETURN;
  END IF;
  RETURN QUERY SELECT v_old.purpose, v_old.email, u.name, f.name
  FROM users u LEFT JOIN firms f ON f.id = v_old.firm_id WHERE u.id = v_old.user_id;
END $$;--> statement-breakpoint

-- The people of the acting firm. Names and e-mails of anybody else stay behind the door.
CREATE FUNCTION list_members()
RETURNS TABLE (membership_id uuid, user_id uuid, name text, email text, roles text[], license_number text, license_state text,
  license_expires text, signature_name text, signature_key text, state text, last_seen_at timestamptz)
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT m.id, u.id, u.name, u.email, m.roles::text[], m.license_number, m.license_state, m.license_expires, m.signature_name, m.signature_key,
    CASE WHEN m.disabled_at IS NOT NULL OR u.disabled_at IS NOT NULL THEN 'disabled' WHEN m.invited_at IS NOT NULL THEN 'invited' ELSE 'active' END,
    (SELECT max(s.last_seen_at) FROM sessions s WHERE s.user_id = m.user_id AND s.firm_id = m.firm_id)
  FROM memberships m JOIN users u ON u.id = m.user_id
  WHERE m.firm_id = app_firm()
  ORDER BY lower(u.name), m.id;
$$;--> statement-breakpoint

-- Ends the sessions that a person has in the acting firm; those in other firms are not this firm's business.
CREATE FUNCTION end_member_sessions(p_membership_id uuid) RETURNS integer
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  v_ended integer;
BEGIN
  PERFORM require_acting_owner();
  UPDATE sessions s SET revoked_at = now() FROM memberships m
  WHERE m.firm_id = app_firm() AND m.id = p_membership_id AND s.user_id = m.user_id AND s.firm_id = m.firm_id AND s.revoked_at IS NULL;
  GET DIAGNOSTICS v_ended = ROW_COUNT;
  RETURN v_ended;
END $$;--> statement-breakpoint

CREATE FUNCTION rename_acting_user(p_name text) RETURNS void
LANGUAGE sql SECURITY DEFINER SET search_path = public, pg_temp AS $$
  UPDATE users SET name = p_name WHERE id = app_user();
$$;--> statement-breakpoint

-- A new password for the acting person; every other session ends.
CREATE FUNCTION change_own_password(p_password_hash text, p_keep_hash bytea) RETURNS void
LANGUAGE sql SECURITY DEFINER SET search_path = public, pg_temp AS $$
  UPDATE users SET password_hash = p_password_hash WHERE id = app_user() AND disabled_at IS NULL;
  UPDATE sessions SET revoked_at = now() WHERE user_id = app_user() AND revoked_at IS NULL AND id_hash IS DISTINCT FROM p_keep_hash;
$$;--> statement-breakpoint

CREATE FUNCTION list_own_firms() RETURNS TABLE (firm_id uuid, firm_name text)
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT f.id, f.name FROM memberships m JOIN firms f ON f.id = m.firm_id
  WHERE m.user_id = app_user() AND is_active_membership(m) ORDER BY lower(f.name);
$$;--> statement-breakpoint

-- Nobody calls a door but the web's role, and the parts behind them nobody at all.
REVOKE EXECUTE ON FUNCTION
  take_attempt(text, integer, integer, boolean),
  clear_attempts(text),
  give_back_attempt(text),
  find_account(text),
  open_session(bytea, uuid, uuid, text),
  find_session(bytea),
  end_session(bytea),
  end_own_sessions(bytea),
  create_firm(uuid, text, text, state_profile, uuid, uuid, text, text, text),
  request_link(text, link_purpose, bytea, bytea, integer),
  find_link(bytea),
  reset_password(bytea, text),
  use_sign_in_link(bytea),
  accept_invitation(bytea, text, text),
  invite_member(uuid, uuid, text, text, role[], bytea, bytea, integer),
  renew_invitation(uuid, bytea, bytea, integer),
  replace_expired_link(bytea, bytea, bytea),
  list_members(),
  end_member_sessions(uuid),
  rename_acting_user(text),
  change_own_password(text, bytea),
  list_own_firms(),
  consume_link(bytea, link_purpose),
  require_acting_owner(),
  store_invitation(memberships, text, bytea, bytea, integer),
  is_active_membership(memberships)
FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION
  take_attempt(text, integer, integer, boolean),
  clear_attempts(text),
  give_back_attempt(text),
  find_account(text),
  open_session(bytea, uuid, uuid, text),
  find_session(bytea),
  end_session(bytea),
  end_own_sessions(bytea),
  create_firm(uuid, text, text, state_profile, uuid, uuid, text, text, text),
  request_link(text, link_purpose, bytea, bytea, integer),
  find_link(bytea),
  reset_password(bytea, text),
  use_sign_in_link(bytea),
  accept_invitation(bytea, text, text),
  invite_member(uuid, uuid, text, text, role[], bytea, bytea, integer),
  renew_invitation(uuid, bytea, bytea, integer),
  replace_expired_link(bytea, bytea, bytea),
  list_members(),
  end_member_sessions(uuid),
  rename_acting_user(text),
  change_own_password(text, bytea),
  list_own_firms()
TO ohmstead_app;
