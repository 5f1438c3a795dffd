import type { AcuteChronic } from '../types.ts';
import { rollingMean } from '../series/rolling-mean.ts';
import type { WindowOptions } from './windows.ts';
import { quotients, windowOptions } from './windows.ts';

/**
 * Acute:chronic ratio, rolling and uncoupled: the chronic window ends before the acute one begins.
 *
 * The same question without a shared week.
 *
 * @param days daily loads [load units], one per day without gaps; 0 = rest, NaN = unknown
 * @param options as for the coupled form [days]; the chronic floor is scaled to the shorter window (24 of 28 becomes 18 of 21, own convention)
 * @returns acute and chronic mean per known day [load units] and ratio [no unit, no upper end]; NaN where the log is shorter than
 *   chronicDays, too few days are known, or the chronic load is 0
 * @throws NumericInputError on a negative or infinite load, or windows and floors out of order
 * @remarks Equation: mean of t−6 … t ÷ mean of t−27 … t−7. Limits: as for the coupled form; the bands 0.8, 1.3 and 1.5 of the coupled
 * form read 0.75, 1.444 and 1.8 here.
 * @see Lolli L et al. 2019, Br J Sports Med 53(15):921–922; Windt J, Gabbett TJ 2019, Br J Sports Med 53(16):988–990, doi 10.1136/bjsports-2017-098925
 * @example
 * acuteChronicUncoupled([100, 100, 100, 200], { acuteDays: 1, chronicDays: 4, minAcuteKnown: 1, minChronicKnown: 4 }).ratio; // => [NaN, NaN, NaN, 2]
 */
export function acuteChronicUncoupled(days: readonly number[], options: WindowOptions = {}): AcuteChronic {
  const { acuteDays, chronicDays, minAcuteKnown, minChronicKnown } = windowOptions('acuteChronicUncoupled', options);
  const earlierDays = chronicDays - acuteDays;
  const floor = Math.max(1, Math.round((minChronicKnown * earlierDays) / chronicDays));
  const acute = rollingMean(days, acuteDays, minAcuteKnown);
  const earlier = rollingMean(days, earlierDays, floor);
  const chronic = days.map((_, index) => (index < acuteDays ? NaN : earlier[index - acuteDays]!));
  return { acute, chronic, ratio: quotients(acute, chronic) };
}
