-- What is planned: blocks, sessions, deviations of single athletes, every version, and the manager's changes.
-- CreateTable
CREATE TABLE "plan_block" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "squad_id" UUID NOT NULL,
    "purpose" TEXT NOT NULL,
    "valid_from" DATE NOT NULL,
    "valid_to" DATE NOT NULL,
    "note" TEXT,
    "version" INTEGER NOT NULL,
    "created_by" UUID,
    "created_at" TIMESTAMPTZ(3) NOT NULL,
    "updated_at" TIMESTAMPTZ(3) NOT NULL,
    "withdrawn_at" TIMESTAMPTZ(3),

    CONSTRAINT "plan_block_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "planned_session" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "squad_id" UUID NOT NULL,
    "athlete_id" UUID,
    "day" DATE NOT NULL,
    "position" INTEGER NOT NULL,
    "kind" TEXT NOT NULL,
    "modality" TEXT,
    "setting" TEXT,
    "title" TEXT,
    "duration_min" DOUBLE PRECISION NOT NULL,
    "content" JSONB NOT NULL,
    "version" INTEGER NOT NULL,
    "created_by" UUID,
    "created_at" TIMESTAMPTZ(3) NOT NULL,
    "updated_at" TIMESTAMPTZ(3) NOT NULL,
    "withdrawn_at" TIMESTAMPTZ(3),

    CONSTRAINT "planned_session_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "plan_deviation" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "planned_session_id" UUID NOT NULL,
    "athlete_id" UUID NOT NULL,
    "change_id" UUID,
    "day" DATE NOT NULL,
    "kind" TEXT NOT NULL,
    "modality" TEXT,
    "setting" TEXT,
    "title" TEXT,
    "duration_min" DOUBLE PRECISION NOT NULL,
    "content" JSONB NOT NULL,
    "reason" TEXT NOT NULL,
    "version" INTEGER NOT NULL,
    "created_by" UUID,
    "created_at" TIMESTAMPTZ(3) NOT NULL,
    "updated_at" TIMESTAMPTZ(3) NOT NULL,
    "withdrawn_at" TIMESTAMPTZ(3),

    CONSTRAINT "plan_deviation_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "plan_revision" (
    "club_id" UUID NOT NULL,
    "subject" TEXT NOT NULL,
    "subject_id" UUID NOT NULL,
    "version" INTEGER NOT NULL,
    "snapshot" JSONB NOT NULL,
    "reason" TEXT NOT NULL,
    "changed_by" UUID,
    "changed_at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "plan_revision_pkey" PRIMARY KEY ("club_id","subject","subject_id","version")
);

-- CreateTable
CREATE TABLE "plan_change" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "squad_id" UUID NOT NULL,
    "flag_id" UUID,
    "athlete_ids" UUID[],
    "valid_from" DATE NOT NULL,
    "valid_to" DATE NOT NULL,
    "action" JSONB NOT NULL,
    "reason" TEXT NOT NULL,
    "touched" JSONB NOT NULL,
    "before" JSONB NOT NULL,
    "after" JSONB NOT NULL,
    "made_by" UUID,
    "made_at" TIMESTAMPTZ(3) NOT NULL,
    "undone_by" UUID,
    "undone_at" TIMESTAMPTZ(3),

    CONSTRAINT "plan_change_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateIndex
CREATE INDEX "plan_block_club_id_squad_id_idx" ON "plan_block"("club_id", "squad_id");

-- CreateIndex
CREATE INDEX "planned_session_club_id_squad_id_day_idx" ON "planned_session"("club_id", "squad_id", "day");

-- CreateIndex
CREATE INDEX "plan_deviation_club_id_planned_session_id_idx" ON "plan_deviation"("club_id", "planned_session_id");

-- CreateIndex
CREATE INDEX "plan_change_club_id_squad_id_made_at_idx" ON "plan_change"("club_id", "squad_id", "made_at");

-- By hand: foreign keys with club_id.
ALTER TABLE "plan_block" ADD CONSTRAINT "plan_block_squad_fk" FOREIGN KEY ("club_id", "squad_id") REFERENCES "squad" ("club_id", "id");
ALTER TABLE "planned_session" ADD CONSTRAINT "planned_session_squad_fk" FOREIGN KEY ("club_id", "squad_id") REFERENCES "squad" ("club_id", "id");
ALTER TABLE "planned_session" ADD CONSTRAINT "planned_session_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "plan_deviation" ADD CONSTRAINT "plan_deviation_session_fk" FOREIGN KEY ("club_id", "planned_session_id") REFERENCES "planned_session" ("club_id", "id");
ALTER TABLE "plan_deviation" ADD CONSTRAINT "plan_deviation_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");
ALTER TABLE "plan_deviation" ADD CONSTRAINT "plan_deviation_change_fk" FOREIGN KEY ("club_id", "change_id") REFERENCES "plan_change" ("club_id", "id");
ALTER TABLE "plan_revision" ADD CONSTRAINT "plan_revision_club_fk" FOREIGN KEY ("club_id") REFERENCES "club" ("id");
ALTER TABLE "plan_change" ADD CONSTRAINT "plan_change_squad_fk" FOREIGN KEY ("club_id", "squad_id") REFERENCES "squad" ("club_id", "id");
ALTER TABLE "plan_change" ADD CONSTRAINT "plan_change_flag_fk" FOREIGN KEY ("club_id", "flag_id") REFERENCES "flag" ("club_id", "id");

-- By hand: ranges.
ALTER TABLE "plan_block" ADD CONSTRAINT "plan_block_order" CHECK ("valid_to" >= "valid_from");
ALTER TABLE "plan_block" ADD CONSTRAINT "plan_block_purpose_known" CHECK ("purpose" IN ('general', 'accumulation', 'overload', 'intensification', 'taper', 'recovery', 'transition'));
ALTER TABLE "plan_block" ADD CONSTRAINT "plan_block_overload_length" CHECK ("purpose" <> 'overload' OR "valid_to" - "valid_from" + 1 <= 21);
ALTER TABLE "planned_session" ADD CONSTRAINT "planned_session_kind_known" CHECK ("kind" IN ('training', 'competition', 'rest'));
ALTER TABLE "planned_session" ADD CONSTRAINT "planned_session_duration_range" CHECK ("duration_min" BETWEEN 0 AND 1440);
ALTER TABLE "planned_session" ADD CONSTRAINT "planned_session_rest_is_empty" CHECK (("kind" = 'rest') = ("duration_min" = 0) AND ("kind" = 'rest') = ("modality" IS NULL));
ALTER TABLE "planned_session" ADD CONSTRAINT "planned_session_position_range" CHECK ("position" BETWEEN 1 AND 20);
ALTER TABLE "plan_deviation" ADD CONSTRAINT "plan_deviation_kind_known" CHECK ("kind" IN ('training', 'competition', 'rest'));
ALTER TABLE "plan_deviation" ADD CONSTRAINT "plan_deviation_duration_range" CHECK ("duration_min" BETWEEN 0 AND 1440);
ALTER TABLE "plan_deviation" ADD CONSTRAINT "plan_deviation_rest_is_empty" CHECK (("kind" = 'rest') = ("duration_min" = 0) AND ("kind" = 'rest') = ("modality" IS NULL));
ALTER TABLE "plan_revision" ADD CONSTRAINT "plan_revision_subject_known" CHECK ("subject" IN ('block', 'session', 'deviation'));
ALTER TABLE "plan_change" ADD CONSTRAINT "plan_change_order" CHECK ("valid_to" >= "valid_from");
ALTER TABLE "plan_change" ADD CONSTRAINT "plan_change_undone_by_whom" CHECK ("undone_by" IS NULL OR "undone_at" IS NOT NULL);

-- By hand: what may not overlap, and one deviation a session and athlete.
ALTER TABLE "plan_block" ADD CONSTRAINT "plan_block_no_overlap" EXCLUDE USING gist
  ("club_id" WITH =, "squad_id" WITH =, daterange("valid_from", "valid_to", '[]') WITH &&) WHERE ("withdrawn_at" IS NULL) DEFERRABLE INITIALLY IMMEDIATE;
CREATE UNIQUE INDEX "plan_deviation_once" ON "plan_deviation" ("club_id", "planned_session_id", "athlete_id") WHERE "withdrawn_at" IS NULL;

-- By hand: row-level security.
ALTER TABLE "plan_block" ENABLE ROW LEVEL SECURITY;
CREATE POLICY "plan_block_club" ON "plan_block" USING (club_id = loadweir_club()) WITH CHECK (club_id = loadweir_club());
ALTER TABLE "planned_session" ENABLE ROW LEVEL SECURITY;
CREATE POLICY "planned_session_club" ON "planned_session" USING (club_id = loadweir_club()) WITH CHECK (club_id = loadweir_club());
ALTER TABLE "plan_deviation" ENABLE ROW LEVEL SECURITY;
CREATE POLICY "plan_deviation_club" ON "plan_deviation" USING (club_id = loadweir_club()) WITH CHECK (club_id = loadweir_club());
ALTER TABLE "plan_revision" ENABLE ROW LEVEL SECURITY;
CREATE POLICY "plan_revision_club" ON "plan_revision" USING (club_id = loadweir_club()) WITH CHECK (club_id = loadweir_club());
ALTER TABLE "plan_change" ENABLE ROW LEVEL SECURITY;
CREATE POLICY "plan_change_club" ON "plan_change" USING (club_id = loadweir_club()) WITH CHECK (club_id = loadweir_club());
