import { NumericInputError } from '../numeric-input-error.ts';
import { whole } from '../guard.ts';

/** Where a day stands to a planned overload. */
export type OverloadPhase =
  | { readonly phase: 'within'; readonly dayN: number; readonly ofM: number }
  | { readonly phase: 'recovering'; readonly dayN: number; readonly of: number };

const MAX_DAYS = 21;
const RECOVERY_DAYS = 14;

/**
 * Day within a planned overload or of the recovery after it.
 *
 * A hard block that was planned is not news; that it ends, and that the athlete comes back, is.
 *
 * @param day [days since 1970-01-01]
 * @param periods first and last day of each planned overload [days since 1970-01-01], at most 21 days long
 * @returns within (day n of m), recovering (day n of 14) or null; a day within one period is never the recovery of another
 * @throws NumericInputError on a period that ends before it begins or is longer than 21 days
 * @remarks Equation: within from … to; recovering to+1 … to+14. Limits: 21 and 14 days are an own convention; signs of the athlete speak all the same.
 * @see own convention
 * @example
 * plannedOverloadPhase(12, [{ from: 1, to: 10 }]); // => { phase: 'recovering', dayN: 2, of: 14 }
 */
export function plannedOverloadPhase(
  day: number,
  periods: readonly { readonly from: number; readonly to: number }[],
): OverloadPhase | null {
  whole('plannedOverloadPhase', 'day', day, -Infinity);
  for (const { from, to } of periods) {
    const length = to - from + 1;
    if (!(length >= 1 && length <= MAX_DAYS)) {
      throw new NumericInputError('plannedOverloadPhase', 'length of a period', length, `1 to ${MAX_DAYS} days`);
    }
  }
  const now = periods.find(({ from, to }) => day >= from && day <= to);
  if (now !== undefined) return { phase: 'within', dayN: day - now.from + 1, ofM: now.to - now.from + 1 };
  const since = periods.map(({ to }) => day - to).filter((days) => days >= 1 && days <= RECOVERY_DAYS);
  return since.length === 0 ? null : { phase: 'recovering', dayN: Math.min(...since), of: RECOVERY_DAYS };
}
