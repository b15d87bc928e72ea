-- Tenants. Every row below belongs to one organisation and is seen only by a transaction that has entered it
-- (setting app.org, made by one function of the application). FORCE binds the owner of the tables as well.
DO $$
DECLARE
  name text;
BEGIN
  FOREACH name IN ARRAY ARRAY[
    'project', 'audit_event', 'plant_record', 'study', 'study_record', 'study_run', 'case_run', 'revision',
    'decision', 'report', 'authority', 'certificate', 'signature_round', 'prepared_signature', 'signoff'
  ] LOOP
    EXECUTE format('ALTER TABLE %I ENABLE ROW LEVEL SECURITY', name);
    EXECUTE format('ALTER TABLE %I FORCE ROW LEVEL SECURITY', name);
    EXECUTE format(
      'CREATE POLICY tenant ON %I USING (organisation_id = current_setting(''app.org'', true)) '
      'WITH CHECK (organisation_id = current_setting(''app.org'', true))', name);
  END LOOP;
END
$$;

ALTER TABLE organisation ENABLE ROW LEVEL SECURITY;
ALTER TABLE organisation FORCE ROW LEVEL SECURITY;
CREATE POLICY tenant ON organisation
  USING (id = current_setting('app.org', true)) WITH CHECK (id = current_setting('app.org', true));

-- A person's own memberships are what leads to an organisation, so that they can be read before one is entered.
ALTER TABLE membership ENABLE ROW LEVEL SECURITY;
ALTER TABLE membership FORCE ROW LEVEL SECURITY;
CREATE POLICY tenant ON membership
  USING (organisation_id = current_setting('app.org', true)) WITH CHECK (organisation_id = current_setting('app.org', true));
CREATE POLICY own ON membership FOR SELECT USING (user_id = current_setting('app.user', true));

ALTER TABLE project_membership ENABLE ROW LEVEL SECURITY;
ALTER TABLE project_membership FORCE ROW LEVEL SECURITY;
CREATE POLICY tenant ON project_membership
  USING (organisation_id = current_setting('app.org', true)) WITH CHECK (organisation_id = current_setting('app.org', true));
CREATE POLICY own ON project_membership FOR SELECT USING (user_id = current_setting('app.user', true));

-- A hash leads to its organisation only for who holds the file or certificate and so can name the hash.
ALTER TABLE register_entry ENABLE ROW LEVEL SECURITY;
ALTER TABLE register_entry FORCE ROW LEVEL SECURITY;
CREATE POLICY tenant ON register_entry
  USING (organisation_id = current_setting('app.org', true)) WITH CHECK (organisation_id = current_setting('app.org', true));
CREATE POLICY named ON register_entry FOR SELECT USING (digest = current_setting('app.digest', true));

-- Words that a column may hold.
ALTER TABLE membership ADD CONSTRAINT membership_role_check CHECK (role IN ('administrator', 'member'));
ALTER TABLE project_membership ADD CONSTRAINT project_membership_roles_check CHECK (
  cardinality(roles) > 0
  AND roles <@ ARRAY['engineer', 'checker', 'approver', 'commenter', 'client', 'administrator']);
ALTER TABLE plant_record ADD CONSTRAINT plant_record_bus_kind_check CHECK (bus_kind = 'bus');
ALTER TABLE plant_record ADD CONSTRAINT plant_record_kind_check CHECK (kind IN (
  'bus', 'supply', 'transformer', 'line', 'load', 'capacitor', 'motor', 'driven-load', 'starter', 'plant-condition', 'load-condition'));
ALTER TABLE study_record ADD CONSTRAINT study_record_kind_check CHECK (kind IN ('schedule', 'case', 'limit'));
ALTER TABLE study_run ADD CONSTRAINT study_run_state_check CHECK (state IN ('queued', 'running', 'done', 'failed', 'stopped'));
ALTER TABLE report ADD CONSTRAINT report_kind_check CHECK (kind IN ('draft', 'final'));
ALTER TABLE report ADD CONSTRAINT report_state_check CHECK (state IN ('queued', 'running', 'done', 'failed'));
ALTER TABLE report ADD CONSTRAINT report_done_check CHECK (
  state <> 'done' OR (file IS NOT NULL AND sha256 IS NOT NULL AND pages IS NOT NULL AND bytes IS NOT NULL));
ALTER TABLE revision ADD CONSTRAINT revision_state_check CHECK (state IN (
  'draft', 'in-check', 'in-review', 'review-closed', 'issued', 'superseded', 'withdrawn'));
ALTER TABLE signoff ADD CONSTRAINT signoff_role_check CHECK (role IN ('prepared', 'checked', 'approved'));
ALTER TABLE register_entry ADD CONSTRAINT register_entry_kind_check CHECK (kind IN ('report', 'certificate'));

-- What may only happen once at a time.
CREATE UNIQUE INDEX study_run_one_open ON study_run (organisation_id, study_id) WHERE state IN ('queued', 'running');
CREATE UNIQUE INDEX revision_one_issued ON revision (organisation_id, study_id) WHERE state = 'issued';
CREATE UNIQUE INDEX revision_one_open ON revision (organisation_id, study_id) WHERE state IN ('in-check', 'in-review', 'review-closed');
CREATE UNIQUE INDEX signature_round_one_open ON signature_round (organisation_id, revision_id) WHERE ended_at IS NULL;
CREATE UNIQUE INDEX certificate_one_active ON certificate (organisation_id, user_id) WHERE revoked_at IS NULL;

-- What is only ever added to.
CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION 'rows of % are only ever added', TG_TABLE_NAME USING ERRCODE = 'restrict_violation';
END
$$;

DO $$
DECLARE
  name text;
BEGIN
  FOREACH name IN ARRAY ARRAY['audit_event', 'decision', 'signoff', 'register_entry'] LOOP
    EXECUTE format('CREATE TRIGGER append_only BEFORE UPDATE OR DELETE ON %I FOR EACH ROW EXECUTE FUNCTION refuse_change()', name);
  END LOOP;
  FOREACH name IN ARRAY ARRAY[
    'audit_event', 'decision', 'signoff', 'register_entry', 'certificate', 'revision', 'signature_round', 'report', 'authority'
  ] LOOP
    EXECUTE format('CREATE TRIGGER not_emptied BEFORE TRUNCATE ON %I FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()', name);
  END LOOP;
  FOREACH name IN ARRAY ARRAY['certificate', 'revision', 'authority'] LOOP
    EXECUTE format('CREATE TRIGGER kept BEFORE DELETE ON %I FOR EACH ROW EXECUTE FUNCTION refuse_change()', name);
  END LOOP;
END
$$;

-- A certificate changes once: when it is revoked.
CREATE FUNCTION certificate_revoked_once() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE
  before certificate := OLD;
BEGIN
  before.revoked_at := NEW.revoked_at;
  before.revoked_reason := NEW.revoked_reason;
  IF OLD.revoked_at IS NOT NULL OR NEW.revoked_at IS NULL OR before IS DISTINCT FROM NEW THEN
    RAISE EXCEPTION 'a listed certificate can only be revoked, and once' USING ERRCODE = 'restrict_violation';
  END IF;
  RETURN NEW;
END
$$;
CREATE TRIGGER revoked_once BEFORE UPDATE ON certificate FOR EACH ROW EXECUTE FUNCTION certificate_revoked_once();

-- What a revision froze never changes; once it is issued only its standing does.
CREATE FUNCTION revision_frozen() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE
  before revision := OLD;
BEGIN
  IF (NEW.organisation_id, NEW.project_id, NEW.study_id, NEW.id, NEW.number, NEW.attempt, NEW.document, NEW.document_hash,
      NEW.input_hash, NEW.engine_version, NEW.run_id, NEW.versions, NEW.note, NEW.frozen_by_id, NEW.frozen_by_name, NEW.frozen_at)
     IS DISTINCT FROM
     (OLD.organisation_id, OLD.project_id, OLD.study_id, OLD.id, OLD.number, OLD.attempt, OLD.document, OLD.document_hash,
      OLD.input_hash, OLD.engine_version, OLD.run_id, OLD.versions, OLD.note, OLD.frozen_by_id, OLD.frozen_by_name, OLD.frozen_at)
  THEN
    RAISE EXCEPTION 'what a revision froze cannot be changed' USING ERRCODE = 'restrict_violation';
  END IF;
  IF OLD.state IN ('issued', 'superseded', 'withdrawn') THEN
    before.state := NEW.state;
    before.superseded_at := NEW.superseded_at;
    before.withdrawn_at := NEW.withdrawn_at;
    before.withdrawn_reason := NEW.withdrawn_reason;
    IF before IS DISTINCT FROM NEW
      OR NEW.state NOT IN ('issued', 'superseded', 'withdrawn')
      OR (OLD.state <> 'issued' AND NEW.state <> OLD.state)
    THEN
      RAISE EXCEPTION 'an issued revision can only be superseded or withdrawn' USING ERRCODE = 'restrict_violation';
    END IF;
  END IF;
  RETURN NEW;
END
$$;
CREATE TRIGGER frozen BEFORE UPDATE ON revision FOR EACH ROW EXECUTE FUNCTION revision_frozen();

-- A rendered file and a completed or abandoned round stay as they are.
CREATE FUNCTION refuse_when_over() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION 'this row of % is over and stays as it is', TG_TABLE_NAME USING ERRCODE = 'restrict_violation';
END
$$;
CREATE TRIGGER over BEFORE UPDATE OR DELETE ON report
  FOR EACH ROW WHEN (OLD.state = 'done') EXECUTE FUNCTION refuse_when_over();
CREATE TRIGGER over BEFORE UPDATE OR DELETE ON signature_round
  FOR EACH ROW WHEN (OLD.ended_at IS NOT NULL OR OLD.completed_at IS NOT NULL) EXECUTE FUNCTION refuse_when_over();
CREATE TRIGGER over BEFORE UPDATE ON study_run
  FOR EACH ROW WHEN (OLD.state = 'done') EXECUTE FUNCTION refuse_when_over();
CREATE TRIGGER over BEFORE UPDATE ON case_run FOR EACH ROW EXECUTE FUNCTION refuse_change();
