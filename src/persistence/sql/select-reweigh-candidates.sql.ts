import { Prisma } from '../generated/client.ts';

export interface SeriesDays {
  quantity: string;
  modality: string;
  setting: string;
  from: string;
  to: string | null;
}

/** Live sessions a change of thresholds may touch: of its modality and setting, on its days. */
export function touchedByThresholds(athleteId: string, changes: readonly SeriesDays[], ofAthlete: readonly string[]) {
  return Prisma.sql`
    s.athlete_id = ${athleteId}::uuid and exists (
      select from jsonb_to_recordset(${JSON.stringify(changes)}::jsonb)
        as c (quantity text, modality text, setting text, "from" date, "to" date)
      where s.training_day >= c."from" and (c."to" is null or s.training_day <= c."to")
        and (c.quantity = any(${[...ofAthlete]}::text[])
          or (s.modality = c.modality and (c.setting = 'any' or c.setting = s.setting))))`;
}

/** Live sessions of the members of a squad from a day on. */
export function touchedByPolicy(squadId: string, from: string) {
  return Prisma.sql`
    s.training_day >= ${from}::date and exists (
      select from membership m where m.club_id = s.club_id and m.athlete_id = s.athlete_id
        and m.squad_id = ${squadId}::uuid and m.valid_from <= s.training_day
        and (m.valid_to is null or s.training_day <= m.valid_to))`;
}

export async function countReweighCandidates(tx: Prisma.TransactionClient, touched: Prisma.Sql): Promise<number> {
  const [row] = await tx.$queryRaw<{ total: number }[]>`
    select count(*)::int as total from training_session s
    where s.club_id = loadweir_club() and s.withdrawn_at is null and ${touched}`;
  return row?.total ?? 0;
}

export async function selectReweighCandidates(
  tx: Prisma.TransactionClient,
  touched: Prisma.Sql,
  { after, limit }: { after: string | null; limit: number },
): Promise<string[]> {
  const rows = await tx.$queryRaw<{ id: string }[]>`
    select s.id::text as id from training_session s
    where s.club_id = loadweir_club() and s.withdrawn_at is null
      and (${after}::uuid is null or s.id > ${after}::uuid) and ${touched}
    order by s.id limit ${limit}`;
  return rows.map(({ id }) => id);
}
