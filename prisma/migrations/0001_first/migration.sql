-- First schema. The tables are drafted from schema.prisma; everything below "By hand" is what Prisma cannot say.
CREATE EXTENSION IF NOT EXISTS btree_gist;

-- CreateTable
CREATE TABLE "club" (
    "id" UUID NOT NULL,
    "name" TEXT NOT NULL,
    "external_key" TEXT,
    "created_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "club_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "person" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "name" TEXT NOT NULL,
    "email" TEXT NOT NULL,
    "created_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "person_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "role_assignment" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "person_id" UUID NOT NULL,
    "role" TEXT NOT NULL,
    "squad_id" UUID,
    "created_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "role_assignment_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "access_token" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "person_id" UUID NOT NULL,
    "label" TEXT NOT NULL,
    "token_hash" BYTEA NOT NULL,
    "created_at" TIMESTAMPTZ(3) NOT NULL,
    "expires_at" TIMESTAMPTZ(3) NOT NULL,
    "revoked_at" TIMESTAMPTZ(3),

    CONSTRAINT "access_token_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "squad" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "name" TEXT NOT NULL,
    "zone" TEXT NOT NULL,
    "created_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "squad_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "load_policy" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "squad_id" UUID NOT NULL,
    "valid_from" DATE NOT NULL,
    "valid_to" DATE,
    "settings" JSONB NOT NULL,
    "created_by" UUID,
    "created_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "load_policy_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "athlete" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "name" TEXT NOT NULL,
    "person_id" UUID,
    "sex" TEXT,
    "birth_year" INTEGER,
    "created_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "athlete_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "membership" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "athlete_id" UUID NOT NULL,
    "squad_id" UUID NOT NULL,
    "valid_from" DATE NOT NULL,
    "valid_to" DATE,

    CONSTRAINT "membership_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "zone_period" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "athlete_id" UUID NOT NULL,
    "zone" TEXT NOT NULL,
    "valid_from" DATE NOT NULL,
    "valid_to" DATE,

    CONSTRAINT "zone_period_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "threshold_value" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "athlete_id" UUID NOT NULL,
    "quantity" TEXT NOT NULL,
    "modality" TEXT NOT NULL,
    "setting" TEXT NOT NULL,
    "value" DOUBLE PRECISION NOT NULL,
    "standard_error" DOUBLE PRECISION,
    "method" TEXT NOT NULL,
    "valid_from" DATE NOT NULL,
    "valid_to" DATE,
    "entered_by" UUID,
    "entered_at" TIMESTAMPTZ(3) NOT NULL,
    "supersedes" UUID,
    "withdrawn_at" TIMESTAMPTZ(3),
    "withdrawn_by" UUID,
    "withdraw_reason" TEXT,

    CONSTRAINT "threshold_value_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "training_session" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "athlete_id" UUID NOT NULL,
    "group_id" UUID,
    "source" TEXT NOT NULL,
    "external_id" TEXT,
    "started_at" TIMESTAMPTZ(3) NOT NULL,
    "zone" TEXT NOT NULL,
    "training_day" DATE NOT NULL,
    "duration_min" DOUBLE PRECISION NOT NULL,
    "kind" TEXT NOT NULL,
    "modality" TEXT NOT NULL,
    "setting" TEXT NOT NULL,
    "title" TEXT,
    "distance_m" DOUBLE PRECISION,
    "rating" DOUBLE PRECISION,
    "rating_by" TEXT,
    "rating_delay_min" INTEGER,
    "intended_rating" DOUBLE PRECISION,
    "mean_heart_rate_bpm" DOUBLE PRECISION,
    "peak_heart_rate_bpm" DOUBLE PRECISION,
    "content" JSONB NOT NULL,
    "quality" TEXT NOT NULL,
    "quality_notes" TEXT[],
    "version" INTEGER NOT NULL,
    "entered_by" UUID,
    "created_at" TIMESTAMPTZ(3) NOT NULL,
    "updated_at" TIMESTAMPTZ(3) NOT NULL,
    "withdrawn_at" TIMESTAMPTZ(3),
    "withdraw_reason" TEXT,

    CONSTRAINT "training_session_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "session_revision" (
    "club_id" UUID NOT NULL,
    "session_id" UUID NOT NULL,
    "version" INTEGER NOT NULL,
    "snapshot" JSONB NOT NULL,
    "reason" TEXT,
    "changed_by" UUID,
    "changed_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "session_revision_pkey" PRIMARY KEY ("club_id","session_id","version")
);

-- CreateTable
CREATE TABLE "session_weight" (
    "club_id" UUID NOT NULL,
    "session_id" UUID NOT NULL,
    "rating_load" DOUBLE PRECISION,
    "domain_state" TEXT NOT NULL,
    "domain_reason" TEXT,
    "domain_load" DOUBLE PRECISION,
    "moderate_min" DOUBLE PRECISION,
    "heavy_min" DOUBLE PRECISION,
    "severe_min" DOUBLE PRECISION,
    "extreme_min" DOUBLE PRECISION,
    "unassigned_min" DOUBLE PRECISION,
    "basis" TEXT NOT NULL,
    "measures" JSONB NOT NULL,
    "thresholds_used" JSONB NOT NULL,
    "policy_id" UUID,
    "method_version" TEXT NOT NULL,
    "weighed_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "session_weight_pkey" PRIMARY KEY ("club_id","session_id")
);

-- CreateTable
CREATE TABLE "daily_total" (
    "club_id" UUID NOT NULL,
    "athlete_id" UUID NOT NULL,
    "day" DATE NOT NULL,
    "sessions" INTEGER NOT NULL,
    "minutes" DOUBLE PRECISION NOT NULL,
    "rating_load" DOUBLE PRECISION NOT NULL,
    "rating_missing" INTEGER NOT NULL,
    "domain_load" DOUBLE PRECISION NOT NULL,
    "domain_missing" INTEGER NOT NULL,
    "moderate_min" DOUBLE PRECISION NOT NULL,
    "heavy_min" DOUBLE PRECISION NOT NULL,
    "severe_min" DOUBLE PRECISION NOT NULL,
    "extreme_min" DOUBLE PRECISION NOT NULL,
    "applicable_min" DOUBLE PRECISION NOT NULL,
    "covered_min" DOUBLE PRECISION NOT NULL,
    "basis_minutes" JSONB NOT NULL,
    "suspect" INTEGER NOT NULL,

    CONSTRAINT "daily_total_pkey" PRIMARY KEY ("club_id","athlete_id","day")
);

-- CreateTable
CREATE TABLE "day_closing" (
    "club_id" UUID NOT NULL,
    "squad_id" UUID NOT NULL,
    "day" DATE NOT NULL,
    "closed_by" UUID,
    "closed_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "day_closing_pkey" PRIMARY KEY ("club_id","squad_id","day")
);

-- CreateTable
CREATE TABLE "day_unknown" (
    "club_id" UUID NOT NULL,
    "athlete_id" UUID NOT NULL,
    "squad_id" UUID NOT NULL,
    "day" DATE NOT NULL,

    CONSTRAINT "day_unknown_pkey" PRIMARY KEY ("club_id","athlete_id","day")
);

-- CreateTable
CREATE TABLE "availability" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "athlete_id" UUID NOT NULL,
    "state" TEXT NOT NULL,
    "cause" TEXT NOT NULL,
    "allowed_modalities" TEXT[],
    "reason" TEXT,
    "valid_from" DATE NOT NULL,
    "valid_to" DATE,
    "entered_by" UUID,
    "entered_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "availability_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "load_period" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "squad_id" UUID NOT NULL,
    "athlete_id" UUID,
    "purpose" TEXT NOT NULL,
    "valid_from" DATE NOT NULL,
    "valid_to" DATE NOT NULL,
    "note" TEXT,
    "entered_by" UUID,
    "entered_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "load_period_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "flag" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "athlete_id" UUID NOT NULL,
    "squad_id" UUID NOT NULL,
    "kind" TEXT NOT NULL,
    "level" TEXT NOT NULL,
    "since" DATE NOT NULL,
    "until" DATE,
    "sentence" TEXT NOT NULL,
    "clears" TEXT NOT NULL,
    "evidence" JSONB NOT NULL,
    "as_of" DATE NOT NULL,
    "updated_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "flag_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "report" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "squad_id" UUID NOT NULL,
    "iso_week" TEXT NOT NULL,
    "version" INTEGER NOT NULL,
    "as_of" DATE NOT NULL,
    "view" JSONB NOT NULL,
    "view_hash" TEXT NOT NULL,
    "workbook" BYTEA NOT NULL,
    "workbook_hash" TEXT NOT NULL,
    "mail_subject" TEXT NOT NULL,
    "mail_text" TEXT NOT NULL,
    "mail_html" TEXT NOT NULL,
    "change" TEXT,
    "made_by" UUID,
    "made_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "report_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "report_delivery" (
    "club_id" UUID NOT NULL,
    "report_id" UUID NOT NULL,
    "person_id" UUID NOT NULL,
    "email" TEXT NOT NULL,
    "message_id" TEXT NOT NULL,
    "state" TEXT NOT NULL,
    "detail" TEXT,
    "sent_at" TIMESTAMPTZ(3),

    CONSTRAINT "report_delivery_pkey" PRIMARY KEY ("club_id","report_id","person_id")
);

-- CreateTable
CREATE TABLE "idempotency_key" (
    "club_id" UUID NOT NULL,
    "person_id" UUID NOT NULL,
    "key" TEXT NOT NULL,
    "request_hash" TEXT NOT NULL,
    "status" INTEGER NOT NULL,
    "body" JSONB NOT NULL,
    "headers" JSONB NOT NULL,
    "created_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "idempotency_key_pkey" PRIMARY KEY ("club_id","person_id","key")
);

-- CreateTable
CREATE TABLE "audit_entry" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "person_id" UUID,
    "action" TEXT NOT NULL,
    "subject" TEXT NOT NULL,
    "subject_id" TEXT,
    "detail" JSONB NOT NULL,
    "at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "audit_entry_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "reweigh_task" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "athlete_id" UUID NOT NULL,
    "scope" JSONB NOT NULL,
    "total" INTEGER NOT NULL,
    "done" INTEGER NOT NULL,
    "touched" UUID[],
    "cursor" UUID,
    "state" TEXT NOT NULL,
    "created_at" TIMESTAMPTZ(3) NOT NULL,
    "finished_at" TIMESTAMPTZ(3),

    CONSTRAINT "reweigh_task_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "job_record" (
    "club_id" UUID NOT NULL,
    "job" TEXT NOT NULL,
    "squad_id" UUID NOT NULL,
    "period" TEXT NOT NULL,
    "state" TEXT NOT NULL,
    "attempts" INTEGER NOT NULL,
    "detail" TEXT,
    "claimed_at" TIMESTAMPTZ(3) NOT NULL,
    "finished_at" TIMESTAMPTZ(3),

    CONSTRAINT "job_record_pkey" PRIMARY KEY ("club_id","job","squad_id","period")
);

-- CreateIndex
CREATE UNIQUE INDEX "club_external_key_key" ON "club"("external_key");

-- CreateIndex
CREATE UNIQUE INDEX "person_club_id_email_key" ON "person"("club_id", "email");

-- CreateIndex
CREATE INDEX "role_assignment_club_id_person_id_idx" ON "role_assignment"("club_id", "person_id");

-- CreateIndex
CREATE UNIQUE INDEX "access_token_token_hash_key" ON "access_token"("token_hash");

-- CreateIndex
CREATE INDEX "access_token_club_id_person_id_idx" ON "access_token"("club_id", "person_id");

-- CreateIndex
CREATE UNIQUE INDEX "squad_club_id_name_key" ON "squad"("club_id", "name");

-- CreateIndex
CREATE UNIQUE INDEX "athlete_club_id_person_id_key" ON "athlete"("club_id", "person_id");

-- CreateIndex
CREATE INDEX "membership_club_id_squad_id_idx" ON "membership"("club_id", "squad_id");

-- CreateIndex
CREATE INDEX "threshold_value_club_id_athlete_id_quantity_idx" ON "threshold_value"("club_id", "athlete_id", "quantity");

-- CreateIndex
CREATE INDEX "training_session_club_id_athlete_id_training_day_idx" ON "training_session"("club_id", "athlete_id", "training_day");

-- CreateIndex
CREATE INDEX "availability_club_id_athlete_id_idx" ON "availability"("club_id", "athlete_id");

-- CreateIndex
CREATE INDEX "load_period_club_id_squad_id_idx" ON "load_period"("club_id", "squad_id");

-- CreateIndex
CREATE UNIQUE INDEX "flag_club_id_athlete_id_kind_since_key" ON "flag"("club_id", "athlete_id", "kind", "since");

-- CreateIndex
CREATE UNIQUE INDEX "report_club_id_squad_id_iso_week_version_key" ON "report"("club_id", "squad_id", "iso_week", "version");

-- CreateIndex
CREATE UNIQUE INDEX "report_delivery_message_id_key" ON "report_delivery"("message_id");

-- CreateIndex
CREATE INDEX "audit_entry_club_id_at_idx" ON "audit_entry"("club_id", "at");

-- By hand: foreign keys. Each includes club_id, so a row can never point into another club.
ALTER TABLE "person" ADD CONSTRAINT "person_club_fk" FOREIGN KEY ("club_id") REFERENCES "club" ("id");
ALTER TABLE "squad" ADD CONSTRAINT "squad_club_fk" FOREIGN KEY ("club_id") REFERENCES "club" ("id");
ALTER TABLE "athlete" ADD CONSTRAINT "athlete_club_fk" FOREIGN KEY ("club_id") REFERENCES "club" ("id");
ALTER TABLE "athlete" ADD CONSTRAINT "athlete_person_fk" FOREIGN KEY ("club_id", "person_id") REFERENCES "person" ("club_id", "id");
ALTER TABLE "role_assignment" ADD CONSTRAINT "role_assignment_person_fk" FOREIGN KEY ("club_id", "person_id") REFERENCES "person" ("club_id", "id");
ALTER TABLE "role_assignment" ADD CONSTRAINT "role_assignment_squad_fk" FOREIGN KEY ("club_id", "squad_id") REFERENCES "squad" ("club_id", "id");
ALTER TABLE "access_token" ADD CONSTRAINT "access_token_person_fk" FOREIGN KEY ("club_id", "person_id") REFERENCES "person" ("club_id", "id");
ALTER TABLE "load_policy" ADD CONSTRAINT "load_policy_squad_fk" FOREIGN KEY ("club_id", "squad_id") REFERENCES "squad" ("club_id", "id");
ALTER TABLE "membership" ADD CONSTRAINT "membership_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "membership" ADD CONSTRAINT "membership_squad_fk" FOREIGN KEY ("club_id", "squad_id") REFERENCES "squad" ("club_id", "id");
ALTER TABLE "zone_period" ADD CONSTRAINT "zone_period_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "threshold_value" ADD CONSTRAINT "threshold_value_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "threshold_value" ADD CONSTRAINT "threshold_value_supersedes_fk" FOREIGN KEY ("club_id", "supersedes") REFERENCES "threshold_value" ("club_id", "id");
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "session_revision" ADD CONSTRAINT "session_revision_session_fk" FOREIGN KEY ("club_id", "session_id") REFERENCES "training_session" ("club_id", "id");
ALTER TABLE "session_weight" ADD CONSTRAINT "session_weight_session_fk" FOREIGN KEY ("club_id", "session_id") REFERENCES "training_session" ("club_id", "id");
ALTER TABLE "session_weight" ADD CONSTRAINT "session_weight_policy_fk" FOREIGN KEY ("club_id", "policy_id") REFERENCES "load_policy" ("club_id", "id");
ALTER TABLE "daily_total" ADD CONSTRAINT "daily_total_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "day_closing" ADD CONSTRAINT "day_closing_squad_fk" FOREIGN KEY ("club_id", "squad_id") REFERENCES "squad" ("club_id", "id");
ALTER TABLE "day_unknown" ADD CONSTRAINT "day_unknown_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "day_unknown" ADD CONSTRAINT "day_unknown_closing_fk" FOREIGN KEY ("club_id", "squad_id", "day") REFERENCES "day_closing" ("club_id", "squad_id", "day");
ALTER TABLE "availability" ADD CONSTRAINT "availability_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "load_period" ADD CONSTRAINT "load_period_squad_fk" FOREIGN KEY ("club_id", "squad_id") REFERENCES "squad" ("club_id", "id");
ALTER TABLE "load_period" ADD CONSTRAINT "load_period_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "flag" ADD CONSTRAINT "flag_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "flag" ADD CONSTRAINT "flag_squad_fk" FOREIGN KEY ("club_id", "squad_id") REFERENCES "squad" ("club_id", "id");
ALTER TABLE "report" ADD CONSTRAINT "report_squad_fk" FOREIGN KEY ("club_id", "squad_id") REFERENCES "squad" ("club_id", "id");
ALTER TABLE "report_delivery" ADD CONSTRAINT "report_delivery_report_fk" FOREIGN KEY ("club_id", "report_id") REFERENCES "report" ("club_id", "id");
ALTER TABLE "report_delivery" ADD CONSTRAINT "report_delivery_person_fk" FOREIGN KEY ("club_id", "person_id") REFERENCES "person" ("club_id", "id");
ALTER TABLE "idempotency_key" ADD CONSTRAINT "idempotency_key_club_fk" FOREIGN KEY ("club_id") REFERENCES "club" ("id");
ALTER TABLE "audit_entry" ADD CONSTRAINT "audit_entry_club_fk" FOREIGN KEY ("club_id") REFERENCES "club" ("id");
ALTER TABLE "reweigh_task" ADD CONSTRAINT "reweigh_task_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "job_record" ADD CONSTRAINT "job_record_squad_fk" FOREIGN KEY ("club_id", "squad_id") REFERENCES "squad" ("club_id", "id");

-- By hand: ranges. The bounds are those of the input schemas; the database refuses them too.
ALTER TABLE "club" ADD CONSTRAINT "club_name_length" CHECK (char_length("name") BETWEEN 1 AND 200);
ALTER TABLE "person" ADD CONSTRAINT "person_name_length" CHECK (char_length("name") BETWEEN 1 AND 200);
ALTER TABLE "person" ADD CONSTRAINT "person_email_shape" CHECK ("email" LIKE '%_@_%' AND "email" = lower("email") AND char_length("email") <= 254);
ALTER TABLE "role_assignment" ADD CONSTRAINT "role_assignment_role_known" CHECK ("role" IN ('admin', 'manager', 'coach', 'staff', 'medic', 'athlete'));
ALTER TABLE "role_assignment" ADD CONSTRAINT "role_assignment_once" UNIQUE NULLS NOT DISTINCT ("club_id", "person_id", "role", "squad_id");
ALTER TABLE "access_token" ADD CONSTRAINT "access_token_expires_later" CHECK ("expires_at" > "created_at");
ALTER TABLE "athlete" ADD CONSTRAINT "athlete_name_length" CHECK (char_length("name") BETWEEN 1 AND 200);
ALTER TABLE "athlete" ADD CONSTRAINT "athlete_sex_known" CHECK ("sex" IN ('female', 'male'));
ALTER TABLE "athlete" ADD CONSTRAINT "athlete_birth_year_range" CHECK ("birth_year" BETWEEN 1900 AND 2100);
ALTER TABLE "load_policy" ADD CONSTRAINT "load_policy_order" CHECK ("valid_to" >= "valid_from");
ALTER TABLE "membership" ADD CONSTRAINT "membership_order" CHECK ("valid_to" >= "valid_from");
ALTER TABLE "zone_period" ADD CONSTRAINT "zone_period_order" CHECK ("valid_to" >= "valid_from");
ALTER TABLE "availability" ADD CONSTRAINT "availability_order" CHECK ("valid_to" >= "valid_from");
ALTER TABLE "availability" ADD CONSTRAINT "availability_state_known" CHECK ("state" IN ('full', 'modified', 'none'));
ALTER TABLE "availability" ADD CONSTRAINT "availability_cause_known" CHECK ("cause" IN ('illness', 'injury', 'complaint', 'away', 'other'));
ALTER TABLE "load_period" ADD CONSTRAINT "load_period_order" CHECK ("valid_to" >= "valid_from");
ALTER TABLE "load_period" ADD CONSTRAINT "load_period_purpose_known" CHECK ("purpose" IN ('overload', 'unload', 'taper'));
ALTER TABLE "load_period" ADD CONSTRAINT "load_period_overload_length" CHECK ("purpose" <> 'overload' OR "valid_to" - "valid_from" + 1 <= 21);
ALTER TABLE "threshold_value" ADD CONSTRAINT "threshold_value_order" CHECK ("valid_to" >= "valid_from");
ALTER TABLE "threshold_value" ADD CONSTRAINT "threshold_value_range" CHECK (
  CASE "quantity"
    WHEN 'lt1-power' THEN "value" BETWEEN 20 AND 1000
    WHEN 'lt2-power' THEN "value" BETWEEN 20 AND 1000
    WHEN 'critical-power' THEN "value" BETWEEN 20 AND 1000
    WHEN 'lt1-speed' THEN "value" BETWEEN 0.2 AND 12
    WHEN 'lt2-speed' THEN "value" BETWEEN 0.2 AND 12
    WHEN 'critical-speed' THEN "value" BETWEEN 0.2 AND 12
    WHEN 'w-prime' THEN "value" BETWEEN 1000 AND 60000
    WHEN 'd-prime' THEN "value" BETWEEN 10 AND 1000
    WHEN 'vo2max' THEN "value" BETWEEN 0.5 AND 8
    WHEN 'lt1-heart-rate' THEN "value" BETWEEN 60 AND 220
    WHEN 'lt2-heart-rate' THEN "value" BETWEEN 60 AND 220
    WHEN 'max-heart-rate' THEN "value" BETWEEN 100 AND 240
    WHEN 'resting-heart-rate' THEN "value" BETWEEN 25 AND 120
    WHEN 'body-mass' THEN "value" BETWEEN 25 AND 250
    ELSE false
  END);
ALTER TABLE "threshold_value" ADD CONSTRAINT "threshold_value_error_range" CHECK ("standard_error" >= 0 AND "standard_error" < "value");
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_duration_range" CHECK ("duration_min" > 0 AND "duration_min" <= 1440);
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_rating_range" CHECK ("rating" BETWEEN 0 AND 10);
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_intended_rating_range" CHECK ("intended_rating" BETWEEN 0 AND 10);
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_rating_delay_range" CHECK ("rating_delay_min" BETWEEN 0 AND 20160);
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_heart_rate_range" CHECK ("mean_heart_rate_bpm" BETWEEN 25 AND 240 AND ("peak_heart_rate_bpm" IS NULL OR "peak_heart_rate_bpm" BETWEEN 25 AND 250));
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_distance_range" CHECK ("distance_m" > 0 AND "distance_m" <= 500000);
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_kind_known" CHECK ("kind" IN ('training', 'competition', 'test'));
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_quality_known" CHECK ("quality" IN ('ok', 'question', 'suspect'));
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_withdrawn_why" CHECK (("withdrawn_at" IS NULL) = ("withdraw_reason" IS NULL));
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_external_once" UNIQUE ("club_id", "athlete_id", "source", "external_id");
ALTER TABLE "session_weight" ADD CONSTRAINT "session_weight_domain_state_known" CHECK ("domain_state" IN ('present', 'absent', 'not-applicable'));
ALTER TABLE "session_weight" ADD CONSTRAINT "session_weight_domain_load_when_present" CHECK (("domain_state" = 'present') = ("domain_load" IS NOT NULL));
ALTER TABLE "session_weight" ADD CONSTRAINT "session_weight_minutes_not_negative" CHECK (least("moderate_min", "heavy_min", "severe_min", "extreme_min", "rating_load", "domain_load") >= 0);
ALTER TABLE "daily_total" ADD CONSTRAINT "daily_total_not_negative" CHECK (least("sessions", "minutes", "rating_load", "domain_load", "rating_missing", "domain_missing") >= 0);
ALTER TABLE "flag" ADD CONSTRAINT "flag_level_known" CHECK ("level" IN ('note', 'watch', 'act'));
ALTER TABLE "flag" ADD CONSTRAINT "flag_order" CHECK ("until" >= "since");
ALTER TABLE "report" ADD CONSTRAINT "report_iso_week_shape" CHECK ("iso_week" ~ '^[0-9]{4}-W[0-5][0-9]$');
ALTER TABLE "report_delivery" ADD CONSTRAINT "report_delivery_state_known" CHECK ("state" IN ('waiting', 'sent', 'failed'));

-- By hand: what may not overlap in time.
ALTER TABLE "load_policy" ADD CONSTRAINT "load_policy_no_overlap" EXCLUDE USING gist
  ("club_id" WITH =, "squad_id" WITH =, daterange("valid_from", "valid_to", '[]') WITH &&) DEFERRABLE INITIALLY IMMEDIATE;
ALTER TABLE "membership" ADD CONSTRAINT "membership_no_overlap" EXCLUDE USING gist
  ("club_id" WITH =, "athlete_id" WITH =, daterange("valid_from", "valid_to", '[]') WITH &&);
ALTER TABLE "zone_period" ADD CONSTRAINT "zone_period_no_overlap" EXCLUDE USING gist
  ("club_id" WITH =, "athlete_id" WITH =, daterange("valid_from", "valid_to", '[]') WITH &&);
ALTER TABLE "availability" ADD CONSTRAINT "availability_no_overlap" EXCLUDE USING gist
  ("club_id" WITH =, "athlete_id" WITH =, daterange("valid_from", "valid_to", '[]') WITH &&);
ALTER TABLE "load_period" ADD CONSTRAINT "load_period_no_overlap" EXCLUDE USING gist
  ("club_id" WITH =, "squad_id" WITH =, coalesce("athlete_id", "squad_id") WITH =, daterange("valid_from", "valid_to", '[]') WITH &&);
ALTER TABLE "threshold_value" ADD CONSTRAINT "threshold_value_no_overlap" EXCLUDE USING gist
  ("club_id" WITH =, "athlete_id" WITH =, "quantity" WITH =, "modality" WITH =, "setting" WITH =, daterange("valid_from", "valid_to", '[]') WITH &&)
  WHERE ("withdrawn_at" IS NULL) DEFERRABLE INITIALLY IMMEDIATE;

-- By hand: row-level security. A transaction names its club; without one no tenant row is seen or written.
CREATE FUNCTION loadweir_club() RETURNS uuid LANGUAGE sql STABLE AS
$$ SELECT nullif(current_setting('loadweir.club_id', true), '')::uuid $$;
CREATE FUNCTION loadweir_operator() RETURNS boolean LANGUAGE sql STABLE AS
$$ SELECT coalesce(current_setting('loadweir.operator', true), '') = 'on' $$;

DO $$
DECLARE tenant text;
BEGIN
  FOR tenant IN
    SELECT c.table_name FROM information_schema.columns c
    WHERE c.table_schema = 'public' AND c.column_name = 'club_id'
  LOOP
    EXECUTE format('ALTER TABLE %I ENABLE ROW LEVEL SECURITY', tenant);
    EXECUTE format('CREATE POLICY %I ON %I USING (club_id = loadweir_club()) WITH CHECK (club_id = loadweir_club())', tenant || '_club', tenant);
  END LOOP;
END $$;
ALTER TABLE "club" ENABLE ROW LEVEL SECURITY;
CREATE POLICY "club_own" ON "club" USING ("id" = loadweir_club()) WITH CHECK ("id" = loadweir_club());
-- The operator (who makes clubs, and the scheduler that walks them) sees clubs and what is due, nothing else of a club.
CREATE POLICY "club_operator" ON "club" USING (loadweir_operator()) WITH CHECK (loadweir_operator());
CREATE POLICY "squad_operator" ON "squad" FOR SELECT USING (loadweir_operator());
CREATE POLICY "job_record_operator" ON "job_record" FOR SELECT USING (loadweir_operator());
