import { dayNumber, isoDay, isoWeek, weekRange } from '../../core/series/day.ts';
import type { JobKind } from './jobs.types.ts';

type PeriodKind = JobKind['period'];

/** The period of that kind a day lies in. @example periodOf('iso-week', '2026-11-23'); // => '2026-W48' */
export function periodOf(kind: PeriodKind, day: string): string {
  return kind === 'day' ? day : isoWeek(dayNumber(day));
}

/** First and last day of a period, or null if it is none of that kind. */
export function periodDays(kind: PeriodKind, period: string): { from: string; to: string } | null {
  try {
    if (kind === 'day') return { from: isoDay(dayNumber(period)), to: period };
    const { from, to } = weekRange(period);
    return { from: isoDay(from), to: isoDay(to) };
  } catch {
    return null;
  }
}

/** The period a job covers when it runs on that local day. */
export function coveredPeriod(kind: JobKind, runDay: string): string {
  if (kind.covers === 'under-way') return periodOf(kind.period, runDay);
  const { from } = periodDays(kind.period, periodOf(kind.period, runDay))!;
  return periodOf(kind.period, isoDay(dayNumber(from) - 1));
}

/** Whether a run for that period makes sense on that local day: it has ended, or is under way for jobs that want that. */
export function isOver(kind: JobKind, period: string, today: string): boolean {
  const days = periodDays(kind.period, period);
  return days !== null && (kind.covers === 'ended' ? days.to < today : days.from <= today);
}
