-- The rules of a report's life and of what was signed for, in the database too.

-- A temporary table comes before every schema unless pg_temp is named last: a function that runs with its owner's rights names it.
DO $$
DECLARE f regprocedure;
BEGIN
  FOR f IN SELECT oid::regprocedure FROM pg_proc WHERE pronamespace = 'public'::regnamespace AND prosecdef
      AND proowner = current_user::regrole LOOP
    EXECUTE format('ALTER FUNCTION %s SET search_path = pg_catalog, public, pg_temp', f);
  END LOOP;
END $$;
-- Asked by the application it answers for the application's own firm only; asked by a trigger, with the rights of the trigger.
ALTER FUNCTION has_prepared(uuid, uuid, text) SECURITY INVOKER;
--> statement-breakpoint

-- Columns that stay as they were made have no right to change them.
REVOKE UPDATE ON firms, members, invitations, reports, check_comments FROM strandnote_app;
GRANT UPDATE (name, time_zone, letterhead, report_prefix, next_report_number) ON firms TO strandnote_app;
GRANT UPDATE (name, email, roles, client_id, licence_number, licence_jurisdiction, active, units) ON members TO strandnote_app;
GRANT UPDATE (revoked_at) ON invitations TO strandnote_app;
GRANT UPDATE (title) ON reports TO strandnote_app;
GRANT UPDATE (state, answer, answered_by, answered_at, closed_by, closed_at) ON check_comments TO strandnote_app;
--> statement-breakpoint

-- Runs within triggers, with the rights of the tables' owner. The lock keeps the state as it is until commit.
CREATE FUNCTION locked_state(firm uuid, revision uuid) RETURNS text LANGUAGE sql SET search_path = pg_catalog, public, pg_temp AS $$
  SELECT state FROM revisions WHERE firm_id = firm AND id = revision FOR NO KEY UPDATE
$$;
CREATE FUNCTION latest_submission(firm uuid, revision uuid) RETURNS uuid LANGUAGE sql STABLE
  SET search_path = pg_catalog, public, pg_temp AS $$
  SELECT id FROM submissions WHERE firm_id = firm AND revision_id = revision ORDER BY number DESC LIMIT 1
$$;
REVOKE EXECUTE ON FUNCTION locked_state, latest_submission FROM PUBLIC;
--> statement-breakpoint

-- A submission is made by who submits it, of a revision that is being written, and stamped by the database's own clock: contributions
-- are compared with that time.
CREATE FUNCTION stamp_submission() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
DECLARE state text := locked_state(NEW.firm_id, NEW.revision_id);
BEGIN
  IF NEW.submitted_by IS DISTINCT FROM current_actor() THEN
    RAISE EXCEPTION 'Nobody submits for somebody else.' USING ERRCODE = 'SN002';
  END IF;
  IF state NOT IN ('draft', 'returned') THEN
    RAISE EXCEPTION 'A revision is not submitted while it is %.', state USING ERRCODE = 'SN006';
  END IF;
  NEW.frozen_at := clock_timestamp();
  RETURN NEW;
END $$;
CREATE TRIGGER stamp BEFORE INSERT ON submissions FOR EACH ROW EXECUTE FUNCTION stamp_submission();

-- What a submission uses is said when it is made: a source added later could pass a value off as checked.
CREATE FUNCTION guard_submission_source() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp AS $$
DECLARE revision uuid := (SELECT revision_id FROM submissions WHERE firm_id = NEW.firm_id AND id = NEW.submission_id);
BEGIN
  IF locked_state(NEW.firm_id, revision) NOT IN ('draft', 'returned') OR latest_submission(NEW.firm_id, revision) <> NEW.submission_id THEN
    RAISE EXCEPTION 'The sources of a submission are named when it is made.' USING ERRCODE = 'SN006';
  END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER guard BEFORE INSERT ON submission_sources FOR EACH ROW EXECUTE FUNCTION guard_submission_source();

-- The cables of a revision change while it is being written; ticks come and go while it is in check.
CREATE FUNCTION guard_revision_cable() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp AS $$
DECLARE
  row_now jsonb := to_jsonb(CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END);
  state text := locked_state((row_now ->> 'firm_id')::uuid, (row_now ->> 'revision_id')::uuid);
BEGIN
  IF state NOT IN ('draft', 'returned') THEN
    RAISE EXCEPTION 'The cables of a revision are frozen while it is %.', state USING ERRCODE = 'SN006';
  END IF;
  RETURN CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END;
END $$;
CREATE TRIGGER guard BEFORE INSERT OR DELETE ON revision_cables FOR EACH ROW EXECUTE FUNCTION guard_revision_cable();

CREATE FUNCTION guard_cable_check() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
DECLARE
  tick cable_checks := CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END;
  revision uuid := (SELECT revision_id FROM submissions WHERE firm_id = tick.firm_id AND id = tick.submission_id);
BEGIN
  IF locked_state(tick.firm_id, revision) <> 'in check' OR latest_submission(tick.firm_id, revision) <> tick.submission_id THEN
    RAISE EXCEPTION 'Cables are ticked while their submission is in check.' USING ERRCODE = 'SN006';
  END IF;
  IF NOT EXISTS (SELECT 1 FROM revision_cables c WHERE c.firm_id = tick.firm_id AND c.revision_id = revision
      AND c.cable_id = tick.cable_id) THEN
    RAISE EXCEPTION 'The revision does not cover this cable.' USING ERRCODE = 'SN006';
  END IF;
  RETURN tick;
END $$;
CREATE TRIGGER while_in_check BEFORE INSERT OR DELETE ON cable_checks FOR EACH ROW EXECUTE FUNCTION guard_cable_check();
--> statement-breakpoint

-- A signature is the signer's own, names the content of the last submission, and is given at its own moment of the revision's life.
CREATE OR REPLACE FUNCTION refuse_foreign_signature() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp AS $$
DECLARE state text;
BEGIN
  IF NEW.user_id IS DISTINCT FROM current_actor() THEN
    RAISE EXCEPTION 'Nobody signs or ticks for somebody else.' USING ERRCODE = 'SN002';
  END IF;
  IF NOT EXISTS (SELECT 1 FROM submissions s WHERE s.firm_id = NEW.firm_id AND s.id = NEW.submission_id
      AND s.revision_id = NEW.revision_id AND s.content_sha256 = NEW.content_sha256) THEN
    RAISE EXCEPTION 'The signature names another content than the submission.' USING ERRCODE = 'SN003';
  END IF;
  state := locked_state(NEW.firm_id, NEW.revision_id);
  IF latest_submission(NEW.firm_id, NEW.revision_id) <> NEW.submission_id OR NOT (CASE NEW.meaning
      WHEN 'prepared' THEN state IN ('draft', 'returned')
      WHEN 'checked and approved' THEN state = 'in check'
      ELSE state = 'approved' END) THEN
    RAISE EXCEPTION 'Nobody signs as "%" while the revision is %, nor for an earlier submission.', NEW.meaning, state
      USING ERRCODE = 'SN006';
  END IF;
  RETURN NEW;
END $$;
--> statement-breakpoint

-- A revision begins as an empty draft: what it becomes, it becomes by the moves below.
CREATE FUNCTION guard_new_revision() RETURNS trigger LANGUAGE plpgsql SET search_path = pg_catalog, public, pg_temp AS $$
BEGIN
  IF NEW.state <> 'draft' OR num_nonnulls(NEW.approved_submission_id, NEW.unsigned_file_id, NEW.signed_file_id, NEW.addressed_client_id,
      NEW.approved_at, NEW.issued_at, NEW.superseded_at, NEW.superseded_by, NEW.withdrawn_at) > 0 THEN
    RAISE EXCEPTION 'A revision begins as a draft.' USING ERRCODE = 'SN006';
  END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER guard_new BEFORE INSERT ON revisions FOR EACH ROW EXECUTE FUNCTION guard_new_revision();

-- What a move needs, besides being one that there is.
CREATE FUNCTION assert_move(old_row revisions, new_row revisions) RETURNS void LANGUAGE plpgsql STABLE
  SET search_path = pg_catalog, public, pg_temp AS $$
DECLARE submission uuid := latest_submission(new_row.firm_id, new_row.id);
BEGIN
  IF (old_row.state || ' > ' || new_row.state) NOT IN (
      'draft > in check', 'in check > draft', 'in check > returned', 'in check > approved', 'returned > draft', 'returned > in check',
      'approved > returned', 'approved > issued', 'issued > superseded', 'issued > withdrawn', 'superseded > withdrawn') THEN
    RAISE EXCEPTION 'A revision does not go from % to %.', old_row.state, new_row.state USING ERRCODE = 'SN006';
  END IF;
  IF new_row.state = 'in check' AND NOT has_signature(new_row.firm_id, submission, 'prepared') THEN
    RAISE EXCEPTION 'A revision goes into check only with a submission that its preparer signed.' USING ERRCODE = 'SN006';
  ELSIF new_row.state = 'approved' THEN
    IF new_row.approved_submission_id IS DISTINCT FROM submission
        OR NOT has_signature(new_row.firm_id, submission, 'checked and approved') THEN
      RAISE EXCEPTION 'A revision is approved only with the signature of its checker.' USING ERRCODE = 'SN006';
    END IF;
    IF EXISTS (SELECT 1 FROM check_comments c WHERE c.firm_id = new_row.firm_id AND c.revision_id = new_row.id AND c.state = 'open') THEN
      RAISE EXCEPTION 'A revision is not approved while a remark is open.' USING ERRCODE = 'SN006';
    END IF;
    IF EXISTS (SELECT 1 FROM revision_cables c WHERE c.firm_id = new_row.firm_id AND c.revision_id = new_row.id AND NOT EXISTS (
        SELECT 1 FROM cable_checks t WHERE t.firm_id = c.firm_id AND t.submission_id = submission AND t.cable_id = c.cable_id)) THEN
      RAISE EXCEPTION 'A revision is not approved while a cable is not ticked.' USING ERRCODE = 'SN006';
    END IF;
  ELSIF new_row.state = 'issued' THEN
    IF new_row.issued_at IS NULL OR new_row.unsigned_file_id IS NULL OR NOT has_signature(new_row.firm_id, submission, 'issued')
        OR NOT EXISTS (SELECT 1 FROM files f WHERE f.firm_id = new_row.firm_id AND f.id = new_row.signed_file_id
          AND f.kind = 'report-signed')
        OR NOT EXISTS (SELECT 1 FROM reports p WHERE p.firm_id = new_row.firm_id AND p.id = new_row.report_id
          AND p.client_id = new_row.addressed_client_id) THEN
      RAISE EXCEPTION 'A revision is issued only with its signed file and to the client of its report.' USING ERRCODE = 'SN006';
    END IF;
  ELSIF new_row.state = 'superseded' AND NOT EXISTS (SELECT 1 FROM revisions later WHERE later.firm_id = new_row.firm_id
      AND later.id = new_row.superseded_by AND later.report_id = new_row.report_id AND later.id <> new_row.id) THEN
    RAISE EXCEPTION 'A revision is superseded by another revision of its report.' USING ERRCODE = 'SN006';
  ELSIF new_row.state = 'withdrawn' AND (new_row.withdrawn_at IS NULL OR coalesce(new_row.withdrawn_reason, '') = '') THEN
    RAISE EXCEPTION 'A revision is withdrawn only with a reason.' USING ERRCODE = 'SN006';
  END IF;
END $$;
CREATE FUNCTION has_signature(firm uuid, submission uuid, wanted text) RETURNS boolean LANGUAGE sql STABLE
  SET search_path = pg_catalog, public, pg_temp AS $$
  SELECT EXISTS (SELECT 1 FROM signatures WHERE firm_id = firm AND submission_id = submission AND meaning = wanted)
$$;

CREATE OR REPLACE FUNCTION guard_revision() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp AS $$
DECLARE
  status constant text[] := ARRAY['state', 'superseded_at', 'superseded_by', 'withdrawn_at', 'withdrawn_reason', 'changed_at'];
BEGIN
  IF (NEW.firm_id, NEW.id, NEW.report_id, NEW.letter, NEW.author_user_id, NEW.verification_code, NEW.created_at) IS DISTINCT FROM
      (OLD.firm_id, OLD.id, OLD.report_id, OLD.letter, OLD.author_user_id, OLD.verification_code, OLD.created_at) THEN
    RAISE EXCEPTION 'What names a revision is never changed.' USING ERRCODE = 'SN006';
  END IF;
  IF OLD.state NOT IN ('draft', 'returned') AND (NEW.texts, NEW.text_version) IS DISTINCT FROM (OLD.texts, OLD.text_version) THEN
    RAISE EXCEPTION 'The texts of a revision are frozen while it is %.', OLD.state USING ERRCODE = 'SN006';
  END IF;
  -- What was approved and rendered is what is issued.
  IF OLD.state = 'approved' AND NEW.state <> 'returned' AND (NEW.approved_submission_id IS DISTINCT FROM OLD.approved_submission_id
      OR NEW.approved_at IS DISTINCT FROM OLD.approved_at
      OR (OLD.unsigned_file_id IS NOT NULL AND NEW.unsigned_file_id IS DISTINCT FROM OLD.unsigned_file_id)) THEN
    RAISE EXCEPTION 'An approved revision keeps what was approved.' USING ERRCODE = 'SN006';
  END IF;
  IF OLD.state IN ('issued', 'superseded', 'withdrawn') AND (to_jsonb(NEW) - status) IS DISTINCT FROM (to_jsonb(OLD) - status) THEN
    RAISE EXCEPTION 'An issued revision is never changed: it can only be superseded or withdrawn.' USING ERRCODE = 'SN006';
  END IF;
  IF (OLD.superseded_by IS NOT NULL AND (NEW.superseded_at, NEW.superseded_by) IS DISTINCT FROM (OLD.superseded_at, OLD.superseded_by))
      OR (OLD.withdrawn_at IS NOT NULL AND (NEW.withdrawn_at, NEW.withdrawn_reason) IS DISTINCT FROM
        (OLD.withdrawn_at, OLD.withdrawn_reason)) THEN
    RAISE EXCEPTION 'When and why a revision was superseded or withdrawn is written once.' USING ERRCODE = 'SN006';
  END IF;
  IF NEW.state <> OLD.state THEN PERFORM assert_move(OLD, NEW); END IF;
  RETURN NEW;
END $$;
REVOKE EXECUTE ON FUNCTION assert_move, has_signature FROM PUBLIC;
--> statement-breakpoint

-- A chain whose head is gone is not whole either.
CREATE OR REPLACE FUNCTION audit_faults(firm uuid) RETURNS TABLE (sequence bigint, message text) LANGUAGE sql STABLE
  SET search_path = pg_catalog, public, pg_temp AS $$
  WITH chain AS (
    SELECT e.sequence, e.hash, e.previous_hash, audit_hash(e) AS recomputed,
      lag(e.hash, 1, repeat('0', 64)) OVER (ORDER BY e.sequence) AS before,
      lag(e.sequence, 1, 0::bigint) OVER (ORDER BY e.sequence) AS sequence_before
    FROM audit_events e WHERE e.firm_id = firm
  ), last AS (SELECT e.sequence, e.hash FROM audit_events e WHERE e.firm_id = firm ORDER BY e.sequence DESC LIMIT 1)
  SELECT c.sequence, CASE
      WHEN c.sequence <> c.sequence_before + 1 THEN format('Events %s to %s are missing.', c.sequence_before + 1, c.sequence - 1)
      WHEN c.previous_hash <> c.before THEN format('Event %s does not follow event %s.', c.sequence, c.sequence_before)
      ELSE format('Event %s was changed after it was written.', c.sequence) END
  FROM chain c
  WHERE c.sequence <> c.sequence_before + 1 OR c.previous_hash <> c.before OR c.hash <> c.recomputed
  UNION ALL
  SELECT h.sequence, format('The head names event %s, which is not the last one.', h.sequence)
  FROM audit_heads h LEFT JOIN last ON true
  WHERE h.firm_id = firm AND (h.sequence, h.hash) IS DISTINCT FROM (last.sequence, last.hash)
  UNION ALL
  SELECT last.sequence, format('The head of the chain is missing; the last event is %s.', last.sequence)
  FROM last WHERE NOT EXISTS (SELECT 1 FROM audit_heads h WHERE h.firm_id = firm)
  ORDER BY 1
$$;
--> statement-breakpoint

-- Anyone may ask, so each of the two keys is looked up by its index.
CREATE OR REPLACE FUNCTION verify_report(key text) RETURNS TABLE (code text, report_number text, letter text, firm_name text,
    structure_name text, state text, issued_at timestamptz, superseded_by_letter text, superseded_at timestamptz,
    withdrawn_at timestamptz, sha256 text, demonstration boolean)
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
  WITH found AS (
    SELECT r.firm_id, r.id FROM revisions r WHERE r.verification_code = key
    UNION
    SELECT r.firm_id, r.id FROM files f JOIN revisions r ON r.firm_id = f.firm_id AND r.signed_file_id = f.id WHERE f.sha256 = key
  )
  SELECT r.verification_code, p.number, r.letter, f.name, (s.content::jsonb -> 'structure' ->> 'name'), r.state, r.issued_at, later.letter,
    r.superseded_at, r.withdrawn_at, file.sha256, f.demonstration
  FROM found
  JOIN revisions r ON r.firm_id = found.firm_id AND r.id = found.id
  JOIN reports p ON p.firm_id = r.firm_id AND p.id = r.report_id
  JOIN firms f ON f.id = r.firm_id
  JOIN files file ON file.firm_id = r.firm_id AND file.id = r.signed_file_id
  JOIN submissions s ON s.firm_id = r.firm_id AND s.id = r.approved_submission_id
  LEFT JOIN revisions later ON later.firm_id = r.firm_id AND later.id = r.superseded_by
  WHERE r.state IN ('issued', 'superseded', 'withdrawn')
$$;
