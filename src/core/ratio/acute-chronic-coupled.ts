import type { AcuteChronic } from '../types.ts';
import { rollingMean } from '../series/rolling-mean.ts';
import type { WindowOptions } from './windows.ts';
import { quotients, windowOptions } from './windows.ts';

/**
 * Acute:chronic ratio, rolling and coupled: the chronic window holds the acute one.
 *
 * Says how this week compares with the last four; it does not foretell an injury.
 *
 * @param days daily loads [load units], one per day without gaps; 0 = rest, NaN = unknown
 * @param options acuteDays 7, chronicDays 28, minAcuteKnown 6, minChronicKnown 24 [days]; the floors are an own convention
 * @returns acute and chronic mean per known day [load units] and ratio [no unit, at most chronicDays ÷ acuteDays if all days are known];
 *   NaN where the log is shorter than the window, too few days are known, or the chronic load is 0
 * @throws NumericInputError on a negative or infinite load, or windows and floors out of order
 * @remarks Equation: mean of t−6 … t ÷ mean of t−27 … t.
 * Limits: the two share a week, which alone correlates them by 0.5; return from rest inflates it; bands set for this form fit no other;
 * a trial of planning by the ratio found no benefit (Dalen-Lorentsen 2021), and its critics advise dismissing it (Impellizzeri 2021).
 * @see Hulin BT et al. 2014, Br J Sports Med 48(8):708–712, doi 10.1136/bjsports-2013-092524; Lolli L et al. 2019, Br J Sports Med 53(15):921–922
 * @example
 * acuteChronicCoupled([100, 100, 100, 200], { acuteDays: 1, chronicDays: 4, minAcuteKnown: 1, minChronicKnown: 4 }).ratio; // => [NaN, NaN, NaN, 1.6]
 */
export function acuteChronicCoupled(days: readonly number[], options: WindowOptions = {}): AcuteChronic {
  const { acuteDays, chronicDays, minAcuteKnown, minChronicKnown } = windowOptions('acuteChronicCoupled', options);
  const acute = rollingMean(days, acuteDays, minAcuteKnown);
  const chronic = rollingMean(days, chronicDays, minChronicKnown);
  return { acute, chronic, ratio: quotients(acute, chronic) };
}
