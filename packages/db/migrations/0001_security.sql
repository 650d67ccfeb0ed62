-- Who may reach which row, what can never be changed, and the rules that hold even when the server's code is wrong.

GRANT USAGE ON SCHEMA identity TO strandnote_identity;
GRANT SELECT, INSERT, UPDATE, DELETE ON ALL TABLES IN SCHEMA identity TO strandnote_identity;
GRANT USAGE ON SCHEMA public TO strandnote_app;
--> statement-breakpoint

-- The actor of a transaction, set locally by withFirm. Unset reads as null, and null equals no firm.
CREATE FUNCTION current_firm() RETURNS uuid LANGUAGE sql STABLE
  AS $$ SELECT nullif(current_setting('strandnote.firm_id', true), '')::uuid $$;
CREATE FUNCTION current_actor() RETURNS text LANGUAGE sql STABLE
  AS $$ SELECT nullif(current_setting('strandnote.user_id', true), '') $$;
CREATE FUNCTION current_client() RETURNS uuid LANGUAGE sql STABLE
  AS $$ SELECT nullif(current_setting('strandnote.client_id', true), '')::uuid $$;
--> statement-breakpoint

-- Every tenant table: forced row-level security, bound to the firm, closed to clients.
DO $$
DECLARE t text;
BEGIN
  FOREACH t IN ARRAY ARRAY['clients', 'members', 'invitations', 'structures', 'sections', 'cables', 'spans', 'reference_tensions',
    'campaigns', 'campaign_cables', 'measurements', 'modal_peaks', 'estimates', 'files', 'file_chunks', 'reports', 'revisions',
    'revision_cables', 'submissions', 'submission_sources', 'signatures', 'cable_checks', 'check_comments', 'contributions',
    'audit_events', 'audit_heads'] LOOP
    EXECUTE format('ALTER TABLE %I ENABLE ROW LEVEL SECURITY', t);
    EXECUTE format('ALTER TABLE %I FORCE ROW LEVEL SECURITY', t);
    EXECUTE format('CREATE POLICY staff_of_the_firm ON %I TO strandnote_app
      USING (firm_id = current_firm() AND current_client() IS NULL)
      WITH CHECK (firm_id = current_firm() AND current_client() IS NULL)', t);
    EXECUTE format('ALTER TABLE %I ADD CONSTRAINT %I FOREIGN KEY (firm_id) REFERENCES firms (id)', t, t || '_firm');
  END LOOP;
END $$;
--> statement-breakpoint

ALTER TABLE firms ENABLE ROW LEVEL SECURITY;
ALTER TABLE firms FORCE ROW LEVEL SECURITY;
CREATE POLICY own_firm ON firms FOR SELECT TO strandnote_app USING (id = current_firm());
CREATE POLICY own_firm_edit ON firms FOR UPDATE TO strandnote_app
  USING (id = current_firm() AND current_client() IS NULL) WITH CHECK (id = current_firm() AND current_client() IS NULL);
--> statement-breakpoint

-- What a client sees: themselves, and the frozen content and signed file of what was addressed to them when it was issued.
CREATE POLICY client_self ON members FOR SELECT TO strandnote_app
  USING (firm_id = current_firm() AND current_client() IS NOT NULL AND user_id = current_actor());
CREATE POLICY client_self_edit ON members FOR UPDATE TO strandnote_app
  USING (firm_id = current_firm() AND current_client() IS NOT NULL AND user_id = current_actor())
  WITH CHECK (firm_id = current_firm() AND client_id = current_client() AND user_id = current_actor() AND roles = ARRAY['client']);
CREATE POLICY client_revisions ON revisions FOR SELECT TO strandnote_app
  USING (firm_id = current_firm() AND addressed_client_id = current_client() AND state IN ('issued', 'superseded', 'withdrawn'));
CREATE POLICY client_reports ON reports FOR SELECT TO strandnote_app
  USING (firm_id = current_firm() AND current_client() IS NOT NULL
    AND EXISTS (SELECT 1 FROM revisions r WHERE r.firm_id = reports.firm_id AND r.report_id = reports.id));
CREATE POLICY client_submissions ON submissions FOR SELECT TO strandnote_app
  USING (firm_id = current_firm() AND current_client() IS NOT NULL
    AND EXISTS (SELECT 1 FROM revisions r WHERE r.firm_id = submissions.firm_id AND r.approved_submission_id = submissions.id));
CREATE POLICY client_signatures ON signatures FOR SELECT TO strandnote_app
  USING (firm_id = current_firm() AND current_client() IS NOT NULL
    AND EXISTS (SELECT 1 FROM revisions r WHERE r.firm_id = signatures.firm_id AND r.approved_submission_id = signatures.submission_id));
CREATE POLICY client_files ON files FOR SELECT TO strandnote_app
  USING (firm_id = current_firm() AND current_client() IS NOT NULL
    AND EXISTS (SELECT 1 FROM revisions r WHERE r.firm_id = files.firm_id AND r.signed_file_id = files.id));
CREATE POLICY client_file_chunks ON file_chunks FOR SELECT TO strandnote_app
  USING (firm_id = current_firm() AND current_client() IS NOT NULL
    AND EXISTS (SELECT 1 FROM revisions r WHERE r.firm_id = file_chunks.firm_id AND r.signed_file_id = file_chunks.file_id));
-- A client's download is an event too; the trail itself stays closed to them.
CREATE POLICY client_events ON audit_events FOR INSERT TO strandnote_app
  WITH CHECK (firm_id = current_firm() AND current_client() IS NOT NULL AND actor_user_id = current_actor());
--> statement-breakpoint

-- Rights of the application's role. Nothing is deleted but peaks, ticks and the cables of a draft; what is frozen has no UPDATE.
GRANT SELECT, UPDATE ON firms TO strandnote_app;
GRANT SELECT, INSERT, UPDATE ON clients, members, invitations, structures, sections, cables, spans, reference_tensions, campaigns,
  campaign_cables, measurements, reports, revisions, check_comments TO strandnote_app;
GRANT SELECT, INSERT, UPDATE, DELETE ON modal_peaks TO strandnote_app;
GRANT SELECT, INSERT, DELETE ON cable_checks, revision_cables TO strandnote_app;
GRANT SELECT, INSERT ON estimates, files, file_chunks, submissions, submission_sources, signatures, audit_events TO strandnote_app;
GRANT SELECT ON contributions, audit_heads TO strandnote_app;
--> statement-breakpoint

-- Append-only even for the owner of the tables.
CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION 'Rows of % are never changed or deleted.', TG_TABLE_NAME USING ERRCODE = 'SN004';
END $$;
DO $$
DECLARE t text;
BEGIN
  FOREACH t IN ARRAY ARRAY['estimates', 'files', 'file_chunks', 'submissions', 'submission_sources', 'signatures', 'contributions',
    'audit_events'] LOOP
    EXECUTE format('CREATE TRIGGER append_only BEFORE UPDATE OR DELETE ON %I FOR EACH ROW EXECUTE FUNCTION refuse_change()', t);
    EXECUTE format('CREATE TRIGGER append_only_whole BEFORE TRUNCATE ON %I FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()', t);
  END LOOP;
END $$;
--> statement-breakpoint

-- The audit chain. The text that is hashed is the array below as PostgreSQL prints jsonb: keys in its own order, so that one
-- event has one text.
CREATE FUNCTION audit_text(e audit_events) RETURNS text LANGUAGE sql IMMUTABLE AS $$
  SELECT jsonb_build_array(e.firm_id, e.sequence, extract(epoch FROM e.at), e.actor_user_id, e.actor_name, e.act, e.subject_kind,
    e.subject_id, e.details, e.previous_hash)::text
$$;
CREATE FUNCTION audit_hash(e audit_events) RETURNS text LANGUAGE sql IMMUTABLE AS $$
  SELECT encode(sha256(convert_to(audit_text(e), 'UTF8')), 'hex')
$$;
CREATE FUNCTION stamp_audit_event() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public AS $$
DECLARE head audit_heads;
BEGIN
  INSERT INTO audit_heads (firm_id, sequence, hash) VALUES (NEW.firm_id, 0, repeat('0', 64)) ON CONFLICT DO NOTHING;
  -- The lock on the head holds until commit: events of a firm have no gaps and one order.
  SELECT * INTO head FROM audit_heads WHERE firm_id = NEW.firm_id FOR UPDATE;
  NEW.sequence := head.sequence + 1;
  NEW.previous_hash := head.hash;
  NEW.hash := audit_hash(NEW);
  UPDATE audit_heads SET sequence = NEW.sequence, hash = NEW.hash WHERE firm_id = NEW.firm_id;
  RETURN NEW;
END $$;
CREATE TRIGGER stamp BEFORE INSERT ON audit_events FOR EACH ROW EXECUTE FUNCTION stamp_audit_event();
-- Recomputes a firm's chain; a row for each event that does not fit, none when the chain is whole.
CREATE FUNCTION audit_faults(firm uuid) RETURNS TABLE (sequence bigint, message text) LANGUAGE sql STABLE AS $$
  WITH chain AS (
    SELECT e.sequence, e.hash, e.previous_hash, audit_hash(e) AS recomputed,
      lag(e.hash, 1, repeat('0', 64)) OVER (ORDER BY e.sequence) AS before,
      lag(e.sequence, 1, 0::bigint) OVER (ORDER BY e.sequence) AS sequence_before
    FROM audit_events e WHERE e.firm_id = firm
  )
  SELECT c.sequence, CASE
      WHEN c.sequence <> c.sequence_before + 1 THEN format('Events %s to %s are missing.', c.sequence_before + 1, c.sequence - 1)
      WHEN c.previous_hash <> c.before THEN format('Event %s does not follow event %s.', c.sequence, c.sequence_before)
      ELSE format('Event %s was changed after it was written.', c.sequence) END
  FROM chain c
  WHERE c.sequence <> c.sequence_before + 1 OR c.previous_hash <> c.before OR c.hash <> c.recomputed
  UNION ALL
  SELECT h.sequence, format('The head names event %s, which is not the last one.', h.sequence)
  FROM audit_heads h
  WHERE h.firm_id = firm AND NOT EXISTS (
    SELECT 1 FROM audit_events e WHERE e.firm_id = firm AND e.sequence = h.sequence AND e.hash = h.hash
      AND NOT EXISTS (SELECT 1 FROM audit_events later WHERE later.firm_id = firm AND later.sequence > e.sequence))
  ORDER BY 1
$$;
--> statement-breakpoint

-- Who entered or changed a value. Written by the database, so that no command can forget it.
CREATE FUNCTION record_contribution() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public AS $$
DECLARE
  row_now jsonb := to_jsonb(CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END);
BEGIN
  IF current_actor() IS NULL THEN
    RAISE EXCEPTION 'A value can only be entered by a named person.' USING ERRCODE = 'SN005';
  END IF;
  INSERT INTO contributions (firm_id, id, entity, entity_id, user_id, at)
    VALUES ((row_now ->> 'firm_id')::uuid, gen_random_uuid(), TG_ARGV[0], (row_now ->> TG_ARGV[1])::uuid, current_actor(), clock_timestamp());
  RETURN NULL;
END $$;
CREATE TRIGGER contribution AFTER INSERT OR UPDATE ON sections FOR EACH ROW EXECUTE FUNCTION record_contribution('section', 'id');
CREATE TRIGGER contribution AFTER INSERT OR UPDATE ON cables FOR EACH ROW EXECUTE FUNCTION record_contribution('cable', 'id');
CREATE TRIGGER contribution AFTER INSERT OR UPDATE ON spans FOR EACH ROW EXECUTE FUNCTION record_contribution('span', 'id');
CREATE TRIGGER contribution AFTER INSERT OR UPDATE ON reference_tensions FOR EACH ROW EXECUTE FUNCTION record_contribution('reference-tension', 'id');
CREATE TRIGGER contribution AFTER INSERT OR UPDATE ON campaigns FOR EACH ROW EXECUTE FUNCTION record_contribution('campaign', 'id');
CREATE TRIGGER contribution AFTER UPDATE ON campaign_cables FOR EACH ROW EXECUTE FUNCTION record_contribution('campaign-cable', 'id');
CREATE TRIGGER contribution AFTER INSERT OR UPDATE ON measurements FOR EACH ROW EXECUTE FUNCTION record_contribution('measurement', 'id');
CREATE TRIGGER contribution AFTER INSERT OR UPDATE OR DELETE ON modal_peaks FOR EACH ROW EXECUTE FUNCTION record_contribution('measurement', 'measurement_id');
CREATE TRIGGER contribution AFTER INSERT ON estimates FOR EACH ROW EXECUTE FUNCTION record_contribution('estimate', 'id');
CREATE TRIGGER contribution AFTER INSERT ON revisions FOR EACH ROW EXECUTE FUNCTION record_contribution('revision', 'id');
CREATE TRIGGER contribution_texts AFTER UPDATE OF texts ON revisions FOR EACH ROW WHEN (OLD.texts IS DISTINCT FROM NEW.texts)
  EXECUTE FUNCTION record_contribution('revision', 'id');
--> statement-breakpoint

-- Whether a person prepared any part of a submission. A contribution no longer counts when an issued revision that used the same
-- value was frozen after it and checked by somebody else.
CREATE FUNCTION has_prepared(firm uuid, submission uuid, person text) RETURNS boolean
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public AS $$
  SELECT EXISTS (
    SELECT 1 FROM submissions s JOIN revisions r ON r.firm_id = s.firm_id AND r.id = s.revision_id
    WHERE s.firm_id = firm AND s.id = submission AND (s.submitted_by = person OR r.author_user_id = person)
  ) OR EXISTS (
    SELECT 1
    FROM submissions s
    JOIN submission_sources source ON source.firm_id = s.firm_id AND source.submission_id = s.id
    JOIN contributions c ON c.firm_id = source.firm_id AND c.entity = source.entity AND c.entity_id = source.entity_id
    WHERE s.firm_id = firm AND s.id = submission AND c.user_id = person AND c.at <= s.frozen_at
      AND NOT EXISTS (
        SELECT 1
        FROM submission_sources earlier
        JOIN submissions es ON es.firm_id = earlier.firm_id AND es.id = earlier.submission_id
        JOIN revisions er ON er.firm_id = es.firm_id AND er.approved_submission_id = es.id AND er.state IN ('issued', 'superseded')
        JOIN signatures g ON g.firm_id = es.firm_id AND g.submission_id = es.id AND g.meaning = 'checked and approved'
        WHERE earlier.firm_id = firm AND earlier.entity = source.entity AND earlier.entity_id = source.entity_id
          AND es.id <> s.id AND es.frozen_at >= c.at AND g.user_id <> person
      )
  )
$$;
CREATE FUNCTION refuse_own_work() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public AS $$
DECLARE person text := to_jsonb(NEW) ->> TG_ARGV[0];
BEGIN
  IF person IS DISTINCT FROM current_actor() THEN
    RAISE EXCEPTION 'Nobody signs or ticks for somebody else.' USING ERRCODE = 'SN002';
  END IF;
  IF has_prepared(NEW.firm_id, NEW.submission_id, person) THEN
    RAISE EXCEPTION 'You prepared part of this revision, so someone else must check it.' USING ERRCODE = 'SN001';
  END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER own_work BEFORE INSERT ON cable_checks FOR EACH ROW EXECUTE FUNCTION refuse_own_work('checked_by');
CREATE TRIGGER own_work BEFORE INSERT ON signatures FOR EACH ROW WHEN (NEW.meaning = 'checked and approved')
  EXECUTE FUNCTION refuse_own_work('user_id');
CREATE FUNCTION refuse_foreign_signature() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public AS $$
BEGIN
  IF NEW.user_id IS DISTINCT FROM current_actor() THEN
    RAISE EXCEPTION 'Nobody signs or ticks for somebody else.' USING ERRCODE = 'SN002';
  END IF;
  IF NOT EXISTS (SELECT 1 FROM submissions s WHERE s.firm_id = NEW.firm_id AND s.id = NEW.submission_id
      AND s.revision_id = NEW.revision_id AND s.content_sha256 = NEW.content_sha256) THEN
    RAISE EXCEPTION 'The signature names another content than the submission.' USING ERRCODE = 'SN003';
  END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER right_content BEFORE INSERT ON signatures FOR EACH ROW EXECUTE FUNCTION refuse_foreign_signature();
--> statement-breakpoint

-- States of a revision, and what stays as it is from which state on.
CREATE FUNCTION guard_revision() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public AS $$
BEGIN
  IF OLD.state <> NEW.state AND (OLD.state || ' > ' || NEW.state) NOT IN (
      'draft > in check', 'in check > draft', 'in check > returned', 'in check > approved', 'returned > draft', 'returned > in check',
      'approved > returned', 'approved > issued', 'issued > superseded', 'issued > withdrawn', 'superseded > withdrawn') THEN
    RAISE EXCEPTION 'A revision does not go from % to %.', OLD.state, NEW.state USING ERRCODE = 'SN006';
  END IF;
  IF (NEW.firm_id, NEW.id, NEW.report_id, NEW.letter, NEW.author_user_id, NEW.verification_code)
      IS DISTINCT FROM (OLD.firm_id, OLD.id, OLD.report_id, OLD.letter, OLD.author_user_id, OLD.verification_code) THEN
    RAISE EXCEPTION 'What names a revision is never changed.' USING ERRCODE = 'SN006';
  END IF;
  IF OLD.state NOT IN ('draft', 'returned') AND (NEW.texts, NEW.text_version) IS DISTINCT FROM (OLD.texts, OLD.text_version) THEN
    RAISE EXCEPTION 'The texts of a revision are frozen while it is %.', OLD.state USING ERRCODE = 'SN006';
  END IF;
  IF NEW.state = 'approved' AND OLD.state <> 'approved' AND NOT EXISTS (
      SELECT 1 FROM signatures g WHERE g.firm_id = NEW.firm_id AND g.revision_id = NEW.id AND g.submission_id = NEW.approved_submission_id
        AND g.meaning = 'checked and approved') THEN
    RAISE EXCEPTION 'A revision is approved only with the signature of its checker.' USING ERRCODE = 'SN006';
  END IF;
  IF NEW.state = 'issued' AND (NEW.signed_file_id IS NULL OR NEW.addressed_client_id IS NULL OR NEW.issued_at IS NULL) THEN
    RAISE EXCEPTION 'A revision is issued only with its signed file and its addressee.' USING ERRCODE = 'SN006';
  END IF;
  IF OLD.state IN ('issued', 'superseded', 'withdrawn') AND (NEW.signed_file_id, NEW.unsigned_file_id, NEW.approved_submission_id,
      NEW.addressed_client_id, NEW.issued_at, NEW.approved_at) IS DISTINCT FROM (OLD.signed_file_id, OLD.unsigned_file_id,
      OLD.approved_submission_id, OLD.addressed_client_id, OLD.issued_at, OLD.approved_at) THEN
    RAISE EXCEPTION 'An issued revision keeps its files and its addressee.' USING ERRCODE = 'SN006';
  END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER guard BEFORE UPDATE ON revisions FOR EACH ROW EXECUTE FUNCTION guard_revision();
--> statement-breakpoint

-- The few questions that are asked across firms.
CREATE FUNCTION my_firms(person text) RETURNS TABLE (firm_id uuid, firm_name text, time_zone text, demonstration boolean, member_id uuid,
    member_name text, email text, roles text[], client_id uuid, client_name text, units text, licence_number text, licence_jurisdiction text)
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public AS $$
  SELECT f.id, f.name, f.time_zone, f.demonstration, m.id, m.name, m.email, m.roles, m.client_id, c.name, m.units, m.licence_number,
    m.licence_jurisdiction
  FROM members m JOIN firms f ON f.id = m.firm_id LEFT JOIN clients c ON c.firm_id = m.firm_id AND c.id = m.client_id
  WHERE m.user_id = person AND m.active ORDER BY f.name
$$;
CREATE FUNCTION invitation_by_token(token text) RETURNS TABLE (firm_id uuid, firm_name text, invitation_id uuid, name text, email text,
    roles text[], client_id uuid, expires_at timestamptz, accepted_at timestamptz, revoked_at timestamptz)
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public AS $$
  SELECT i.firm_id, f.name, i.id, i.name, i.email, i.roles, i.client_id, i.expires_at, i.accepted_at, i.revoked_at
  FROM invitations i JOIN firms f ON f.id = i.firm_id WHERE i.token_sha256 = token
$$;
-- Makes the person a member; no row when the invitation is used, revoked or too old.
CREATE FUNCTION accept_invitation(token text, person text, new_member uuid, now_at timestamptz) RETURNS TABLE (firm_id uuid, member_id uuid)
  LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public AS $$
DECLARE i invitations;
BEGIN
  UPDATE invitations SET accepted_at = now_at
    WHERE token_sha256 = token AND accepted_at IS NULL AND revoked_at IS NULL AND expires_at > now_at RETURNING * INTO i;
  IF NOT FOUND THEN RETURN; END IF;
  INSERT INTO members AS m (firm_id, id, user_id, name, email, roles, client_id)
    VALUES (i.firm_id, new_member, person, i.name, i.email, i.roles, i.client_id)
    ON CONFLICT ON CONSTRAINT members_user DO UPDATE SET roles = EXCLUDED.roles, client_id = EXCLUDED.client_id, active = true
    RETURNING m.id INTO new_member;
  RETURN QUERY SELECT i.firm_id, new_member;
END $$;
-- What anyone may know who holds a report's code, or the file itself and so its hash.
CREATE FUNCTION verify_report(key text) RETURNS TABLE (code text, report_number text, letter text, firm_name text, structure_name text,
    state text, issued_at timestamptz, superseded_by_letter text, superseded_at timestamptz, withdrawn_at timestamptz, sha256 text,
    demonstration boolean)
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public AS $$
  SELECT r.verification_code, p.number, r.letter, f.name, (s.content::jsonb -> 'structure' ->> 'name'), r.state, r.issued_at, later.letter,
    r.superseded_at, r.withdrawn_at, file.sha256, f.demonstration
  FROM revisions r
  JOIN reports p ON p.firm_id = r.firm_id AND p.id = r.report_id
  JOIN firms f ON f.id = r.firm_id
  JOIN files file ON file.firm_id = r.firm_id AND file.id = r.signed_file_id
  JOIN submissions s ON s.firm_id = r.firm_id AND s.id = r.approved_submission_id
  LEFT JOIN revisions later ON later.firm_id = r.firm_id AND later.id = r.superseded_by
  WHERE r.state IN ('issued', 'superseded', 'withdrawn') AND (r.verification_code = key OR file.sha256 = key)
$$;
-- Makes a firm with the invitation of its first administrator; for the operator of an installation, not for the application.
CREATE FUNCTION create_firm(firm uuid, firm_name text, zone text, invitation uuid, admin_name text, admin_email text, token text,
    expires timestamptz, is_demonstration boolean) RETURNS void
  LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, public AS $$
BEGIN
  INSERT INTO firms (id, name, time_zone, letterhead, demonstration)
    VALUES (firm, firm_name, zone, '{"addressLines": [], "phone": "", "email": "", "registration": ""}', is_demonstration);
  INSERT INTO invitations (firm_id, id, name, email, roles, token_sha256, expires_at, invited_by)
    VALUES (firm, invitation, admin_name, admin_email, ARRAY['admin'], token, expires, 'operator');
END $$;
REVOKE EXECUTE ON FUNCTION my_firms, invitation_by_token, accept_invitation, verify_report, create_firm, has_prepared FROM PUBLIC;
GRANT EXECUTE ON FUNCTION my_firms, invitation_by_token, accept_invitation, verify_report, has_prepared TO strandnote_app;
