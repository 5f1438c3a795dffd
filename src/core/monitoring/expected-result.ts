import { above, whole } from '../guard.ts';
import { mean } from '../series/mean.ts';

/** A result of one athlete in one test. */
export interface DatedResult {
  /** Day number. */
  readonly day: number;
  /** Result [unit of the test]. */
  readonly value: number;
}

const FEWEST = 3;
const MOST = 6;
const LEAST_AGE_DAYS = 15;

/**
 * The result an athlete is expected to reach.
 *
 * The mean of the own last three to six results that are old enough not to belong to the same bad patch.
 *
 * @param results own results in any order [unit of the test]; NaN = none, left out
 * @param day day number of the result to be judged
 * @param before only results before this day count, the first day of a sign; Infinity = no sign
 * @returns expected result [unit of the test]; NaN with fewer than three results that count
 * @throws NumericInputError on a day that is no whole number
 * @remarks Equation: mean of the newest 3 to 6 results at least 15 days older than `day` and before `before`.
 * Limits: a trend is not carried on; an athlete who improves is expected a little too low.
 * @see own convention for 3, 6 and 15; arithmetic mean otherwise
 * @example
 * expectedResult([{ day: 1, value: 300 }, { day: 15, value: 304 }, { day: 29, value: 302 }], 50); // => 302
 */
export function expectedResult(results: readonly DatedResult[], day: number, before = Infinity): number {
  whole('expectedResult', 'day', day, -Infinity);
  const counting = results
    .filter((one) => !Number.isNaN(one.value) && one.day <= day - LEAST_AGE_DAYS && one.day < before)
    .toSorted((a, b) => a.day - b.day)
    .slice(-MOST);
  return counting.length < FEWEST ? NaN : mean(counting.map(({ value }) => value));
}

/**
 * How far a result lies from the expected one, in typical errors of the test.
 *
 * @param value result [unit of the test]; NaN = none
 * @param expected expected result [unit of the test]; NaN = not known
 * @param typicalErrorOfOne typical error of one result [unit of the test], above 0
 * @param higherIsBetter 1 where a higher result is better, −1 where a lower one is
 * @returns deviation [typical errors], negative = worse than expected; NaN if one of the two is unknown
 * @throws NumericInputError if the typical error is not above 0 or the direction is neither 1 nor −1
 * @remarks Equation: (value − expected) ÷ TE × direction. Limits: the expected value has an error of its own, TE ÷ √n.
 * @see Hopkins WG 2000, Sports Med 30(1):1–15
 * @example
 * deviationInTypicalErrors(294, 302, 4, 1); // => -2
 */
export function deviationInTypicalErrors(
  value: number,
  expected: number,
  typicalErrorOfOne: number,
  higherIsBetter: number,
): number {
  above('deviationInTypicalErrors', 'typicalErrorOfOne', typicalErrorOfOne, 0);
  if (higherIsBetter !== -1) whole('deviationInTypicalErrors', 'higherIsBetter', higherIsBetter, 1, 1);
  return ((value - expected) / typicalErrorOfOne) * higherIsBetter;
}
