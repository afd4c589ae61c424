-- FORCE: the policies hold for the tables' owner too. The application's role gets what it needs by name.
DO $$
DECLARE name text;
BEGIN
  FOR name IN
    SELECT c.relname FROM pg_class c
    JOIN pg_attribute a ON a.attrelid = c.oid AND a.attname = 'organisation_id'
    WHERE c.relkind = 'r' AND c.relnamespace = 'public'::regnamespace
  LOOP
    EXECUTE format('ALTER TABLE %I FORCE ROW LEVEL SECURITY', name);
  END LOOP;
END $$;
--> statement-breakpoint
REVOKE ALL ON SCHEMA public FROM PUBLIC;
--> statement-breakpoint
GRANT USAGE ON SCHEMA public TO lampline_app;
--> statement-breakpoint
GRANT SELECT ON organisation TO lampline_app;
--> statement-breakpoint
GRANT SELECT, UPDATE ON person, person_details, site, lift, circuit, counter, audit_head TO lampline_app;
--> statement-breakpoint
GRANT INSERT ON person, person_details, site, lift, circuit TO lampline_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON session, refresh_token, case_row, idempotency TO lampline_app;
--> statement-breakpoint
-- Append-only in fact: no UPDATE, DELETE or TRUNCATE on the log, the refused, the issued, the audit.
GRANT SELECT, INSERT ON case_event, quarantine, circuit_revision, audit TO lampline_app;
--> statement-breakpoint
-- An organisation's counter and audit chain begin with it.
CREATE FUNCTION begin_organisation() RETURNS trigger LANGUAGE plpgsql SET search_path = public, pg_temp AS $$
BEGIN
  INSERT INTO counter (organisation_id) VALUES (NEW.organisation_id);
  INSERT INTO audit_head (organisation_id, hash)
  VALUES (NEW.organisation_id, decode(repeat('00', 32), 'hex'));
  RETURN NULL;
END $$;
--> statement-breakpoint
CREATE TRIGGER begin_organisation AFTER INSERT ON organisation
FOR EACH ROW EXECUTE FUNCTION begin_organisation();
--> statement-breakpoint
-- The door before sign-in: three questions, each answered by a definer function. Their owner can't sign
-- in, and sees over the organisations only what these questions need.
CREATE SCHEMA door;
--> statement-breakpoint
GRANT USAGE ON SCHEMA door TO lampline_app;
--> statement-breakpoint
GRANT USAGE ON SCHEMA public TO lampline_door;
--> statement-breakpoint
GRANT SELECT ON person, person_details, refresh_token, session TO lampline_door;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON throttle TO lampline_door;
--> statement-breakpoint
CREATE POLICY before_sign_in ON person FOR SELECT TO lampline_door USING (true);
--> statement-breakpoint
CREATE POLICY before_sign_in ON person_details FOR SELECT TO lampline_door USING (true);
--> statement-breakpoint
CREATE POLICY before_sign_in ON refresh_token FOR SELECT TO lampline_door USING (true);
--> statement-breakpoint
CREATE POLICY before_sign_in ON session FOR SELECT TO lampline_door USING (true);
--> statement-breakpoint
CREATE FUNCTION door.person_by_email(wanted text)
RETURNS TABLE (organisation_id uuid, person_id uuid, password_hash text, disabled boolean)
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT d.organisation_id, d.person_id, d.password_hash, p.disabled
  FROM person_details d
  JOIN person p ON p.organisation_id = d.organisation_id AND p.id = d.person_id
  WHERE lower(d.email) = lower(wanted)
$$;
--> statement-breakpoint
CREATE FUNCTION door.session_by_token(wanted bytea)
RETURNS TABLE (organisation_id uuid, session_id uuid, person_id uuid)
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT s.organisation_id, s.id, s.person_id
  FROM refresh_token t
  JOIN session s ON s.organisation_id = t.organisation_id AND s.id = t.session_id
  WHERE t.digest = wanted
$$;
--> statement-breakpoint
-- One guess into a leaky bucket. Answers the seconds to wait: 0 when the guess is allowed; a refused
-- guess does not fill the bucket further, so that waiting as told is always enough.
CREATE FUNCTION door.take_guess(wanted text, capacity double precision, leak_per_second double precision, at timestamptz)
RETURNS double precision
LANGUAGE plpgsql VOLATILE SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE now_in double precision;
BEGIN
  INSERT INTO throttle AS t (bucket, level, filled_at) VALUES (wanted, 0, at)
  ON CONFLICT (bucket) DO UPDATE SET
    level = greatest(0, t.level - leak_per_second * greatest(0, extract(epoch FROM at - t.filled_at))),
    filled_at = greatest(at, t.filled_at)
  RETURNING t.level INTO now_in;
  IF now_in + 1 > capacity THEN
    RETURN (now_in + 1 - capacity) / leak_per_second;
  END IF;
  UPDATE throttle SET level = now_in + 1 WHERE bucket = wanted;
  RETURN 0;
END $$;
--> statement-breakpoint
-- The guess was right: it does not count.
CREATE FUNCTION door.give_back_guess(wanted text) RETURNS void
LANGUAGE sql VOLATILE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  UPDATE throttle SET level = greatest(0, level - 1) WHERE bucket = wanted
$$;
--> statement-breakpoint
-- Buckets that have long run dry; called now and then, so that the table stays small.
CREATE FUNCTION door.sweep_guesses(older_than timestamptz) RETURNS void
LANGUAGE sql VOLATILE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  DELETE FROM throttle WHERE filled_at < older_than
$$;
--> statement-breakpoint
REVOKE ALL ON ALL FUNCTIONS IN SCHEMA door FROM PUBLIC;
--> statement-breakpoint
GRANT EXECUTE ON ALL FUNCTIONS IN SCHEMA door TO lampline_app;
--> statement-breakpoint
GRANT CREATE ON SCHEMA door TO lampline_door;
--> statement-breakpoint
ALTER FUNCTION door.person_by_email(text) OWNER TO lampline_door;
--> statement-breakpoint
ALTER FUNCTION door.session_by_token(bytea) OWNER TO lampline_door;
--> statement-breakpoint
ALTER FUNCTION door.take_guess(text, double precision, double precision, timestamptz) OWNER TO lampline_door;
--> statement-breakpoint
ALTER FUNCTION door.give_back_guess(text) OWNER TO lampline_door;
--> statement-breakpoint
ALTER FUNCTION door.sweep_guesses(timestamptz) OWNER TO lampline_door;
--> statement-breakpoint
REVOKE CREATE ON SCHEMA door FROM lampline_door;
