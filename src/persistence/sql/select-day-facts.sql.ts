import type { Prisma } from '../generated/client.ts';

interface Stretch {
  from: string;
  to: string | null;
}

export interface DayFactsRow {
  athleteId: string;
  memberships: (Stretch & { squadId: string })[];
  availability: (Stretch & { state: string; away: boolean })[];
  unknownDays: string[];
  days: string[];
  sessions: number[];
  minutes: number[];
  ratingLoad: number[];
  ratingMissing: number[];
  domainLoad: number[];
  domainMissing: number[];
  moderateMin: number[];
  heavyMin: number[];
  severeMin: number[];
  extremeMin: number[];
  applicableMin: number[];
  coveredMin: number[];
  basisMinutes: unknown;
  suspect: number[];
}

/** All that says what athletes' days were: one row an athlete, the daily totals as arrays in the order of days. */
export async function selectDayFacts(
  tx: Prisma.TransactionClient,
  athleteIds: readonly string[],
  from: string,
  to: string,
): Promise<DayFactsRow[]> {
  return tx.$queryRaw<DayFactsRow[]>`
    select a.id::text as "athleteId",
      coalesce((
        select jsonb_agg(jsonb_build_object('squadId', m.squad_id, 'from', m.valid_from, 'to', m.valid_to)
          order by m.valid_from)
        from membership m where m.club_id = a.club_id and m.athlete_id = a.id
      ), '[]'::jsonb) as memberships,
      coalesce((
        select jsonb_agg(jsonb_build_object('state', v.state, 'away', v.cause = 'away',
          'from', v.valid_from, 'to', v.valid_to) order by v.valid_from)
        from availability v where v.club_id = a.club_id and v.athlete_id = a.id
          and v.valid_from <= ${to}::date and (v.valid_to is null or v.valid_to >= ${from}::date)
      ), '[]'::jsonb) as availability,
      array(
        select u.day::text from day_unknown u
        where u.club_id = a.club_id and u.athlete_id = a.id and u.day between ${from}::date and ${to}::date
          and exists (
            select from membership m where m.club_id = u.club_id and m.athlete_id = u.athlete_id
              and m.squad_id = u.squad_id and m.valid_from <= u.day and (m.valid_to is null or u.day <= m.valid_to))
      ) as "unknownDays",
      t.*
    from athlete a
    cross join lateral (
      select coalesce(array_agg(d.day::text order by d.day), '{}') as days,
        array_agg(d.sessions order by d.day) as sessions, array_agg(d.minutes order by d.day) as minutes,
        array_agg(d.rating_load order by d.day) as "ratingLoad",
        array_agg(d.rating_missing order by d.day) as "ratingMissing",
        array_agg(d.domain_load order by d.day) as "domainLoad",
        array_agg(d.domain_missing order by d.day) as "domainMissing",
        array_agg(d.moderate_min order by d.day) as "moderateMin", array_agg(d.heavy_min order by d.day) as "heavyMin",
        array_agg(d.severe_min order by d.day) as "severeMin", array_agg(d.extreme_min order by d.day) as "extremeMin",
        array_agg(d.applicable_min order by d.day) as "applicableMin",
        array_agg(d.covered_min order by d.day) as "coveredMin",
        jsonb_agg(d.basis_minutes order by d.day) as "basisMinutes", array_agg(d.suspect order by d.day) as suspect
      from daily_total d
      where d.club_id = a.club_id and d.athlete_id = a.id and d.day between ${from}::date and ${to}::date
    ) as t
    where a.club_id = loadweir_club() and a.id = any(${[...athleteIds]}::uuid[])`;
}
