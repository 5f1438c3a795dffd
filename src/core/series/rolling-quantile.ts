import { whole, within } from '../guard.ts';
import { quantileSorted } from './quantile.ts';

/**
 * Quantile of the known values in the window that ends on each day.
 *
 * An athlete's own usual (0.5) or own upper end (0.95) as it stood on every day, from the days up to then.
 *
 * @param values values [any unit], one per day without gaps; NaN = unknown, left out
 * @param windowDays length of the window [days], 1 or more; at the start of the log the window is what exists
 * @param q share [fraction], 0 to 1
 * @returns quantile [unit of the values], same length; NaN where the window holds no known value
 * @throws NumericInputError if the window or the share is out of range
 * @remarks Equation: the type 7 quantile of the known values in t−N+1 … t. Limits: as wide as the log is long at its start.
 * @see Hyndman RJ, Fan Y 1996, Am Stat 50(4):361–365, definition 7
 * @example
 * rollingQuantile([5, 1, NaN, 3], 3, 0.5); // => [5, 3, 3, 2]
 */
export function rollingQuantile(values: readonly number[], windowDays: number, q: number): number[] {
  whole('rollingQuantile', 'windowDays', windowDays, 1);
  within('rollingQuantile', 'q', q, 0, 1);
  // Kept sorted from day to day: one value enters, one leaves.
  const sorted: number[] = [];
  return values.map((value, index) => {
    const leaving = values[index - windowDays];
    if (leaving !== undefined && !Number.isNaN(leaving)) sorted.splice(position(sorted, leaving), 1);
    if (!Number.isNaN(value)) sorted.splice(position(sorted, value), 0, value);
    return quantileSorted(sorted, q);
  });
}

/** Index of the first value that is not below the given one. */
function position(sorted: readonly number[], value: number): number {
  let low = 0;
  let high = sorted.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (sorted[middle]! < value) low = middle + 1;
    else high = middle;
  }
  return low;
}
