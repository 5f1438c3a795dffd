import type { ImpulseGains } from '../types.ts';
import { within } from '../guard.ts';
import { checkGains } from './check-gains.ts';

/**
 * Influence on an event of a unit load placed some days before it.
 *
 * Shows which days before an event still cost, which already pay, and when a load pays most.
 *
 * @param daysBefore days between load and event [days], 0 or more
 * @param gains k1, k2 [performance units per load unit], 0 or more; tau1 > tau2 > 0 [days]
 * @returns influence [performance units per load unit]; negative where the load still costs
 * @throws NumericInputError outside these ranges
 * @remarks Equation: h(u) = k1·e^(−u/τ1) − k2·e^(−u/τ2). Limits: constants need a fit that can be trusted; linear in load.
 * @see Fitz-Clarke JR, Morton RH, Banister EW 1991, Optimizing athletic performance by influence curves, J Appl Physiol 71(3):1151–1158
 * @example
 * impulseInfluence(20, { k1: 1, k2: 2, tau1: 45, tau2: 15 }); // => 0.11398611
 */
export function impulseInfluence(daysBefore: number, gains: ImpulseGains): number {
  within('impulseInfluence', 'daysBefore', daysBefore, 0, Infinity, 'days');
  checkGains('impulseInfluence', gains);
  const { k1, k2, tau1, tau2 } = gains;
  return k1 * Math.exp(-daysBefore / tau1) - k2 * Math.exp(-daysBefore / tau2);
}
