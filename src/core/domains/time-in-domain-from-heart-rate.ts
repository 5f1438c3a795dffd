import type { Bounds, DomainMinutes } from '../types.ts';
import { within } from '../guard.ts';
import { checkHeartRate } from '../load/heart-rate-fraction.ts';
import { checkBounds, domainOf } from './domain-of.ts';

/**
 * Minutes in the three domains heart rate can tell apart, from the bouts of a session.
 *
 * For sessions without power or a speed that may be used.
 *
 * @param bouts durationMin [min], 0 or more, and mean heartRateBpm [beats per minute], 25 to 240
 * @param bounds heart rate at LT1 and at the heavy/severe bound [beats per minute]; an extreme bound is not used
 * @param options minimumBoutMin: shortest bout that is assigned [min], default 3
 * @returns minutes [min] by domain (extreme always 0) and unassignedMin [min]: bouts that were too short
 * @throws NumericInputError on values out of range or bounds out of order
 * @remarks Equation: as for power, by the bout's mean heart rate.
 * Limits: heart rate lags and drifts; bouts under 3 min are left out: common practice, no source. Minutes from heart rate and from
 * power are different measures.
 * @see Lucía A et al. 2003, Med Sci Sports Exerc 35(5):872–878 (three phases by heart rate); shortest bout: common practice, no source
 * @example
 * timeInDomainFromHeartRate([{ durationMin: 30, heartRateBpm: 140 }, { durationMin: 2, heartRateBpm: 180 }], { lt1: 150, heavySevere: 170, extreme: null }); // => { minutes: { moderate: 30, heavy: 0, severe: 0, extreme: 0 }, unassignedMin: 2 }
 */
export function timeInDomainFromHeartRate(
  bouts: readonly { durationMin: number; heartRateBpm: number }[],
  bounds: Bounds,
  options: { minimumBoutMin?: number } = {},
): { minutes: DomainMinutes; unassignedMin: number } {
  const { minimumBoutMin = 3 } = options;
  within('timeInDomainFromHeartRate', 'minimumBoutMin', minimumBoutMin, 0, 60, 'min');
  const three = { ...bounds, extreme: null };
  checkBounds('timeInDomainFromHeartRate', three);
  const minutes = { moderate: 0, heavy: 0, severe: 0, extreme: 0 };
  let unassignedMin = 0;
  bouts.forEach(({ durationMin, heartRateBpm }, index) => {
    within('timeInDomainFromHeartRate', `bouts[${index}].durationMin`, durationMin, 0, 1440, 'min');
    checkHeartRate(heartRateBpm);
    if (durationMin < minimumBoutMin) unassignedMin += durationMin;
    else minutes[domainOf(heartRateBpm, three)] += durationMin;
  });
  return { minutes, unassignedMin };
}
