import type { Prisma } from '../generated/client.ts';

/** Inserts many sessions in one statement; the rows are those of `toSessionRow`. */
export async function insertSessions(tx: Prisma.TransactionClient, rows: readonly object[]): Promise<void> {
  await tx.$executeRaw`
    insert into training_session (club_id, id, athlete_id, group_id, source, external_id, started_at, zone, training_day,
      duration_min, kind, modality, setting, title, distance_m, rating, rating_by, rating_delay_min, intended_rating,
      mean_heart_rate_bpm, peak_heart_rate_bpm, content, quality, quality_notes, version, entered_by, created_at,
      updated_at, withdrawn_at, withdraw_reason)
    select n."clubId", n.id, n."athleteId", n."groupId", n.source, n."externalId", n."startedAt", n.zone,
      n."trainingDay", n."durationMin", n.kind, n.modality, n.setting, n.title, n."distanceM", n.rating, n."ratingBy",
      n."ratingDelayMin", n."intendedRating", n."meanHeartRateBpm", n."peakHeartRateBpm", n.content, n.quality,
      n."qualityNotes", n.version, n."enteredBy", n."createdAt", n."updatedAt", n."withdrawnAt", n."withdrawReason"
    from jsonb_to_recordset(${JSON.stringify(rows)}::jsonb) as n ("clubId" uuid, id uuid, "athleteId" uuid,
      "groupId" uuid, source text, "externalId" text, "startedAt" timestamptz, zone text, "trainingDay" date,
      "durationMin" float8, kind text, modality text, setting text, title text, "distanceM" float8, rating float8,
      "ratingBy" text, "ratingDelayMin" int, "intendedRating" float8, "meanHeartRateBpm" float8,
      "peakHeartRateBpm" float8, content jsonb, quality text, "qualityNotes" text[], version int, "enteredBy" uuid,
      "createdAt" timestamptz, "updatedAt" timestamptz, "withdrawnAt" timestamptz, "withdrawReason" text)`;
}
