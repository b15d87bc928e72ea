-- CreateTable
CREATE TABLE "user" (
    "id" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "email" TEXT NOT NULL,
    "email_verified" BOOLEAN NOT NULL DEFAULT false,
    "image" TEXT,
    "initial_password" BOOLEAN NOT NULL DEFAULT false,
    "created_at" TIMESTAMPTZ(3) NOT NULL DEFAULT CURRENT_TIMESTAMP,
    "updated_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "user_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "session" (
    "id" TEXT NOT NULL,
    "token" TEXT NOT NULL,
    "user_id" TEXT NOT NULL,
    "expires_at" TIMESTAMPTZ(3) NOT NULL,
    "ip_address" TEXT,
    "user_agent" TEXT,
    "created_at" TIMESTAMPTZ(3) NOT NULL DEFAULT CURRENT_TIMESTAMP,
    "updated_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "session_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "account" (
    "id" TEXT NOT NULL,
    "account_id" TEXT NOT NULL,
    "provider_id" TEXT NOT NULL,
    "user_id" TEXT NOT NULL,
    "access_token" TEXT,
    "refresh_token" TEXT,
    "id_token" TEXT,
    "access_token_expires_at" TIMESTAMPTZ(3),
    "refresh_token_expires_at" TIMESTAMPTZ(3),
    "scope" TEXT,
    "password" TEXT,
    "created_at" TIMESTAMPTZ(3) NOT NULL DEFAULT CURRENT_TIMESTAMP,
    "updated_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "account_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "verification" (
    "id" TEXT NOT NULL,
    "identifier" TEXT NOT NULL,
    "value" TEXT NOT NULL,
    "expires_at" TIMESTAMPTZ(3) NOT NULL,
    "created_at" TIMESTAMPTZ(3) NOT NULL DEFAULT CURRENT_TIMESTAMP,
    "updated_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "verification_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "rate_limit" (
    "id" TEXT NOT NULL,
    "key" TEXT NOT NULL,
    "count" INTEGER NOT NULL,
    "last_request" BIGINT NOT NULL,

    CONSTRAINT "rate_limit_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "sign_in_delay" (
    "account" TEXT NOT NULL,
    "failures" INTEGER NOT NULL,
    "until" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "sign_in_delay_pkey" PRIMARY KEY ("account")
);

-- CreateTable
CREATE TABLE "organisation" (
    "id" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "created_at" TIMESTAMPTZ(3) NOT NULL,
    "sequence" INTEGER NOT NULL DEFAULT 0,
    "audit_hash" TEXT NOT NULL,

    CONSTRAINT "organisation_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "membership" (
    "organisation_id" TEXT NOT NULL,
    "user_id" TEXT NOT NULL,
    "role" TEXT NOT NULL,
    "added_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "membership_pkey" PRIMARY KEY ("organisation_id","user_id")
);

-- CreateTable
CREATE TABLE "project" (
    "organisation_id" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "client" TEXT NOT NULL,
    "created_at" TIMESTAMPTZ(3) NOT NULL,
    "sequence" INTEGER NOT NULL DEFAULT 0,
    "audit_hash" TEXT NOT NULL,

    CONSTRAINT "project_pkey" PRIMARY KEY ("organisation_id","id")
);

-- CreateTable
CREATE TABLE "project_membership" (
    "organisation_id" TEXT NOT NULL,
    "project_id" TEXT NOT NULL,
    "user_id" TEXT NOT NULL,
    "roles" TEXT[],
    "added_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "project_membership_pkey" PRIMARY KEY ("organisation_id","project_id","user_id")
);

-- CreateTable
CREATE TABLE "audit_event" (
    "organisation_id" TEXT NOT NULL,
    "scope" TEXT NOT NULL,
    "sequence" INTEGER NOT NULL,
    "action" TEXT NOT NULL,
    "actor_id" TEXT,
    "actor_name" TEXT NOT NULL,
    "subject_kind" TEXT NOT NULL,
    "subject_id" TEXT NOT NULL,
    "payload" JSONB NOT NULL,
    "at" TIMESTAMPTZ(3) NOT NULL,
    "previous_hash" TEXT NOT NULL,
    "hash" TEXT NOT NULL,

    CONSTRAINT "audit_event_pkey" PRIMARY KEY ("organisation_id","scope","sequence")
);

-- CreateTable
CREATE TABLE "plant_record" (
    "organisation_id" TEXT NOT NULL,
    "project_id" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "tag" TEXT NOT NULL,
    "bus_kind" TEXT NOT NULL DEFAULT 'bus',
    "bus_id" TEXT,
    "to_bus_id" TEXT,
    "position" INTEGER NOT NULL,
    "version" INTEGER NOT NULL DEFAULT 1,
    "values" JSONB NOT NULL,
    "changed_by_id" TEXT NOT NULL,
    "changed_by_name" TEXT NOT NULL,
    "changed_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "plant_record_pkey" PRIMARY KEY ("organisation_id","project_id","kind","id")
);

-- CreateTable
CREATE TABLE "revision" (
    "organisation_id" TEXT NOT NULL,
    "project_id" TEXT NOT NULL,
    "study_id" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "number" INTEGER NOT NULL,
    "attempt" INTEGER NOT NULL,
    "document" BYTEA NOT NULL,
    "document_hash" TEXT NOT NULL,
    "input_hash" TEXT NOT NULL,
    "engine_version" TEXT NOT NULL,
    "run_id" TEXT NOT NULL,
    "versions" JSONB NOT NULL,
    "note" TEXT NOT NULL,
    "frozen_by_id" TEXT NOT NULL,
    "frozen_by_name" TEXT NOT NULL,
    "frozen_at" TIMESTAMPTZ(3) NOT NULL,
    "state" TEXT NOT NULL,
    "audit_head" TEXT,
    "purpose" TEXT,
    "checks" JSONB NOT NULL,
    "checked_by_id" TEXT,
    "review_accepted_by_id" TEXT,
    "closed_at" TIMESTAMPTZ(3),
    "issued_at" TIMESTAMPTZ(3),
    "superseded_at" TIMESTAMPTZ(3),
    "withdrawn_at" TIMESTAMPTZ(3),
    "withdrawn_reason" TEXT,

    CONSTRAINT "revision_pkey" PRIMARY KEY ("organisation_id","id")
);

-- CreateTable
CREATE TABLE "decision" (
    "organisation_id" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "revision_id" TEXT NOT NULL,
    "move" TEXT NOT NULL,
    "person_id" TEXT NOT NULL,
    "person_name" TEXT NOT NULL,
    "note" TEXT NOT NULL,
    "at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "decision_pkey" PRIMARY KEY ("organisation_id","id")
);

-- CreateTable
CREATE TABLE "report" (
    "organisation_id" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "revision_id" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "state" TEXT NOT NULL,
    "attempt" INTEGER NOT NULL DEFAULT 0,
    "failure" TEXT,
    "file" BYTEA,
    "sha256" TEXT,
    "pages" INTEGER,
    "bytes" INTEGER,
    "queued_at" TIMESTAMPTZ(3) NOT NULL,
    "finished_at" TIMESTAMPTZ(3),

    CONSTRAINT "report_pkey" PRIMARY KEY ("organisation_id","id")
);

-- CreateTable
CREATE TABLE "authority" (
    "organisation_id" TEXT NOT NULL,
    "certificate" BYTEA NOT NULL,
    "fingerprint" TEXT NOT NULL,
    "wrapped_key" BYTEA NOT NULL,
    "created_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "authority_pkey" PRIMARY KEY ("organisation_id")
);

-- CreateTable
CREATE TABLE "certificate" (
    "organisation_id" TEXT NOT NULL,
    "fingerprint" TEXT NOT NULL,
    "user_id" TEXT NOT NULL,
    "serial_number" TEXT NOT NULL,
    "certificate" BYTEA NOT NULL,
    "subject_name" TEXT NOT NULL,
    "subject_email" TEXT NOT NULL,
    "not_before" TIMESTAMPTZ(3) NOT NULL,
    "not_after" TIMESTAMPTZ(3) NOT NULL,
    "listed_at" TIMESTAMPTZ(3) NOT NULL,
    "revoked_at" TIMESTAMPTZ(3),
    "revoked_reason" TEXT,

    CONSTRAINT "certificate_pkey" PRIMARY KEY ("organisation_id","fingerprint")
);

-- CreateTable
CREATE TABLE "signature_round" (
    "organisation_id" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "revision_id" TEXT NOT NULL,
    "report_id" TEXT NOT NULL,
    "started_at" TIMESTAMPTZ(3) NOT NULL,
    "ended_at" TIMESTAMPTZ(3),
    "ended_reason" TEXT,
    "completed_at" TIMESTAMPTZ(3),
    "file" BYTEA NOT NULL,
    "sha256" TEXT NOT NULL,

    CONSTRAINT "signature_round_pkey" PRIMARY KEY ("organisation_id","id")
);

-- CreateTable
CREATE TABLE "prepared_signature" (
    "organisation_id" TEXT NOT NULL,
    "token" TEXT NOT NULL,
    "round_id" TEXT NOT NULL,
    "role" TEXT NOT NULL,
    "user_id" TEXT NOT NULL,
    "fingerprint" TEXT NOT NULL,
    "base_sha256" TEXT NOT NULL,
    "at" TIMESTAMPTZ(3) NOT NULL,
    "expires_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "prepared_signature_pkey" PRIMARY KEY ("organisation_id","token")
);

-- CreateTable
CREATE TABLE "signoff" (
    "organisation_id" TEXT NOT NULL,
    "round_id" TEXT NOT NULL,
    "role" TEXT NOT NULL,
    "user_id" TEXT NOT NULL,
    "person_name" TEXT NOT NULL,
    "fingerprint" TEXT NOT NULL,
    "at" TIMESTAMPTZ(3) NOT NULL,
    "sha256" TEXT NOT NULL,

    CONSTRAINT "signoff_pkey" PRIMARY KEY ("organisation_id","round_id","role")
);

-- CreateTable
CREATE TABLE "register_entry" (
    "organisation_id" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "digest" TEXT NOT NULL,
    "subject_id" TEXT NOT NULL,
    "at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "register_entry_pkey" PRIMARY KEY ("kind","digest")
);

-- CreateTable
CREATE TABLE "study" (
    "organisation_id" TEXT NOT NULL,
    "project_id" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "title" TEXT NOT NULL,
    "document_number" TEXT NOT NULL,
    "head" JSONB NOT NULL,
    "settings" JSONB NOT NULL,
    "texts" JSONB NOT NULL,
    "frequency" JSONB NOT NULL,
    "number_style" TEXT NOT NULL,
    "version" INTEGER NOT NULL DEFAULT 1,
    "changed_by_id" TEXT NOT NULL,
    "changed_by_name" TEXT NOT NULL,
    "changed_at" TIMESTAMPTZ(3) NOT NULL,
    "created_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "study_pkey" PRIMARY KEY ("organisation_id","id")
);

-- CreateTable
CREATE TABLE "study_record" (
    "organisation_id" TEXT NOT NULL,
    "study_id" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "tag" TEXT NOT NULL,
    "position" INTEGER NOT NULL,
    "version" INTEGER NOT NULL DEFAULT 1,
    "values" JSONB NOT NULL,
    "changed_by_id" TEXT NOT NULL,
    "changed_by_name" TEXT NOT NULL,
    "changed_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "study_record_pkey" PRIMARY KEY ("organisation_id","study_id","kind","id")
);

-- CreateTable
CREATE TABLE "study_run" (
    "organisation_id" TEXT NOT NULL,
    "project_id" TEXT NOT NULL,
    "study_id" TEXT NOT NULL,
    "id" TEXT NOT NULL,
    "state" TEXT NOT NULL,
    "input_hash" TEXT NOT NULL,
    "engine_version" TEXT NOT NULL,
    "done" INTEGER NOT NULL DEFAULT 0,
    "of" INTEGER NOT NULL,
    "attempt" INTEGER NOT NULL DEFAULT 0,
    "failure" TEXT,
    "result" JSONB,
    "requested_by_id" TEXT NOT NULL,
    "requested_by_name" TEXT NOT NULL,
    "queued_at" TIMESTAMPTZ(3) NOT NULL,
    "started_at" TIMESTAMPTZ(3),
    "finished_at" TIMESTAMPTZ(3),

    CONSTRAINT "study_run_pkey" PRIMARY KEY ("organisation_id","id")
);

-- CreateTable
CREATE TABLE "case_run" (
    "organisation_id" TEXT NOT NULL,
    "run_id" TEXT NOT NULL,
    "case_id" TEXT NOT NULL,
    "position" INTEGER NOT NULL,
    "summary" JSONB NOT NULL,
    "series" BYTEA,

    CONSTRAINT "case_run_pkey" PRIMARY KEY ("organisation_id","run_id","case_id")
);

-- CreateIndex
CREATE UNIQUE INDEX "user_email_key" ON "user"("email");

-- CreateIndex
CREATE UNIQUE INDEX "session_token_key" ON "session"("token");

-- CreateIndex
CREATE INDEX "session_user_id_idx" ON "session"("user_id");

-- CreateIndex
CREATE INDEX "account_user_id_idx" ON "account"("user_id");

-- CreateIndex
CREATE UNIQUE INDEX "account_provider_id_account_id_key" ON "account"("provider_id", "account_id");

-- CreateIndex
CREATE INDEX "verification_identifier_idx" ON "verification"("identifier");

-- CreateIndex
CREATE UNIQUE INDEX "rate_limit_key_key" ON "rate_limit"("key");

-- CreateIndex
CREATE INDEX "membership_user_id_idx" ON "membership"("user_id");

-- CreateIndex
CREATE INDEX "project_membership_user_id_idx" ON "project_membership"("user_id");

-- CreateIndex
CREATE INDEX "plant_record_organisation_id_project_id_bus_kind_bus_id_idx" ON "plant_record"("organisation_id", "project_id", "bus_kind", "bus_id");

-- CreateIndex
CREATE INDEX "plant_record_organisation_id_project_id_bus_kind_to_bus_id_idx" ON "plant_record"("organisation_id", "project_id", "bus_kind", "to_bus_id");

-- CreateIndex
CREATE INDEX "revision_organisation_id_project_id_study_id_idx" ON "revision"("organisation_id", "project_id", "study_id");

-- CreateIndex
CREATE UNIQUE INDEX "revision_organisation_id_study_id_number_attempt_key" ON "revision"("organisation_id", "study_id", "number", "attempt");

-- CreateIndex
CREATE INDEX "decision_organisation_id_revision_id_idx" ON "decision"("organisation_id", "revision_id");

-- CreateIndex
CREATE INDEX "report_organisation_id_revision_id_queued_at_idx" ON "report"("organisation_id", "revision_id", "queued_at");

-- CreateIndex
CREATE UNIQUE INDEX "certificate_organisation_id_serial_number_key" ON "certificate"("organisation_id", "serial_number");

-- CreateIndex
CREATE INDEX "signature_round_organisation_id_revision_id_idx" ON "signature_round"("organisation_id", "revision_id");

-- CreateIndex
CREATE UNIQUE INDEX "prepared_signature_organisation_id_round_id_role_key" ON "prepared_signature"("organisation_id", "round_id", "role");

-- CreateIndex
CREATE UNIQUE INDEX "signoff_organisation_id_round_id_user_id_key" ON "signoff"("organisation_id", "round_id", "user_id");

-- CreateIndex
CREATE UNIQUE INDEX "study_organisation_id_project_id_id_key" ON "study"("organisation_id", "project_id", "id");

-- CreateIndex
CREATE UNIQUE INDEX "study_organisation_id_project_id_document_number_key" ON "study"("organisation_id", "project_id", "document_number");

-- CreateIndex
CREATE INDEX "study_run_organisation_id_study_id_queued_at_idx" ON "study_run"("organisation_id", "study_id", "queued_at");

-- CreateIndex
CREATE UNIQUE INDEX "study_run_organisation_id_study_id_id_key" ON "study_run"("organisation_id", "study_id", "id");

-- AddForeignKey
ALTER TABLE "session" ADD CONSTRAINT "session_user_id_fkey" FOREIGN KEY ("user_id") REFERENCES "user"("id") ON DELETE CASCADE ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "account" ADD CONSTRAINT "account_user_id_fkey" FOREIGN KEY ("user_id") REFERENCES "user"("id") ON DELETE CASCADE ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "membership" ADD CONSTRAINT "membership_organisation_id_fkey" FOREIGN KEY ("organisation_id") REFERENCES "organisation"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "membership" ADD CONSTRAINT "membership_user_id_fkey" FOREIGN KEY ("user_id") REFERENCES "user"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "project" ADD CONSTRAINT "project_organisation_id_fkey" FOREIGN KEY ("organisation_id") REFERENCES "organisation"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "project_membership" ADD CONSTRAINT "project_membership_organisation_id_project_id_fkey" FOREIGN KEY ("organisation_id", "project_id") REFERENCES "project"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "project_membership" ADD CONSTRAINT "project_membership_user_id_fkey" FOREIGN KEY ("user_id") REFERENCES "user"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "audit_event" ADD CONSTRAINT "audit_event_organisation_id_fkey" FOREIGN KEY ("organisation_id") REFERENCES "organisation"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "plant_record" ADD CONSTRAINT "plant_record_organisation_id_project_id_fkey" FOREIGN KEY ("organisation_id", "project_id") REFERENCES "project"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "plant_record" ADD CONSTRAINT "plant_record_bus_fkey" FOREIGN KEY ("organisation_id", "project_id", "bus_kind", "bus_id") REFERENCES "plant_record"("organisation_id", "project_id", "kind", "id") ON DELETE RESTRICT ON UPDATE RESTRICT;

-- AddForeignKey
ALTER TABLE "plant_record" ADD CONSTRAINT "plant_record_to_bus_fkey" FOREIGN KEY ("organisation_id", "project_id", "bus_kind", "to_bus_id") REFERENCES "plant_record"("organisation_id", "project_id", "kind", "id") ON DELETE RESTRICT ON UPDATE RESTRICT;

-- AddForeignKey
ALTER TABLE "revision" ADD CONSTRAINT "revision_organisation_id_project_id_study_id_fkey" FOREIGN KEY ("organisation_id", "project_id", "study_id") REFERENCES "study"("organisation_id", "project_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "revision" ADD CONSTRAINT "revision_organisation_id_study_id_run_id_fkey" FOREIGN KEY ("organisation_id", "study_id", "run_id") REFERENCES "study_run"("organisation_id", "study_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "decision" ADD CONSTRAINT "decision_organisation_id_revision_id_fkey" FOREIGN KEY ("organisation_id", "revision_id") REFERENCES "revision"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "report" ADD CONSTRAINT "report_organisation_id_revision_id_fkey" FOREIGN KEY ("organisation_id", "revision_id") REFERENCES "revision"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "authority" ADD CONSTRAINT "authority_organisation_id_fkey" FOREIGN KEY ("organisation_id") REFERENCES "organisation"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "certificate" ADD CONSTRAINT "certificate_organisation_id_user_id_fkey" FOREIGN KEY ("organisation_id", "user_id") REFERENCES "membership"("organisation_id", "user_id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "certificate" ADD CONSTRAINT "certificate_user_id_fkey" FOREIGN KEY ("user_id") REFERENCES "user"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "signature_round" ADD CONSTRAINT "signature_round_organisation_id_revision_id_fkey" FOREIGN KEY ("organisation_id", "revision_id") REFERENCES "revision"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "signature_round" ADD CONSTRAINT "signature_round_organisation_id_report_id_fkey" FOREIGN KEY ("organisation_id", "report_id") REFERENCES "report"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "prepared_signature" ADD CONSTRAINT "prepared_signature_organisation_id_round_id_fkey" FOREIGN KEY ("organisation_id", "round_id") REFERENCES "signature_round"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "signoff" ADD CONSTRAINT "signoff_organisation_id_round_id_fkey" FOREIGN KEY ("organisation_id", "round_id") REFERENCES "signature_round"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "signoff" ADD CONSTRAINT "signoff_user_id_fkey" FOREIGN KEY ("user_id") REFERENCES "user"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "signoff" ADD CONSTRAINT "signoff_organisation_id_fingerprint_fkey" FOREIGN KEY ("organisation_id", "fingerprint") REFERENCES "certificate"("organisation_id", "fingerprint") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "register_entry" ADD CONSTRAINT "register_entry_organisation_id_fkey" FOREIGN KEY ("organisation_id") REFERENCES "organisation"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "study" ADD CONSTRAINT "study_organisation_id_project_id_fkey" FOREIGN KEY ("organisation_id", "project_id") REFERENCES "project"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "study_record" ADD CONSTRAINT "study_record_organisation_id_study_id_fkey" FOREIGN KEY ("organisation_id", "study_id") REFERENCES "study"("organisation_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "study_run" ADD CONSTRAINT "study_run_organisation_id_project_id_study_id_fkey" FOREIGN KEY ("organisation_id", "project_id", "study_id") REFERENCES "study"("organisation_id", "project_id", "id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "case_run" ADD CONSTRAINT "case_run_organisation_id_run_id_fkey" FOREIGN KEY ("organisation_id", "run_id") REFERENCES "study_run"("organisation_id", "id") ON DELETE CASCADE ON UPDATE CASCADE;
