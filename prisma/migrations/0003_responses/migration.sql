-- How athletes respond: mornings, criterion tests, standard bouts, and what else may explain them.
-- CreateTable
CREATE TABLE "morning_answer" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "athlete_id" UUID NOT NULL,
    "day" DATE NOT NULL,
    "sleep_hours" DOUBLE PRECISION,
    "sleep" INTEGER,
    "fatigue" INTEGER,
    "stress" INTEGER,
    "soreness" INTEGER,
    "mood" INTEGER,
    "resting_heart_rate_bpm" DOUBLE PRECISION,
    "rmssd_ms" DOUBLE PRECISION,
    "rr_intervals_ms" DOUBLE PRECISION[],
    "rr_removed" INTEGER,
    "quality" TEXT NOT NULL,
    "quality_notes" TEXT[],
    "version" INTEGER NOT NULL,
    "entered_by" UUID,
    "entered_at" TIMESTAMPTZ(3) NOT NULL,
    "updated_at" TIMESTAMPTZ(3) NOT NULL,
    "withdrawn_at" TIMESTAMPTZ(3),
    "withdraw_reason" TEXT,

    CONSTRAINT "morning_answer_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "morning_revision" (
    "club_id" UUID NOT NULL,
    "morning_id" UUID NOT NULL,
    "version" INTEGER NOT NULL,
    "snapshot" JSONB NOT NULL,
    "reason" TEXT,
    "changed_by" UUID,
    "changed_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "morning_revision_pkey" PRIMARY KEY ("club_id","morning_id","version")
);

-- CreateTable
CREATE TABLE "circumstance" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "squad_id" UUID NOT NULL,
    "athlete_id" UUID,
    "kind" TEXT NOT NULL,
    "valid_from" DATE NOT NULL,
    "valid_to" DATE NOT NULL,
    "note" TEXT,
    "entered_by" UUID,
    "entered_at" TIMESTAMPTZ(3) NOT NULL,
    "withdrawn_at" TIMESTAMPTZ(3),
    "withdraw_reason" TEXT,

    CONSTRAINT "circumstance_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "test_definition" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "squad_id" UUID NOT NULL,
    "kind" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "protocol" TEXT NOT NULL,
    "modality" TEXT NOT NULL,
    "setting" TEXT NOT NULL,
    "unit" TEXT,
    "direction" TEXT,
    "typical_error" DOUBLE PRECISION,
    "rating_typical_error" DOUBLE PRECISION,
    "heart_rate_typical_error" DOUBLE PRECISION,
    "created_by" UUID,
    "created_at" TIMESTAMPTZ(3) NOT NULL,
    "withdrawn_at" TIMESTAMPTZ(3),
    "withdraw_reason" TEXT,

    CONSTRAINT "test_definition_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "test_result" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "definition_id" UUID NOT NULL,
    "athlete_id" UUID NOT NULL,
    "day" DATE NOT NULL,
    "value" DOUBLE PRECISION,
    "work_w" DOUBLE PRECISION,
    "work_mps" DOUBLE PRECISION,
    "heart_rate_bpm" DOUBLE PRECISION,
    "heart_rate_recovery_bpm" DOUBLE PRECISION,
    "rating" DOUBLE PRECISION,
    "lactate_mmol_l" DOUBLE PRECISION,
    "quality" TEXT NOT NULL,
    "quality_notes" TEXT[],
    "note" TEXT,
    "entered_by" UUID,
    "entered_at" TIMESTAMPTZ(3) NOT NULL,
    "supersedes" UUID,
    "withdrawn_at" TIMESTAMPTZ(3),
    "withdrawn_by" UUID,
    "withdraw_reason" TEXT,

    CONSTRAINT "test_result_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateIndex
CREATE INDEX "morning_answer_club_id_athlete_id_day_idx" ON "morning_answer"("club_id", "athlete_id", "day");

-- CreateIndex
CREATE INDEX "circumstance_club_id_squad_id_idx" ON "circumstance"("club_id", "squad_id");

-- CreateIndex
CREATE INDEX "test_result_club_id_athlete_id_day_idx" ON "test_result"("club_id", "athlete_id", "day");

-- By hand: foreign keys with club_id.
ALTER TABLE "morning_answer" ADD CONSTRAINT "morning_answer_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "morning_revision" ADD CONSTRAINT "morning_revision_morning_fk" FOREIGN KEY ("club_id", "morning_id") REFERENCES "morning_answer" ("club_id", "id");
ALTER TABLE "circumstance" ADD CONSTRAINT "circumstance_squad_fk" FOREIGN KEY ("club_id", "squad_id") REFERENCES "squad" ("club_id", "id");
ALTER TABLE "circumstance" ADD CONSTRAINT "circumstance_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "test_definition" ADD CONSTRAINT "test_definition_squad_fk" FOREIGN KEY ("club_id", "squad_id") REFERENCES "squad" ("club_id", "id");
ALTER TABLE "test_result" ADD CONSTRAINT "test_result_definition_fk" FOREIGN KEY ("club_id", "definition_id") REFERENCES "test_definition" ("club_id", "id");
ALTER TABLE "test_result" ADD CONSTRAINT "test_result_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "test_result" ADD CONSTRAINT "test_result_supersedes_fk" FOREIGN KEY ("club_id", "supersedes") REFERENCES "test_result" ("club_id", "id");

-- By hand: ranges. The bounds are those of the input schemas.
ALTER TABLE "morning_answer" ADD CONSTRAINT "morning_answer_sleep_hours_range" CHECK ("sleep_hours" BETWEEN 0 AND 24);
ALTER TABLE "morning_answer" ADD CONSTRAINT "morning_answer_sleep_range" CHECK ("sleep" BETWEEN 1 AND 7);
ALTER TABLE "morning_answer" ADD CONSTRAINT "morning_answer_fatigue_range" CHECK ("fatigue" BETWEEN 1 AND 7);
ALTER TABLE "morning_answer" ADD CONSTRAINT "morning_answer_stress_range" CHECK ("stress" BETWEEN 1 AND 7);
ALTER TABLE "morning_answer" ADD CONSTRAINT "morning_answer_soreness_range" CHECK ("soreness" BETWEEN 1 AND 7);
ALTER TABLE "morning_answer" ADD CONSTRAINT "morning_answer_mood_range" CHECK ("mood" BETWEEN 1 AND 7);
ALTER TABLE "morning_answer" ADD CONSTRAINT "morning_answer_resting_heart_rate_range" CHECK ("resting_heart_rate_bpm" BETWEEN 25 AND 120);
ALTER TABLE "morning_answer" ADD CONSTRAINT "morning_answer_rmssd_range" CHECK ("rmssd_ms" BETWEEN 1 AND 500);
ALTER TABLE "morning_answer" ADD CONSTRAINT "morning_answer_quality_known" CHECK ("quality" IN ('ok', 'question', 'suspect'));
ALTER TABLE "morning_answer" ADD CONSTRAINT "morning_answer_withdrawn_why" CHECK (("withdrawn_at" IS NULL) = ("withdraw_reason" IS NULL));
ALTER TABLE "circumstance" ADD CONSTRAINT "circumstance_order" CHECK ("valid_to" >= "valid_from");
ALTER TABLE "circumstance" ADD CONSTRAINT "circumstance_kind_known" CHECK ("kind" IN ('travel', 'heat', 'altitude'));
ALTER TABLE "circumstance" ADD CONSTRAINT "circumstance_withdrawn_why" CHECK (("withdrawn_at" IS NULL) = ("withdraw_reason" IS NULL));
ALTER TABLE "test_definition" ADD CONSTRAINT "test_definition_kind_known" CHECK ("kind" IN ('criterion', 'standard-bout'));
ALTER TABLE "test_definition" ADD CONSTRAINT "test_definition_direction_known" CHECK ("direction" IN ('higher', 'lower'));
ALTER TABLE "test_definition" ADD CONSTRAINT "test_definition_scale_by_kind" CHECK (num_nonnulls("unit", "direction", "typical_error") = CASE "kind" WHEN 'criterion' THEN 3 ELSE 0 END AND num_nonnulls("rating_typical_error", "heart_rate_typical_error") = CASE "kind" WHEN 'standard-bout' THEN 2 ELSE 0 END);
ALTER TABLE "test_definition" ADD CONSTRAINT "test_definition_typical_error_range" CHECK (("typical_error" IS NULL OR "typical_error" > 0) AND ("rating_typical_error" IS NULL OR "rating_typical_error" BETWEEN 0.1 AND 3) AND ("heart_rate_typical_error" IS NULL OR "heart_rate_typical_error" BETWEEN 0.5 AND 20));
ALTER TABLE "test_definition" ADD CONSTRAINT "test_definition_withdrawn_why" CHECK (("withdrawn_at" IS NULL) = ("withdraw_reason" IS NULL));
ALTER TABLE "test_result" ADD CONSTRAINT "test_result_value_range" CHECK ("value" > 0 AND "value" <= 1000000);
ALTER TABLE "test_result" ADD CONSTRAINT "test_result_work_range" CHECK (("work_w" IS NULL OR "work_w" BETWEEN 20 AND 2000) AND ("work_mps" IS NULL OR "work_mps" BETWEEN 0.2 AND 12));
ALTER TABLE "test_result" ADD CONSTRAINT "test_result_heart_rate_range" CHECK ("heart_rate_bpm" BETWEEN 60 AND 240);
ALTER TABLE "test_result" ADD CONSTRAINT "test_result_heart_rate_recovery_range" CHECK ("heart_rate_recovery_bpm" BETWEEN 0 AND 120);
ALTER TABLE "test_result" ADD CONSTRAINT "test_result_rating_range" CHECK ("rating" BETWEEN 0 AND 10);
ALTER TABLE "test_result" ADD CONSTRAINT "test_result_lactate_range" CHECK ("lactate_mmol_l" BETWEEN 0.1 AND 35);
ALTER TABLE "test_result" ADD CONSTRAINT "test_result_quality_known" CHECK ("quality" IN ('ok', 'suspect'));
ALTER TABLE "test_result" ADD CONSTRAINT "test_result_withdrawn_why" CHECK (("withdrawn_at" IS NULL) = ("withdraw_reason" IS NULL));

-- By hand: what is there once.
CREATE UNIQUE INDEX "morning_answer_once" ON "morning_answer" ("club_id", "athlete_id", "day") WHERE "withdrawn_at" IS NULL;
CREATE UNIQUE INDEX "test_definition_name_once" ON "test_definition" ("club_id", "squad_id", "name") WHERE "withdrawn_at" IS NULL;
CREATE UNIQUE INDEX "test_result_once" ON "test_result" ("club_id", "definition_id", "athlete_id", "day") WHERE "withdrawn_at" IS NULL;

-- By hand: row-level security.
ALTER TABLE "morning_answer" ENABLE ROW LEVEL SECURITY;
CREATE POLICY "morning_answer_club" ON "morning_answer" USING (club_id = loadweir_club()) WITH CHECK (club_id = loadweir_club());
ALTER TABLE "morning_revision" ENABLE ROW LEVEL SECURITY;
CREATE POLICY "morning_revision_club" ON "morning_revision" USING (club_id = loadweir_club()) WITH CHECK (club_id = loadweir_club());
ALTER TABLE "circumstance" ENABLE ROW LEVEL SECURITY;
CREATE POLICY "circumstance_club" ON "circumstance" USING (club_id = loadweir_club()) WITH CHECK (club_id = loadweir_club());
ALTER TABLE "test_definition" ENABLE ROW LEVEL SECURITY;
CREATE POLICY "test_definition_club" ON "test_definition" USING (club_id = loadweir_club()) WITH CHECK (club_id = loadweir_club());
ALTER TABLE "test_result" ENABLE ROW LEVEL SECURITY;
CREATE POLICY "test_result_club" ON "test_result" USING (club_id = loadweir_club()) WITH CHECK (club_id = loadweir_club());
