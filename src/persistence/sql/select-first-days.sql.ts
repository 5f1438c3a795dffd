import type { Prisma } from '../generated/client.ts';

/** The first day of each athlete's log: the earlier of the first session and the first closing within a membership. */
export async function selectFirstDays(
  tx: Prisma.TransactionClient,
  athleteIds: readonly string[],
): Promise<{ athleteId: string; day: string }[]> {
  return tx.$queryRaw`
    select f."athleteId", f.day::text as day
    from (
      select a.id::text as "athleteId", least(
        (select min(d.day) from daily_total d where d.club_id = a.club_id and d.athlete_id = a.id),
        (select min(c.day) from membership m
          join day_closing c on c.club_id = m.club_id and c.squad_id = m.squad_id
            and c.day >= m.valid_from and (m.valid_to is null or c.day <= m.valid_to)
          where m.club_id = a.club_id and m.athlete_id = a.id)
      ) as day
      from athlete a where a.club_id = loadweir_club() and a.id = any(${[...athleteIds]}::uuid[])
    ) as f
    where f.day is not null`;
}
