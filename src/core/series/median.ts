import { quantile } from './quantile.ts';

/**
 * Median of the known values.
 *
 * An athlete's "usual", which one hard day does not move.
 *
 * @param values values [any unit] in any order; NaN = unknown, left out
 * @returns median [unit of the values]; NaN if no value is known
 * @remarks Equation: the quantile at 0.5. Limits: says nothing of the spread.
 * @see Hyndman RJ, Fan Y 1996, Am Stat 50(4):361–365, definition 7 at 0.5
 * @example
 * median([5, NaN, 1, 3]); // => 3
 */
export function median(values: readonly number[]): number {
  return quantile(values, 0.5);
}
