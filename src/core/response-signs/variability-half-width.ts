import { within } from '../guard.ts';

/**
 * Half-width of the band a weekly mean of ln RMSSD is compared with.
 *
 * @param sd own SD of single days [ln ms], 0 or more
 * @param validDays days the weekly mean rests on [days], 1 to 7
 * @returns half-width [ln ms]
 * @throws NumericInputError on an input out of range
 * @remarks Equation: max(0.5·SD, 1.64·SD ÷ √days). Limits: up to 7 days the second is the larger; days are taken as independent.
 * @see Plews DJ et al. 2013, Sports Med 43(9):773–781 for a band; 0.5 SD: value from memory; 1.64 standard errors: own convention
 * @example
 * variabilityHalfWidth(0.12, 4); // => 0.0984
 */
export function variabilityHalfWidth(sd: number, validDays: number): number {
  within('variabilityHalfWidth', 'sd', sd, 0, Infinity);
  within('variabilityHalfWidth', 'validDays', validDays, 1, 7);
  return Math.max(0.5 * sd, (1.64 * sd) / Math.sqrt(validDays));
}
