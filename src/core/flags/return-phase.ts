import { above, whole } from '../guard.ts';

/** Where an athlete stands after time out: day of return and chronic load in % of before (NaN: not known). */
export interface ReturnDay {
  readonly dayN: number;
  readonly share: number;
}

/**
 * Day of return after a spell of unavailability.
 *
 * While load is being built up again, load figures mislead; what counts is how far it is back.
 *
 * @param days day [days since 1970-01-01], unavailable, chronic load [load units, NaN unknown], in order without gaps
 * @param options minSpellDays 3, untilShare 80 [%], fallbackDays 28 [days]
 * @returns per day null or dayN [days, from 1] and share [%] of the chronic load on the day before the spell; same length
 * @throws NumericInputError if an option is out of range
 * @remarks Equation: from the first available day after at least 3 unavailable ones until chronic ≥ 0.8·before (that day is null again);
 * without a known chronic load above 0 before, 28 days. A further spell inside a return keeps the first one's comparison.
 * Limits: load back is not health back; the physician decides.
 * @see own convention
 * @example
 * returnPhase([100, 90, 80, 70, 75, 85].map((chronic, day) => ({ day, unavailable: day > 0 && day < 4, chronic }))); // => [null, null, null, null, { dayN: 1, share: 75 }, null]
 */
export function returnPhase(
  days: readonly { readonly day: number; readonly unavailable: boolean; readonly chronic: number }[],
  options: { minSpellDays?: number; untilShare?: number; fallbackDays?: number } = {},
): (ReturnDay | null)[] {
  const { minSpellDays = 3, untilShare = 80, fallbackDays = 28 } = options;
  whole('returnPhase', 'minSpellDays', minSpellDays, 1);
  above('returnPhase', 'untilShare', untilShare, 0, 100, '%');
  whole('returnPhase', 'fallbackDays', fallbackDays, 1);
  let spell = 0;
  let before = NaN;
  let back: { from: number; before: number } | null = null;
  return days.map(({ day, unavailable, chronic }, index) => {
    if (unavailable) {
      if (spell === 0) before = back?.before ?? days[index - 1]?.chronic ?? NaN;
      spell += 1;
      return null;
    }
    if (spell >= minSpellDays) back = { from: day, before };
    spell = 0;
    if (back === null) return null;
    const dayN = day - back.from + 1;
    const comparable = back.before > 0;
    const share = comparable ? (100 * chronic) / back.before : NaN;
    if (comparable ? share >= untilShare : dayN > fallbackDays) {
      back = null;
      return null;
    }
    return { dayN, share };
  });
}
