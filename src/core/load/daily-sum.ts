import { loadSeries } from '../guard.ts';

/**
 * Load of a day: the sum of its sessions' loads.
 *
 * Two sessions on one day are one day's work; a day of rest is 0.
 *
 * @param loads loads of the sessions [load units], all of one measure; none = rest
 * @returns load [load units]; NaN if one of them is unknown
 * @throws NumericInputError on a negative or infinite load
 * @remarks Equation: day = Σ session loads. Limits: sums of different measures mean nothing.
 * @see Foster C et al. 2001, J Strength Cond Res 15(1):109–115
 * @example
 * dailySum([840, 280]); // => 1120
 */
export function dailySum(loads: readonly number[]): number {
  return loadSeries('dailySum', 'loads', loads).reduce((sum, load) => sum + load, 0);
}
