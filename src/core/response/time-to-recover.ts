import type { ImpulseGains } from '../types.ts';
import { within } from '../guard.ts';
import { checkGains, checkTimeConstants } from './check-gains.ts';

/**
 * Time after one load until performance is back where it was.
 *
 * @param gains k1, k2 [performance units per load unit], 0 or more; tau1 > tau2 > 0 [days]
 * @returns time t_n [days]; 0 where k2 ≤ k1, as there is no dip; Infinity where k1 is 0 and k2 is not
 * @throws NumericInputError outside these ranges
 * @remarks Equation: t_n = c·ln(k2 ÷ k1), c = τ1·τ2 ÷ (τ1 − τ2). Limits: of mean constants it need not give the mean time.
 * @see Fitz-Clarke JR, Morton RH, Banister EW 1991, J Appl Physiol 71(3):1151–1158
 * @example
 * timeToRecover({ k1: 1, k2: 2, tau1: 45, tau2: 15 }); // => 15.5958116
 */
export function timeToRecover(gains: ImpulseGains): number {
  checkGains('timeToRecover', gains);
  return gains.k2 > gains.k1 ? contrast(gains) * Math.log(gains.k2 / gains.k1) : 0;
}

/**
 * Time after one load until performance is highest.
 *
 * @param gains k1, k2 [performance units per load unit], 0 or more; tau1 > tau2 > 0 [days]
 * @returns time t_g [days]; 0 where k2·τ1 ≤ k1·τ2, as the peak is at once; Infinity where k1 is 0 and k2 is not
 * @throws NumericInputError outside these ranges
 * @remarks Equation: t_g = c·ln(k2·τ1 ÷ (k1·τ2)). Limits: as for the time to recover; t_g − t_n = c·ln(τ1 ÷ τ2) whatever the gains.
 * @see Fitz-Clarke JR, Morton RH, Banister EW 1991, J Appl Physiol 71(3):1151–1158
 * @example
 * timeToPeak({ k1: 1, k2: 2, tau1: 45, tau2: 15 }); // => 40.3145881
 */
export function timeToPeak(gains: ImpulseGains): number {
  checkGains('timeToPeak', gains);
  const { k1, k2, tau1, tau2 } = gains;
  return k2 * tau1 > k1 * tau2 ? contrast(gains) * Math.log((k2 * tau1) / (k1 * tau2)) : 0;
}

/**
 * Ratio of the gains that belongs to a published time to recover.
 *
 * @param given tau1 > tau2 > 0 [days] and timeToRecoverDays [days], 0 or more
 * @returns k2 ÷ k1 [no unit]
 * @throws NumericInputError outside these ranges
 * @remarks Equation: k2 ÷ k1 = e^(t_n ÷ c). Limits: from group means it describes no single athlete.
 * @see Hellard P et al. 2006, J Sports Sci 24(5):509–520 (group means 38, 19 and 19 days)
 * @example
 * gainRatioFromRecovery({ tau1: 38, tau2: 19, timeToRecoverDays: 19 }); // => 1.6487212707
 */
export function gainRatioFromRecovery(given: { tau1: number; tau2: number; timeToRecoverDays: number }): number {
  checkTimeConstants('gainRatioFromRecovery', given);
  within('gainRatioFromRecovery', 'timeToRecoverDays', given.timeToRecoverDays, 0, Infinity, 'days');
  return Math.exp(given.timeToRecoverDays / contrast(given));
}

function contrast({ tau1, tau2 }: { tau1: number; tau2: number }): number {
  return (tau1 * tau2) / (tau1 - tau2);
}
