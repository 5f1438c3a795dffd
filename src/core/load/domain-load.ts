import type { DomainMinutes } from '../types.ts';
import { within } from '../guard.ts';

/** Weights of the published three-phase scheme; severe and extreme share the third. */
export const THREE_PHASE_WEIGHTS: DomainMinutes = { moderate: 1, heavy: 2, severe: 3, extreme: 3 };

/**
 * Domain load: minutes in each intensity domain times the policy's weight.
 *
 * Weighs a session by what it asked of the athlete, seen from the athlete's own thresholds.
 *
 * @param minutes minutes in each domain [min], each 0 or more
 * @param weights weight of a minute [no unit], each 0 or more; default 1, 2, 3, 3
 * @returns load [weighted min]
 * @throws NumericInputError on a negative or unknown value
 * @remarks Equation: load = Σ minutes × weight.
 * Limits: no peer-reviewed weights were found for four domains; the default is the published three-phase scheme with severe and extreme
 * together, any other weights are an own convention and are to be printed as such.
 * @see Lucía A et al. 2003, Med Sci Sports Exerc 35(5):872–878, doi 10.1249/01.MSS.0000064999.82036.B4 (weights 1, 2, 3)
 * @example
 * domainLoad({ moderate: 40, heavy: 10, severe: 5, extreme: 0 }); // => 75
 */
export function domainLoad(minutes: DomainMinutes, weights: DomainMinutes = THREE_PHASE_WEIGHTS): number {
  let load = 0;
  for (const domain of ['moderate', 'heavy', 'severe', 'extreme'] as const) {
    within('domainLoad', `minutes.${domain}`, minutes[domain], 0, Infinity, 'min');
    within('domainLoad', `weights.${domain}`, weights[domain], 0, Infinity);
    load += minutes[domain] * weights[domain];
  }
  return load;
}
