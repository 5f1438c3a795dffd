import type { Prisma } from '../generated/client.ts';

/**
 * Writes the sums of these athletes' days anew from their live sessions, and takes away the row of a day that has none
 * left, in one statement. The days have to be held. Sums run in the order of ids, so that the same sessions always give
 * the same digits.
 */
export async function recomputeDailyTotals(
  tx: Prisma.TransactionClient,
  days: readonly { athleteId: string; day: string }[],
): Promise<void> {
  if (days.length === 0) return;
  await tx.$executeRaw`
    with touched as (
      select distinct athlete_id, day
      from unnest(${days.map(({ athleteId }) => athleteId)}::uuid[], ${days.map(({ day }) => day)}::date[])
        as touched (athlete_id, day)
    ), weighed as (
      select s.club_id, s.athlete_id, s.training_day as day, s.id, s.duration_min, s.quality,
        w.rating_load, w.domain_state, w.domain_load, w.basis,
        case when w.domain_state = 'present' then w.moderate_min end as moderate_min,
        case when w.domain_state = 'present' then w.heavy_min end as heavy_min,
        case when w.domain_state = 'present' then w.severe_min end as severe_min,
        case when w.domain_state = 'present' then w.extreme_min end as extreme_min,
        case when w.domain_state = 'present'
          then least(s.duration_min, w.moderate_min + w.heavy_min + w.severe_min + w.extreme_min) end as covered_min
      from touched
      join training_session s
        on s.club_id = loadweir_club() and s.athlete_id = touched.athlete_id and s.training_day = touched.day
        and s.withdrawn_at is null
      join session_weight w on w.club_id = s.club_id and w.session_id = s.id
    ), by_basis as (
      select athlete_id, day, jsonb_object_agg(basis, minutes order by basis) as basis_minutes
      from (
        select athlete_id, day, basis, sum(covered_min order by id) as minutes
        from weighed where covered_min is not null group by 1, 2, 3
      ) as part group by 1, 2
    ), emptied as (
      delete from daily_total t using touched
      where t.club_id = loadweir_club() and t.athlete_id = touched.athlete_id and t.day = touched.day
        and not exists (select from weighed w where w.athlete_id = t.athlete_id and w.day = t.day)
    )
    insert into daily_total (club_id, athlete_id, day, sessions, minutes, rating_load, rating_missing, domain_load,
      domain_missing, moderate_min, heavy_min, severe_min, extreme_min, applicable_min, covered_min, basis_minutes, suspect)
    select w.club_id, w.athlete_id, w.day, count(*), sum(w.duration_min order by w.id),
      coalesce(sum(w.rating_load order by w.id), 0), count(*) filter (where w.rating_load is null),
      coalesce(sum(w.domain_load order by w.id), 0), count(*) filter (where w.domain_state = 'absent'),
      coalesce(sum(w.moderate_min order by w.id), 0), coalesce(sum(w.heavy_min order by w.id), 0),
      coalesce(sum(w.severe_min order by w.id), 0), coalesce(sum(w.extreme_min order by w.id), 0),
      coalesce(sum(w.duration_min order by w.id) filter (where w.domain_state <> 'not-applicable'), 0),
      coalesce(sum(w.covered_min order by w.id), 0),
      coalesce((array_agg(b.basis_minutes))[1], '{}'::jsonb),
      count(*) filter (where w.quality = 'suspect')
    from weighed w left join by_basis b on b.athlete_id = w.athlete_id and b.day = w.day
    group by w.club_id, w.athlete_id, w.day
    on conflict (club_id, athlete_id, day) do update set
      sessions = excluded.sessions, minutes = excluded.minutes, rating_load = excluded.rating_load,
      rating_missing = excluded.rating_missing, domain_load = excluded.domain_load,
      domain_missing = excluded.domain_missing, moderate_min = excluded.moderate_min, heavy_min = excluded.heavy_min,
      severe_min = excluded.severe_min, extreme_min = excluded.extreme_min, applicable_min = excluded.applicable_min,
      covered_min = excluded.covered_min, basis_minutes = excluded.basis_minutes, suspect = excluded.suspect`;
}
