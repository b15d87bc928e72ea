-- AlterTable
ALTER TABLE "project_membership" ADD COLUMN     "ends_at" TIMESTAMPTZ(3);

-- AlterTable
ALTER TABLE "user" ADD COLUMN     "two_factor_enabled" BOOLEAN NOT NULL DEFAULT false;

-- CreateTable
CREATE TABLE "two_factor" (
    "id" TEXT NOT NULL,
    "secret" TEXT NOT NULL,
    "backup_codes" TEXT NOT NULL,
    "user_id" TEXT NOT NULL,
    "verified" BOOLEAN NOT NULL DEFAULT false,
    "failed_verification_count" INTEGER NOT NULL DEFAULT 0,
    "locked_until" TIMESTAMPTZ(3),

    CONSTRAINT "two_factor_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "invitation" (
    "organisation_id" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "project_id" TEXT NOT NULL,
    "token_hash" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "email" TEXT NOT NULL,
    "roles" TEXT[],
    "guest" BOOLEAN NOT NULL,
    "part_ends_at" TIMESTAMPTZ(3),
    "invited_by_id" TEXT NOT NULL,
    "invited_by_name" TEXT NOT NULL,
    "created_at" TIMESTAMPTZ(3) NOT NULL,
    "expires_at" TIMESTAMPTZ(3) NOT NULL,
    "accepted_at" TIMESTAMPTZ(3),
    "accepted_by_id" TEXT,
    "withdrawn_at" TIMESTAMPTZ(3),

    CONSTRAINT "invitation_pkey" PRIMARY KEY ("organisation_id","id")
);

-- CreateTable
CREATE TABLE "share_link" (
    "organisation_id" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "revision_id" TEXT NOT NULL,
    "token_hash" TEXT NOT NULL,
    "recipient" TEXT NOT NULL,
    "passphrase_hash" TEXT,
    "expires_at" TIMESTAMPTZ(3) NOT NULL,
    "most_downloads" INTEGER,
    "downloads" INTEGER NOT NULL DEFAULT 0,
    "created_by_id" TEXT NOT NULL,
    "created_by_name" TEXT NOT NULL,
    "created_at" TIMESTAMPTZ(3) NOT NULL,
    "ended_at" TIMESTAMPTZ(3),
    "ended_by_name" TEXT,

    CONSTRAINT "share_link_pkey" PRIMARY KEY ("organisation_id","id")
);

-- CreateTable
CREATE TABLE "share_download" (
    "organisation_id" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "link_id" TEXT NOT NULL,
    "at" TIMESTAMPTZ(3) NOT NULL,
    "ip_address" TEXT,
    "user_agent" TEXT,
    "sha256" TEXT NOT NULL,

    CONSTRAINT "share_download_pkey" PRIMARY KEY ("organisation_id","id")
);

-- CreateIndex
CREATE UNIQUE INDEX "two_factor_user_id_key" ON "two_factor"("user_id");

-- CreateIndex
CREATE UNIQUE INDEX "invitation_token_hash_key" ON "invitation"("token_hash");

-- CreateIndex
CREATE INDEX "invitation_organisation_id_project_id_idx" ON "invitation"("organisation_id", "project_id");

-- CreateIndex
CREATE UNIQUE INDEX "share_link_token_hash_key" ON "share_link"("token_hash");

-- CreateIndex
CREATE INDEX "share_link_organisation_id_revision_id_idx" ON "share_link"("organisation_id", "revision_id");

-- CreateIndex
CREATE INDEX "share_download_organisation_id_link_id_at_idx" ON "share_download"("organisation_id", "link_id", "at");

-- AddForeignKey
ALTER TABLE "two_factor" ADD CONSTRAINT "two_factor_user_id_fkey" FOREIGN KEY ("user_id") REFERENCES "user"("id") ON DELETE CASCADE ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "invitation" ADD CONSTRAINT "invitation_organisation_id_project_id_fkey" FOREIGN KEY ("organisation_id", "project_id") REFERENCES "project"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "share_link" ADD CONSTRAINT "share_link_organisation_id_revision_id_fkey" FOREIGN KEY ("organisation_id", "revision_id") REFERENCES "revision"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "share_download" ADD CONSTRAINT "share_download_organisation_id_link_id_fkey" FOREIGN KEY ("organisation_id", "link_id") REFERENCES "share_link"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;


-- Tenants, as in every table that carries an organisation.
DO $$
DECLARE
  name text;
BEGIN
  FOREACH name IN ARRAY ARRAY['invitation', 'share_link', 'share_download'] LOOP
    EXECUTE format('ALTER TABLE %I ENABLE ROW LEVEL SECURITY', name);
    EXECUTE format('ALTER TABLE %I FORCE ROW LEVEL SECURITY', name);
    EXECUTE format(
      'CREATE POLICY tenant ON %I USING (organisation_id = current_setting(''app.org'', true)) '
      'WITH CHECK (organisation_id = current_setting(''app.org'', true))', name);
  END LOOP;
END
$$;

-- A link leads to its organisation only for who holds it and so can name its hash.
CREATE POLICY named ON invitation FOR SELECT USING (token_hash = current_setting('app.digest', true));
CREATE POLICY named ON share_link FOR SELECT USING (token_hash = current_setting('app.digest', true));

-- Words and numbers that a column may hold.
ALTER TABLE invitation ADD CONSTRAINT invitation_roles_check CHECK (
  cardinality(roles) > 0 AND roles <@ ARRAY['engineer', 'checker', 'approver', 'commenter', 'client']);
ALTER TABLE invitation ADD CONSTRAINT invitation_accepted_check CHECK ((accepted_at IS NULL) = (accepted_by_id IS NULL));
ALTER TABLE invitation ADD CONSTRAINT invitation_one_end_check CHECK (accepted_at IS NULL OR withdrawn_at IS NULL);
ALTER TABLE share_link ADD CONSTRAINT share_link_downloads_check CHECK (
  downloads >= 0 AND (most_downloads IS NULL OR (most_downloads > 0 AND downloads <= most_downloads)));

-- The log of downloads is only ever added to.
CREATE TRIGGER append_only BEFORE UPDATE OR DELETE ON share_download FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER not_emptied BEFORE TRUNCATE ON share_download FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
