import type { Prisma } from '../generated/client.ts';

/** Inserts the weights of new sessions in one statement; the rows are those of `toWeightRow`. */
export async function insertWeights(tx: Prisma.TransactionClient, rows: readonly object[]): Promise<void> {
  await tx.$executeRaw`
    insert into session_weight (club_id, session_id, rating_load, domain_state, domain_reason, domain_load, moderate_min,
      heavy_min, severe_min, extreme_min, unassigned_min, basis, measures, thresholds_used, policy_id, method_version,
      weighed_at)
    select n."clubId", n."sessionId", n."ratingLoad", n."domainState", n."domainReason", n."domainLoad",
      n."moderateMin", n."heavyMin", n."severeMin", n."extremeMin", n."unassignedMin", n.basis, n.measures,
      n."thresholdsUsed", n."policyId", n."methodVersion", n."weighedAt"
    from jsonb_to_recordset(${JSON.stringify(rows)}::jsonb) as n ("clubId" uuid, "sessionId" uuid, "ratingLoad" float8,
      "domainState" text, "domainReason" text, "domainLoad" float8, "moderateMin" float8, "heavyMin" float8,
      "severeMin" float8, "extremeMin" float8, "unassignedMin" float8, basis text, measures jsonb,
      "thresholdsUsed" jsonb, "policyId" uuid, "methodVersion" text, "weighedAt" timestamptz)`;
}

/** Rewrites the weights of several sessions; the rows are those of `toWeightRow`. */
export async function updateWeights(tx: Prisma.TransactionClient, rows: readonly object[]): Promise<void> {
  if (rows.length === 0) return;
  await tx.$executeRaw`
    update session_weight w set rating_load = n."ratingLoad", domain_state = n."domainState",
      domain_reason = n."domainReason", domain_load = n."domainLoad", moderate_min = n."moderateMin",
      heavy_min = n."heavyMin", severe_min = n."severeMin", extreme_min = n."extremeMin",
      unassigned_min = n."unassignedMin", basis = n.basis, measures = n.measures, thresholds_used = n."thresholdsUsed",
      policy_id = n."policyId", method_version = n."methodVersion", weighed_at = n."weighedAt"
    from jsonb_to_recordset(${JSON.stringify(rows)}::jsonb) as n ("sessionId" uuid, "ratingLoad" float8,
      "domainState" text, "domainReason" text, "domainLoad" float8, "moderateMin" float8, "heavyMin" float8,
      "severeMin" float8, "extremeMin" float8, "unassignedMin" float8, basis text, measures jsonb,
      "thresholdsUsed" jsonb, "policyId" uuid, "methodVersion" text, "weighedAt" timestamptz)
    where w.club_id = loadweir_club() and w.session_id = n."sessionId"`;
}

/** Rewrites the quality marks of several sessions; nothing that was entered changes. */
export async function updateQualities(
  tx: Prisma.TransactionClient,
  marks: readonly { sessionId: string; quality: string; qualityNotes: readonly string[] }[],
): Promise<void> {
  if (marks.length === 0) return;
  await tx.$executeRaw`
    update training_session s set quality = n.quality, quality_notes = n."qualityNotes"
    from jsonb_to_recordset(${JSON.stringify(marks)}::jsonb)
      as n ("sessionId" uuid, quality text, "qualityNotes" text[])
    where s.club_id = loadweir_club() and s.id = n."sessionId"`;
}
