import { basisMixShift } from '../../core/flags/basis-mix-shift.ts';
import type { Basis } from '../../core/types.ts';
import type { DayRecord } from '../days/days.types.ts';
import type { BasisMix } from './series.types.ts';

export interface WindowMixes {
  acute: BasisMix;
  chronic: BasisMix;
  /** Largest difference of a basis's share between the windows, in points; 0 where a window has no minutes. */
  shift: number;
}

type Minutes = Partial<Record<Basis, number>>;

/** By day: how the minutes of the acute and the chronic window were counted. */
export function basisMixes(
  records: readonly DayRecord[],
  acuteDays: number,
  chronic: { days: number; skip: number },
): WindowMixes[] {
  return records.map((_, index) => {
    const acuteMinutes = minutesIn(records, index - acuteDays + 1, index);
    const chronicMinutes = minutesIn(records, index - chronic.skip - chronic.days + 1, index - chronic.skip);
    const shift = basisMixShift(acuteMinutes, chronicMinutes);
    return { acute: shares(acuteMinutes), chronic: shares(chronicMinutes), shift: Number.isNaN(shift) ? 0 : shift };
  });
}

/** Minutes by basis over a stretch of days, both ends included. */
export function minutesIn(records: readonly DayRecord[], from: number, to: number): Minutes {
  const sum: Minutes = {};
  for (const record of records.slice(Math.max(0, from), Math.max(0, to + 1))) {
    for (const [basis, minutes] of Object.entries(record.basisMinutes) as [Basis, number][]) {
      sum[basis] = (sum[basis] ?? 0) + minutes;
    }
  }
  return sum;
}

/** Shares in percent, largest first; empty without minutes. */
export function shares(minutes: Minutes): BasisMix {
  const entries = (Object.entries(minutes) as [Basis, number][]).filter(([, value]) => value > 0);
  const total = entries.reduce((sum, [, value]) => sum + value, 0);
  return Object.fromEntries(
    entries
      .sort((a, b) => b[1] - a[1] || a[0].localeCompare(b[0]))
      .map(([basis, value]) => [basis, (100 * value) / total]),
  );
}
