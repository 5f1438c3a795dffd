import { within } from '../guard.ts';

/**
 * Coupled ratio that belongs to an uncoupled one (7:28 days, all known).
 *
 * Shows that one and the same week has two names; no band moves from one form to the other.
 *
 * @param uncoupled uncoupled ratio [no unit], 0 or more
 * @returns coupled ratio [no unit], below 4
 * @throws NumericInputError on a negative ratio
 * @remarks Equation: C = 4U ÷ (3 + U). Limits: exact for complete logs and 7:28 days only.
 * @see derived from the definitions in Lolli L et al. 2019, Br J Sports Med 53(15):921–922
 * @example
 * coupledFromUncoupled(2); // => 1.6
 */
export function coupledFromUncoupled(uncoupled: number): number {
  within('coupledFromUncoupled', 'uncoupled', uncoupled, 0, Infinity);
  return (4 * uncoupled) / (3 + uncoupled);
}

/**
 * Uncoupled ratio that belongs to a coupled one (7:28 days, all known).
 *
 * @param coupled coupled ratio [no unit], 0 to below 4
 * @returns uncoupled ratio [no unit]; NaN at 4, where the three weeks before were empty
 * @throws NumericInputError below 0 or above 4
 * @remarks Equation: U = 3C ÷ (4 − C). Limits: exact for complete logs and 7:28 days only.
 * @see derived from the definitions in Lolli L et al. 2019, Br J Sports Med 53(15):921–922
 * @example
 * uncoupledFromCoupled(1.6); // => 2
 */
export function uncoupledFromCoupled(coupled: number): number {
  within('uncoupledFromCoupled', 'coupled', coupled, 0, 4);
  return coupled === 4 ? NaN : (3 * coupled) / (4 - coupled);
}
