import type { Prisma } from '../generated/client.ts';

/** Minutes of the live sessions of each of these days, without one session. Days without a session are left out. */
export async function selectMinutesOfDays(
  tx: Prisma.TransactionClient,
  days: readonly { athleteId: string; day: string }[],
  exceptSessionId: string | null,
): Promise<{ athleteId: string; day: string; minutes: number }[]> {
  return tx.$queryRaw`
    select s.athlete_id::text as "athleteId", s.training_day::text as day, sum(s.duration_min) as minutes
    from (
      select distinct athlete_id, day
      from unnest(${days.map(({ athleteId }) => athleteId)}::uuid[], ${days.map(({ day }) => day)}::date[])
        as asked (athlete_id, day)
    ) as asked
    join training_session s on s.club_id = loadweir_club() and s.athlete_id = asked.athlete_id
      and s.training_day = asked.day and s.withdrawn_at is null
    where s.id is distinct from ${exceptSessionId}::uuid
    group by 1, 2`;
}
