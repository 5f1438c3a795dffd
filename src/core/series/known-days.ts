import { whole } from '../guard.ts';

/**
 * Number of known days in the window that ends on each day.
 *
 * Says how much of a windowed figure rests on the log ("26 of 28 days known").
 *
 * @param values daily values [any unit], one per day without gaps; NaN = unknown
 * @param windowDays length of the window [days], 1 or more
 * @returns known days [days], same length; days before the first of the log count as not known
 * @throws NumericInputError if the window is not a whole number of at least 1
 * @remarks Equation: n(t) = count of values that are not NaN in t−N+1 … t. Limits: a partial day has to be passed as NaN.
 * @see own convention
 * @example
 * knownDays([0, NaN, 5], 2); // => [1, 1, 1]
 */
export function knownDays(values: readonly number[], windowDays: number): number[] {
  whole('knownDays', 'windowDays', windowDays, 1);
  let count = 0;
  return values.map((value, index) => {
    if (!Number.isNaN(value)) count += 1;
    const leaving = index - windowDays;
    if (leaving >= 0 && !Number.isNaN(values[leaving]!)) count -= 1;
    return count;
  });
}
