import type { ImpulseParameters } from '../types.ts';
import { within } from '../guard.ts';
import { checkGains } from './check-gains.ts';
import { impulseComponentExclusive, impulseComponentInclusive } from './impulse-component.ts';

/**
 * Impulse–response model of performance, read before the day's load (convention E).
 *
 * A level, plus what training of the past has built, minus what of it still tires.
 *
 * @param loads daily loads [load units], one per day without gaps; 0 = rest, NaN = unknown
 * @param parameters p0 [performance units]; k1, k2 [performance units per load unit], 0 or more; tau1 > tau2 > 0 [days]
 * @returns performance [performance units], one value more than loads: [0] before any load, the last on the morning after the last load;
 *   NaN from the morning after an unknown day on
 * @throws NumericInputError outside these ranges
 * @remarks Equation: p(n) = p0 + k1·Σ w(s)·e^(−(n−s)/τ1) − k2·Σ w(s)·e^(−(n−s)/τ2), s = 1 … n−1.
 * Limits: constants of one athlete are hard to tell apart from few tests; general constants are poor for individuals (Vermeire 2022);
 * linear in load, so it praises complete rest.
 * @see Banister EW 1991, in Physiological Testing of the High-Performance Athlete, Human Kinetics, 403–424; Imbach F et al. 2022, Sports Med Open 8:29, Eq. (1)
 * @example
 * impulseResponse([100, 0], { p0: 500, k1: 1, k2: 2, tau1: 45, tau2: 15 }); // => [500, 410.70089024, 420.61821010]
 */
export function impulseResponse(loads: readonly number[], parameters: ImpulseParameters): number[] {
  check('impulseResponse', parameters);
  const { tau1, tau2 } = parameters;
  return combine(parameters, impulseComponentExclusive(loads, tau1), impulseComponentExclusive(loads, tau2));
}

/**
 * Impulse–response model of performance, read after the day's load (convention I).
 *
 * @param loads daily loads [load units], one per day without gaps; 0 = rest, NaN = unknown
 * @param parameters as for convention E: p0 [performance units]; k1, k2 [performance units per load unit]; tau1 > tau2 > 0 [days]
 * @returns performance [performance units], same length; NaN from an unknown day on
 * @throws NumericInputError outside these ranges
 * @remarks Equation: as for convention E with s = 1 … n. Limits: on a day with load w it lies (k1 − k2)·w off convention E.
 * @see Morton RH, Fitz-Clarke JR, Banister EW 1990, J Appl Physiol 69(3):1171–1177 (recursion: value from memory)
 * @example
 * impulseResponseInclusive([100, 0], { p0: 500, k1: 1, k2: 2, tau1: 45, tau2: 15 }); // => [400, 410.70089024]
 */
export function impulseResponseInclusive(loads: readonly number[], parameters: ImpulseParameters): number[] {
  check('impulseResponseInclusive', parameters);
  const { tau1, tau2 } = parameters;
  return combine(parameters, impulseComponentInclusive(loads, tau1), impulseComponentInclusive(loads, tau2));
}

function check(fn: string, parameters: ImpulseParameters): void {
  within(fn, 'p0', parameters.p0, -Infinity, Infinity);
  checkGains(fn, parameters);
}

function combine({ p0, k1, k2 }: ImpulseParameters, gain: readonly number[], loss: readonly number[]): number[] {
  return gain.map((value, index) => p0 + k1 * value - k2 * loss[index]!);
}
