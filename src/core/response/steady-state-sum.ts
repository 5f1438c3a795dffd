import { above, whole } from '../guard.ts';

/**
 * Component per unit of a constant daily load, after endless days, read after the day's load (convention I).
 *
 * @param tauDays time constant [days], above 0
 * @returns sum S_I [days]: component = S_I × daily load
 * @throws NumericInputError if the time constant is not above 0
 * @remarks Equation: S_I = 1 ÷ (1 − e^(−1/τ)). Limits: the continuous form τ is about 0.5 too low.
 * @see textbook geometric series
 * @example
 * steadyStateSumInclusive(45); // => 45.50185184
 */
export function steadyStateSumInclusive(tauDays: number): number {
  above('steadyStateSumInclusive', 'tauDays', tauDays, 0, Infinity, 'days');
  return 1 / (1 - Math.exp(-1 / tauDays));
}

/**
 * The same read before the day's load (convention E).
 *
 * @param tauDays time constant [days], above 0
 * @returns sum S_E [days] = S_I − 1
 * @throws NumericInputError if the time constant is not above 0
 * @remarks Equation: S_E = 1 ÷ (e^(1/τ) − 1). Limits: the continuous form τ is about 0.5 too high.
 * @see textbook geometric series
 * @example
 * steadyStateSumExclusive(45); // => 44.50185184
 */
export function steadyStateSumExclusive(tauDays: number): number {
  above('steadyStateSumExclusive', 'tauDays', tauDays, 0, Infinity, 'days');
  return 1 / (Math.exp(1 / tauDays) - 1);
}

/**
 * Component per unit of a constant daily load after some days, from 0, read after the day's load (convention I).
 *
 * @param tauDays time constant [days], above 0
 * @param dayCount days with that load [days], 0 or more
 * @returns sum [days]
 * @throws NumericInputError if the time constant is not above 0 or the days are not a whole number from 0 on
 * @remarks Equation: S_I·(1 − e^(−N/τ)). Limits: a constant load is an idealisation.
 * @see textbook geometric series
 * @example
 * partialSumInclusive(45, 28); // => 21.07871772
 */
export function partialSumInclusive(tauDays: number, dayCount: number): number {
  whole('partialSumInclusive', 'dayCount', dayCount, 0);
  return steadyStateSumInclusive(tauDays) * (1 - Math.exp(-dayCount / tauDays));
}
