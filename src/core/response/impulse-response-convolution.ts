import type { ImpulseParameters } from '../types.ts';
import { loadSeries, within } from '../guard.ts';
import { checkGains } from './check-gains.ts';

/**
 * Impulse–response model as the direct sum over all earlier days (convention E).
 *
 * Slow and plain: a check on the recursion, which must give the same.
 *
 * @param loads daily loads [load units], one per day without gaps; 0 = rest, NaN = unknown
 * @param parameters p0 [performance units]; k1, k2 [performance units per load unit], 0 or more; tau1 > tau2 > 0 [days]
 * @returns performance [performance units], one value more than loads; NaN from the morning after an unknown day on
 * @throws NumericInputError outside these ranges
 * @remarks Equation: p(n) = p0 + Σ w(s)·(k1·e^(−(n−s)/τ1) − k2·e^(−(n−s)/τ2)), s = 1 … n−1. Limits: work grows with the square of the length.
 * @see Imbach F et al. 2022, Sports Med Open 8:29, Eq. (1)
 * @example
 * impulseResponseConvolution([100, 0], { p0: 500, k1: 1, k2: 2, tau1: 45, tau2: 15 }); // => [500, 410.70089024, 420.61821010]
 */
export function impulseResponseConvolution(loads: readonly number[], parameters: ImpulseParameters): number[] {
  const fn = 'impulseResponseConvolution';
  loadSeries(fn, 'loads', loads);
  within(fn, 'p0', parameters.p0, -Infinity, Infinity);
  checkGains(fn, parameters);
  const { p0, k1, k2, tau1, tau2 } = parameters;
  return Array.from({ length: loads.length + 1 }, (_, n) => {
    let sum = 0;
    for (let s = 0; s < n; s += 1) {
      sum += loads[s]! * (k1 * Math.exp((s - n) / tau1) - k2 * Math.exp((s - n) / tau2));
    }
    return p0 + sum;
  });
}
