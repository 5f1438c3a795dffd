import type { Prisma } from '../generated/client.ts';

export interface AthleteContextRow {
  athleteId: string;
  name: string;
  sex: string | null;
  memberships: { squadId: string; zone: string; from: string; to: string | null }[];
  zonePeriods: { zone: string; from: string; to: string }[];
}

/** Where athletes belong and live, whole: sessions of any day can be placed with it. */
export async function selectAthleteContexts(
  tx: Prisma.TransactionClient,
  athleteIds: readonly string[],
): Promise<AthleteContextRow[]> {
  return tx.$queryRaw<AthleteContextRow[]>`
    select a.id::text as "athleteId", a.name, a.sex,
      coalesce((
        select jsonb_agg(jsonb_build_object('squadId', m.squad_id, 'zone', s.zone,
          'from', m.valid_from, 'to', m.valid_to) order by m.valid_from)
        from membership m join squad s on s.club_id = m.club_id and s.id = m.squad_id
        where m.club_id = a.club_id and m.athlete_id = a.id
      ), '[]'::jsonb) as memberships,
      coalesce((
        select jsonb_agg(jsonb_build_object('zone', z.zone, 'from', z.valid_from, 'to', z.valid_to) order by z.valid_from)
        from zone_period z where z.club_id = a.club_id and z.athlete_id = a.id
      ), '[]'::jsonb) as "zonePeriods"
    from athlete a where a.club_id = loadweir_club() and a.id = any(${[...athleteIds]}::uuid[])`;
}
