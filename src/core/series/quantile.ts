import { within } from '../guard.ts';

/**
 * Sample quantile by linear interpolation between order statistics (type 7), unknown values left out.
 *
 * The value below which a share q of an athlete's own known values lies.
 *
 * @param values values [any unit] in any order; NaN = unknown, left out
 * @param q share [fraction], 0 to 1
 * @returns quantile [unit of the values]; NaN if no value is known
 * @throws NumericInputError if q lies outside 0 to 1
 * @remarks Equation: h = (n−1)·q, Q = x⌊h⌋ + (h − ⌊h⌋)·(x⌊h⌋+1 − x⌊h⌋) on the sorted values, counted from 0.
 * Limits: with few values the outer quantiles rest on one or two of them.
 * @see Hyndman RJ, Fan Y 1996, Sample quantiles in statistical packages, Am Stat 50(4):361–365, definition 7
 * @example
 * quantile([4, 1, NaN, 2, 3], 0.5); // => 2.5
 */
export function quantile(values: readonly number[], q: number): number {
  within('quantile', 'q', q, 0, 1);
  const sorted = values.filter((value) => !Number.isNaN(value)).sort((a, b) => a - b);
  return quantileSorted(sorted, q);
}

/**
 * The same for values that are sorted already and hold no NaN.
 *
 * @param sorted values [any unit], rising, none NaN
 * @param q share [fraction], 0 to 1
 * @returns quantile [unit of the values]; NaN if there is no value
 * @see Hyndman RJ, Fan Y 1996, Am Stat 50(4):361–365, definition 7
 * @example
 * quantileSorted([1, 2, 3, 4], 0.25); // => 1.75
 */
export function quantileSorted(sorted: readonly number[], q: number): number {
  if (sorted.length === 0) return NaN;
  const position = (sorted.length - 1) * q;
  const below = Math.floor(position);
  const lower = sorted[below]!;
  const upper = sorted[Math.min(below + 1, sorted.length - 1)]!;
  return lower + (position - below) * (upper - lower);
}
