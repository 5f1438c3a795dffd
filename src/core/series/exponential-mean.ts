import { loadSeries, whole, within } from '../guard.ts';

/**
 * Weight of the newest day in an exponentially weighted mean of nominal length N.
 *
 * @param windowDays nominal length N [days], 1 or more
 * @returns weight λ [fraction]
 * @throws NumericInputError if the length is not a whole number of at least 1
 * @remarks Equation: λ = 2 ÷ (N + 1); value from memory for this use. Limits: N names no hard window; half of the weight lies in the last ln 2 ÷ −ln(1−λ) days.
 * @see Williams S et al. 2017, Better way to determine the acute:chronic workload ratio?, Br J Sports Med 51(3):209–210, doi 10.1136/bjsports-2016-096589
 * @example
 * smoothingFactor(7); // => 0.25
 */
export function smoothingFactor(windowDays: number): number {
  return 2 / (whole('smoothingFactor', 'windowDays', windowDays, 1) + 1);
}

/**
 * Exponentially weighted mean of daily loads.
 *
 * A mean that forgets older days little by little instead of dropping them at the edge of a window.
 *
 * @param values daily loads [load units], one per day without gaps; 0 = rest, NaN = unknown
 * @param windowDays nominal length N [days], 1 or more
 * @param start 'first': the first known load is the first mean; or the mean before the first day [load units]
 * @returns mean [load units], same length; NaN before the first known day (start 'first') and, because the recursion has
 *   lost its state, from an unknown day inside the log on: fill unknown days first
 * @throws NumericInputError on a negative or infinite load, a length out of range or a negative start
 * @remarks Equation: E(t) = λ·w(t) + (1−λ)·E(t−1), λ = 2 ÷ (N+1).
 * Limits: started at 0 it is far too low for weeks; the start still holds 13.5 % of a 28-day mean after 28 days.
 * @see Williams S et al. 2017, Br J Sports Med 51(3):209–210, doi 10.1136/bjsports-2016-096589
 * @example
 * exponentialMean([300, 0, 450], 7); // => [300, 225, 281.25]
 */
export function exponentialMean(
  values: readonly number[],
  windowDays: number,
  start: number | 'first' = 'first',
): number[] {
  loadSeries('exponentialMean', 'values', values);
  if (start !== 'first') within('exponentialMean', 'start', start, 0, Infinity);
  const factor = smoothingFactor(windowDays);
  let state: number | undefined = start === 'first' ? undefined : start;
  return values.map((value) => {
    if (state !== undefined) state = factor * value + (1 - factor) * state;
    else if (!Number.isNaN(value)) state = value;
    return state ?? NaN;
  });
}
