import { Temporal } from 'temporal-polyfill';
import { coveredPeriod, periodDays } from '../../src/features/jobs/job-period.ts';
import { keyOf } from '../../src/features/jobs/jobs.types.ts';
import type { JobKey, ScheduledSquad } from '../../src/features/jobs/jobs.types.ts';
import { localDateTime, localDay } from '../../src/platform/zoned-time.ts';
import type { ScheduledJob } from '../schedule.ts';

export interface DueRun extends JobKey {
  clubId: string;
  /** The instant of its wall time in the squad's zone. */
  dueAt: Date;
}

const HOUR = 3_600_000;

/**
 * What has to be started now. Of each job and squad only the last time that has come counts, so an outage, a first
 * deployment or a clock set forward never lets loose more than one run each. A time the clocks skip moves on by the gap,
 * a doubled one is the earlier; a period that was claimed stays claimed however the clock is set.
 */
export function due(
  schedule: readonly ScheduledJob[],
  claimed: readonly JobKey[],
  squads: readonly ScheduledSquad[],
  now: Date,
): DueRun[] {
  const taken = new Set(claimed.map(keyOf));
  return squads
    .flatMap((squad) => schedule.map((job) => lastRun(job, squad, now)))
    .filter((run): run is DueRun => run !== null && !taken.has(keyOf(run)));
}

function lastRun(job: ScheduledJob, squad: ScheduledSquad, now: Date): DueRun | null {
  const last = lastTime(job, squad.zone, now);
  if (now.getTime() - last.dueAt.getTime() >= job.catchUpHours * HOUR) return null;
  const period = coveredPeriod(job, last.day);
  if (last.dueAt < squad.createdAt) return null;
  if (periodDays(job.period, period)!.to < localDay(squad.createdAt, squad.zone)) return null;
  return { job: job.id, clubId: squad.clubId, squadId: squad.squadId, period, dueAt: last.dueAt };
}

/** The last local day on which the job's wall time has come, and that instant. */
function lastTime({ when }: ScheduledJob, zone: string, now: Date): { day: string; dueAt: Date } {
  for (let day = Temporal.PlainDate.from(localDay(now, zone)); ; day = day.subtract({ days: 1 })) {
    if (when.weekday !== undefined && day.dayOfWeek !== when.weekday) continue;
    const dueAt = localDateTime(day.toString(), when.time, zone);
    if (dueAt <= now) return { day: day.toString(), dueAt };
  }
}
