import { primaryMeasure } from '../../core/flags/primary-measure.ts';
import { dayNumber, weekday } from '../../core/series/day.ts';
import type { Measure } from '../../core/types.ts';
import type { DayRecord } from '../days/days.types.ts';

const WINDOW_DAYS = 28;
const UNKNOWN = { domain: 'unknown', minutes: 0, domainMinutes: 0 } as const;

/**
 * The measure that drives one athlete's figures: the policy's, or what the 28 days up to the last Sunday of the log
 * allow. Days before the log count as unknown. Decided once a week, so that a window never mixes two measures.
 */
export function chooseMeasure(
  records: readonly DayRecord[],
  policy: Measure,
): { measure: Measure; reason: string; decidedOn: string | null } {
  if (policy === 'rating-load') return { measure: policy, reason: "the squad's policy says so", decidedOn: null };
  const sunday = records.findLastIndex((record) => weekday(dayNumber(record.day)) === 7);
  const window = Array.from({ length: WINDOW_DAYS }, (_, i) => {
    const record = records[sunday - WINDOW_DAYS + 1 + i];
    if (record === undefined || sunday < 0) return UNKNOWN;
    const domainMinutes = Math.min(record.coveredMin, record.applicableMin);
    return { domain: record.domain.state, minutes: record.applicableMin, domainMinutes };
  });
  return { ...primaryMeasure(window), decidedOn: records[sunday]?.day ?? null };
}
