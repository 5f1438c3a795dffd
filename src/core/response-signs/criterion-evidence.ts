import { whole } from '../guard.ts';
import { deviationInTypicalErrors, expectedResult } from '../monitoring/expected-result.ts';
import type { CriterionResult, StandardBout } from './types.ts';

/** A result beside the expected one. */
export interface Deviation {
  readonly id: string;
  readonly key: string;
  readonly day: number;
  readonly value: number;
  readonly expected: number;
  /** Negative: worse than expected. */
  readonly typicalErrors: number;
}

/** A test worse than expected, and what confirms it. */
export interface CriterionEvidence {
  readonly test: Deviation;
  readonly confirmedBy: Deviation & { readonly kind: 'repeat' | 'competition' | 'standard-bout' };
}

/** Rounding in a division must not make exactly two typical errors more than two. */
const ROUNDING = 1e-9;
const WORSE_BEYOND = 2 + ROUNDING;
const RECOVERED_WITHIN = 1 + ROUNDING;
const CONFIRMED_WITHIN_DAYS = 10;
const COUNTS_FOR_DAYS = 28;

/**
 * Performance that has fallen, as far as it is known on a day.
 *
 * One bad test is a bad day; two independent ones within ten days are evidence.
 *
 * @param log results: maximal tests and competitions [unit of each]; bouts: standard bouts, of which the rating counts [CR-10]; in any order
 * @param day day of judging; later results are not seen [days since 1970-01-01]
 * @param firstSign first day of the response signs, before which expected values are taken [days since 1970-01-01]; Infinity = none
 * @param used names of measured values that count as signs already [names]
 * @returns the latest confirmed test and what confirms it [unit of each; typical errors], or null
 * @throws NumericInputError on a day that is no whole number or a typical error not above 0
 * @remarks Equation: test worse than the mean of the own last 3 to 6 results by more than 2 typical errors, confirmed on the same or one of the
 * next 10 days by a repeat or a competition that is worse likewise, or a bout whose rating is above the expected by more than 2 of its own.
 * It counts for 28 days from the confirmation, until a later result of that test is within 1 typical error, or better.
 * Limits: 2 typical errors are exceeded by chance in about 1 of 30 ordinary tests; heart rate alone confirms nothing.
 * @see Hopkins WG 2000, Sports Med 30(1):1–15 for typical errors; 2 of them: value from memory; the rest: own convention
 * @example
 * criterionEvidence({ results: [], bouts: [] }, 50, Infinity, []); // => null
 */
export function criterionEvidence(
  log: { readonly results: readonly CriterionResult[]; readonly bouts: readonly StandardBout[] },
  day: number,
  firstSign: number,
  used: readonly string[],
): CriterionEvidence | null {
  whole('criterionEvidence', 'day', day, -Infinity);
  const known = log.results.filter((one) => one.day <= day && one.judged).toSorted((a, b) => b.day - a.day);
  const recent = known.filter((one) => one.day >= day - COUNTS_FOR_DAYS - CONFIRMED_WITHIN_DAYS);
  const deviations = new Map(recent.map((one) => [one, ofResult(log.results, one, firstSign)]));
  const worse = recent.filter((one) => deviations.get(one)!.typicalErrors < -WORSE_BEYOND);
  const bouts = log.bouts
    .filter((one) => one.judged && one.day <= day && one.day >= day - COUNTS_FOR_DAYS && !used.includes(one.id))
    .map((one) => ofBout(log.bouts, one, firstSign))
    .filter(({ typicalErrors }) => typicalErrors < -WORSE_BEYOND);
  for (const test of worse) {
    if (test.kind !== 'test' || used.includes(test.id)) continue;
    const recovered = recent.some(
      (one) => one.key === test.key && one.day > test.day && deviations.get(one)!.typicalErrors >= -RECOVERED_WITHIN,
    );
    if (recovered) continue;
    const confirming = [
      ...worse
        .filter((one) => one !== test && (one.key === test.key || one.kind === 'competition') && !used.includes(one.id))
        .map((one) => ({
          kind: one.kind === 'competition' ? ('competition' as const) : ('repeat' as const),
          ...deviations.get(one)!,
        })),
      ...bouts.map((one) => ({ kind: 'standard-bout' as const, ...one })),
    ].filter(
      (one) => one.day >= test.day && one.day <= test.day + CONFIRMED_WITHIN_DAYS && one.day >= day - COUNTS_FOR_DAYS,
    );
    const confirmedBy = confirming[0];
    if (confirmedBy !== undefined) return { test: deviations.get(test)!, confirmedBy };
  }
  return null;
}

function ofResult(all: readonly CriterionResult[], result: CriterionResult, firstSign: number): Deviation {
  const { id, key, day, value, typicalError, higherIsBetter } = result;
  const own = all.filter((one) => one.inBaseline && one.key === key);
  const expected = expectedResult(own, day, firstSign);
  const typicalErrors = deviationInTypicalErrors(value, expected, typicalError, higherIsBetter ? 1 : -1);
  return { id, key, day, value, expected, typicalErrors };
}

/** A rating at the same work is worse when it is higher. */
function ofBout(all: readonly StandardBout[], bout: StandardBout, firstSign: number): Deviation {
  const { id, key, day, rating, ratingTypicalError } = bout;
  const own = all.filter((one) => one.inBaseline && one.key === key);
  const earlier = own.map((one) => ({ day: one.day, value: one.rating }));
  const expected = expectedResult(earlier, day, firstSign);
  const typicalErrors = deviationInTypicalErrors(rating, expected, ratingTypicalError, -1);
  return { id, key, day, value: rating, expected, typicalErrors };
}
