import type { AcuteChronic } from '../types.ts';
import { exponentialMean } from '../series/exponential-mean.ts';
import { quotients, windowOptions } from './windows.ts';

/**
 * Acute:chronic ratio of two exponentially weighted means.
 *
 * Gives the newest days more weight than the oldest of the window.
 *
 * @param days daily loads [load units], one per day without gaps; 0 = rest, NaN = unknown
 * @param options acuteDays 7, chronicDays 28: nominal lengths [days]
 * @returns acute and chronic mean [load units] and ratio [no unit]; NaN before the first known day, where the chronic load is 0 and,
 *   as the recursions lose their state, from an unknown day inside the log on (fill unknown days first)
 * @throws NumericInputError on a negative or infinite load, or lengths out of order
 * @remarks Equation: E(t) = λ·w(t) + (1−λ)·E(t−1), λ = 2 ÷ (N+1), N = 7 and 28, both started with the first known load.
 * Limits: the first weeks still hold the start; the order of the days inside the week matters; bands of the rolling forms do not fit it.
 * @see Williams S et al. 2017, Br J Sports Med 51(3):209–210, doi 10.1136/bjsports-2016-096589 (λ: value from memory); Murray NB et al. 2017, Br J Sports Med 51(9):749–754
 * @example
 * acuteChronicExponential([300, 0, 450, 200, 600, 0, 350]).ratio[6]; // => 0.972762
 */
export function acuteChronicExponential(
  days: readonly number[],
  options: { acuteDays?: number; chronicDays?: number } = {},
): AcuteChronic {
  const { acuteDays, chronicDays } = windowOptions('acuteChronicExponential', options);
  const acute = exponentialMean(days, acuteDays);
  const chronic = exponentialMean(days, chronicDays);
  return { acute, chronic, ratio: quotients(acute, chronic) };
}
