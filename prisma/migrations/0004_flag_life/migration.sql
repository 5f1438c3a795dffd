-- What happens to a flag between its first and last day.
-- CreateTable
CREATE TABLE "flag_event" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "flag_id" UUID NOT NULL,
    "event" TEXT NOT NULL,
    "level" TEXT,
    "day" DATE,
    "note" TEXT,
    "until" DATE,
    "person_id" UUID,
    "at" TIMESTAMPTZ(3) NOT NULL,

    CONSTRAINT "flag_event_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateTable
CREATE TABLE "flag_dispute" (
    "club_id" UUID NOT NULL,
    "id" UUID NOT NULL,
    "flag_id" UUID NOT NULL,
    "athlete_id" UUID NOT NULL,
    "valid_from" DATE NOT NULL,
    "valid_to" DATE NOT NULL,
    "note" TEXT NOT NULL,
    "raised_by" UUID,
    "raised_at" TIMESTAMPTZ(3) NOT NULL,
    "outcome" TEXT,
    "settled_by" UUID,
    "settled_at" TIMESTAMPTZ(3),

    CONSTRAINT "flag_dispute_pkey" PRIMARY KEY ("club_id","id")
);

-- CreateIndex
CREATE INDEX "flag_event_club_id_flag_id_idx" ON "flag_event"("club_id", "flag_id");

-- CreateIndex
CREATE INDEX "flag_dispute_club_id_athlete_id_idx" ON "flag_dispute"("club_id", "athlete_id");

-- By hand: foreign keys with club_id.
ALTER TABLE "flag_event" ADD CONSTRAINT "flag_event_flag_fk" FOREIGN KEY ("club_id", "flag_id") REFERENCES "flag" ("club_id", "id");
ALTER TABLE "flag_dispute" ADD CONSTRAINT "flag_dispute_flag_fk" FOREIGN KEY ("club_id", "flag_id") REFERENCES "flag" ("club_id", "id");
ALTER TABLE "flag_dispute" ADD CONSTRAINT "flag_dispute_athlete_fk" FOREIGN KEY ("club_id", "athlete_id") REFERENCES "athlete" ("club_id", "id");

-- By hand: ranges.
ALTER TABLE "flag_event" ADD CONSTRAINT "flag_event_event_known" CHECK ("event" IN ('raised', 'escalated', 'eased', 'acknowledged', 'disputed', 'settled', 'resolved', 'reopened', 'taken-back'));
ALTER TABLE "flag_event" ADD CONSTRAINT "flag_event_level_known" CHECK ("level" IN ('note', 'watch', 'act'));
ALTER TABLE "flag_dispute" ADD CONSTRAINT "flag_dispute_order" CHECK ("valid_to" >= "valid_from");
ALTER TABLE "flag_dispute" ADD CONSTRAINT "flag_dispute_outcome_known" CHECK ("outcome" IN ('kept', 'left-out'));
ALTER TABLE "flag_dispute" ADD CONSTRAINT "flag_dispute_settled_with_outcome" CHECK (("outcome" IS NULL) = ("settled_at" IS NULL));

-- By hand: row-level security.
ALTER TABLE "flag_event" ENABLE ROW LEVEL SECURITY;
CREATE POLICY "flag_event_club" ON "flag_event" USING (club_id = loadweir_club()) WITH CHECK (club_id = loadweir_club());
ALTER TABLE "flag_dispute" ENABLE ROW LEVEL SECURITY;
CREATE POLICY "flag_dispute_club" ON "flag_dispute" USING (club_id = loadweir_club()) WITH CHECK (club_id = loadweir_club());
