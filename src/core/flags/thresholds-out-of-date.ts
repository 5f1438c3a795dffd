import type { Stretch } from '../types.ts';
import { whole } from '../guard.ts';

/**
 * Stretches in which the thresholds in use were old.
 *
 * Minutes counted with last season's thresholds say little; the flag asks for a test.
 *
 * @param days day [days since 1970-01-01] and ageDays [days]: age of the newest threshold of that modality, trained in the last 28 days, whose
 *   newest threshold is oldest; NaN where no such modality was trained
 * @param options maxAgeDays 56 [days]
 * @returns stretches: since, until (first day that is clear, null while open) and evidence of the last open day
 * @throws NumericInputError if maxAgeDays is not a whole number of at least 1
 * @remarks Equation: raised when age > 56 days; cleared at once when age ≤ 56 days or no modality is concerned.
 * Limits: says nothing of whether the thresholds have moved. 8 weeks: common practice, no source.
 * @see common practice, no source
 * @example
 * thresholdsOutOfDate([{ day: 9, ageDays: 56 }, { day: 10, ageDays: 57 }]); // => [{ since: 10, until: null, evidence: { ageDays: 57, limit: 56, day: 10 } }]
 */
export function thresholdsOutOfDate(
  days: readonly { readonly day: number; readonly ageDays: number }[],
  options: { maxAgeDays?: number } = {},
): Stretch<{ ageDays: number; limit: number; day: number }>[] {
  const { maxAgeDays = 56 } = options;
  whole('thresholdsOutOfDate', 'maxAgeDays', maxAgeDays, 1);
  const found: Stretch<{ ageDays: number; limit: number; day: number }>[] = [];
  for (const { day, ageDays } of days) {
    const last = found.at(-1);
    const open = last !== undefined && last.until === null ? last : null;
    if (ageDays > maxAgeDays) {
      const stretch = { since: open?.since ?? day, until: null, evidence: { ageDays, limit: maxAgeDays, day } };
      if (open === null) found.push(stretch);
      else found[found.length - 1] = stretch;
    } else if (open !== null) {
      found[found.length - 1] = { ...open, until: day };
    }
  }
  return found;
}
