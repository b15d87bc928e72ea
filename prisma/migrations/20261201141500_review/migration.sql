-- CreateTable
CREATE TABLE "comment" (
    "organisation_id" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "project_id" TEXT NOT NULL,
    "study_id" TEXT NOT NULL,
    "revision_id" TEXT NOT NULL,
    "number" INTEGER NOT NULL,
    "anchor" TEXT NOT NULL,
    "anchor_label" TEXT NOT NULL,
    "anchor_value" TEXT,
    "kind" TEXT NOT NULL,
    "text" TEXT NOT NULL,
    "author_id" TEXT NOT NULL,
    "author_name" TEXT NOT NULL,
    "at" TIMESTAMPTZ(3) NOT NULL,
    "assignee_id" TEXT,
    "assignee_name" TEXT,
    "due_on" TEXT,
    "state" TEXT NOT NULL,
    "response" TEXT,
    "closed_at" TIMESTAMPTZ(3),

    CONSTRAINT "comment_pkey" PRIMARY KEY ("organisation_id","id")
);

-- CreateTable
CREATE TABLE "comment_entry" (
    "organisation_id" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "comment_id" TEXT NOT NULL,
    "position" INTEGER NOT NULL,
    "kind" TEXT NOT NULL,
    "text" TEXT NOT NULL,
    "author_id" TEXT NOT NULL,
    "author_name" TEXT NOT NULL,
    "at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "comment_entry_pkey" PRIMARY KEY ("organisation_id","id")
);

-- CreateTable
CREATE TABLE "notice" (
    "organisation_id" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "user_id" TEXT NOT NULL,
    "comment_id" TEXT NOT NULL,
    "revision_id" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "by_name" TEXT NOT NULL,
    "excerpt" TEXT NOT NULL,
    "at" TIMESTAMPTZ(3) NOT NULL,
    "read_at" TIMESTAMPTZ(3),
    "mailed_at" TIMESTAMPTZ(3),

    CONSTRAINT "notice_pkey" PRIMARY KEY ("organisation_id","id")
);

-- CreateTable
CREATE TABLE "waiver" (
    "organisation_id" TEXT NOT NULL,
    "revision_id" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "subject_id" TEXT NOT NULL,
    "what" TEXT NOT NULL,
    "reason" TEXT NOT NULL,
    "person_id" TEXT NOT NULL,
    "person_name" TEXT NOT NULL,
    "at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "waiver_pkey" PRIMARY KEY ("organisation_id","revision_id","kind","subject_id")
);

-- CreateTable
CREATE TABLE "input_tick" (
    "organisation_id" TEXT NOT NULL,
    "revision_id" TEXT NOT NULL,
    "anchor" TEXT NOT NULL,
    "value" TEXT NOT NULL,
    "person_id" TEXT NOT NULL,
    "person_name" TEXT NOT NULL,
    "at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "input_tick_pkey" PRIMARY KEY ("organisation_id","revision_id","anchor")
);

-- CreateIndex
CREATE INDEX "comment_organisation_id_revision_id_idx" ON "comment"("organisation_id", "revision_id");

-- CreateIndex
CREATE UNIQUE INDEX "comment_organisation_id_study_id_number_key" ON "comment"("organisation_id", "study_id", "number");

-- CreateIndex
CREATE UNIQUE INDEX "comment_entry_organisation_id_comment_id_position_key" ON "comment_entry"("organisation_id", "comment_id", "position");

-- CreateIndex
CREATE INDEX "notice_organisation_id_user_id_at_idx" ON "notice"("organisation_id", "user_id", "at");

-- AddForeignKey
ALTER TABLE "comment" ADD CONSTRAINT "comment_organisation_id_study_id_fkey" FOREIGN KEY ("organisation_id", "study_id") REFERENCES "study"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "comment" ADD CONSTRAINT "comment_organisation_id_revision_id_fkey" FOREIGN KEY ("organisation_id", "revision_id") REFERENCES "revision"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "comment_entry" ADD CONSTRAINT "comment_entry_organisation_id_comment_id_fkey" FOREIGN KEY ("organisation_id", "comment_id") REFERENCES "comment"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "notice" ADD CONSTRAINT "notice_organisation_id_comment_id_fkey" FOREIGN KEY ("organisation_id", "comment_id") REFERENCES "comment"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "waiver" ADD CONSTRAINT "waiver_organisation_id_revision_id_fkey" FOREIGN KEY ("organisation_id", "revision_id") REFERENCES "revision"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "input_tick" ADD CONSTRAINT "input_tick_organisation_id_revision_id_fkey" FOREIGN KEY ("organisation_id", "revision_id") REFERENCES "revision"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;



-- Tenants, as in every table that carries an organisation.
DO $$
DECLARE
  name text;
BEGIN
  FOREACH name IN ARRAY ARRAY['comment', 'comment_entry', 'notice', 'waiver', 'input_tick'] LOOP
    EXECUTE format('ALTER TABLE %I ENABLE ROW LEVEL SECURITY', name);
    EXECUTE format('ALTER TABLE %I FORCE ROW LEVEL SECURITY', name);
    EXECUTE format(
      'CREATE POLICY tenant ON %I USING (organisation_id = current_setting(''app.org'', true)) '
      'WITH CHECK (organisation_id = current_setting(''app.org'', true))', name);
  END LOOP;
END
$$;

-- Words that a column may hold.
ALTER TABLE comment ADD CONSTRAINT comment_kind_check CHECK (kind IN ('error', 'request', 'question', 'editorial'));
ALTER TABLE comment ADD CONSTRAINT comment_state_check CHECK (state IN ('open', 'answered', 'closed'));
ALTER TABLE comment ADD CONSTRAINT comment_response_check CHECK (response IN ('accepted', 'refused'));
ALTER TABLE comment ADD CONSTRAINT comment_closed_check CHECK ((state = 'closed') = (closed_at IS NOT NULL));
ALTER TABLE comment_entry ADD CONSTRAINT comment_entry_kind_check CHECK (
  kind IN ('reply', 'accepted', 'refused', 'closed', 'reopened', 'assigned'));
ALTER TABLE waiver ADD CONSTRAINT waiver_kind_check CHECK (kind IN ('check', 'comment'));
ALTER TABLE waiver ADD CONSTRAINT waiver_reason_check CHECK (length(reason) > 0);

-- What was written below a comment is only ever added to; a comment is never removed.
CREATE TRIGGER append_only BEFORE UPDATE OR DELETE ON comment_entry FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER not_emptied BEFORE TRUNCATE ON comment_entry FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
CREATE TRIGGER kept BEFORE DELETE ON comment FOR EACH ROW EXECUTE FUNCTION refuse_change();
