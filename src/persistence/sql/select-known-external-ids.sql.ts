import type { Prisma } from '../generated/client.ts';

interface ExternalId {
  athleteId: string;
  source: string;
  externalId: string;
}

/** Which of these names given by a source are taken; withdrawn sessions keep theirs. */
export async function selectKnownExternalIds(
  tx: Prisma.TransactionClient,
  keys: readonly ExternalId[],
): Promise<ExternalId[]> {
  if (keys.length === 0) return [];
  return tx.$queryRaw<ExternalId[]>`
    select s.athlete_id::text as "athleteId", s.source, s.external_id as "externalId"
    from unnest(${keys.map(({ athleteId }) => athleteId)}::uuid[], ${keys.map(({ source }) => source)}::text[],
      ${keys.map(({ externalId }) => externalId)}::text[]) as k (athlete_id, source, external_id)
    join training_session s on s.club_id = loadweir_club() and s.athlete_id = k.athlete_id
      and s.source = k.source and s.external_id = k.external_id`;
}
