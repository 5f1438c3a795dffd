import type { Bounds, DomainMinutes } from '../types.ts';
import { within } from '../guard.ts';
import { checkBounds, domainOf } from './domain-of.ts';

/**
 * Minutes in each intensity domain from hand-entered intervals.
 *
 * Counts a session that was written down bout by bout, as it was written.
 *
 * @param bouts durationMin [min], 0 or more, and intensity [W or m/s, as the bounds], 0 or more
 * @param bounds lt1 < heavySevere < extreme [same unit]; extreme null: severe and extreme together
 * @returns minutes in each domain [min]; their sum is the sum of the bouts
 * @throws NumericInputError on values out of range or bounds out of order
 * @remarks Equation: minutes(domain) = Σ durations whose intensity lies in it. No filter: a bout's mean is taken as its course.
 * Limits: a bout of changing intensity is counted whole in the domain of its mean.
 * @see Burnley M, Jones AM 2018, Eur J Sport Sci 18(1):1–12, doi 10.1080/17461391.2016.1249524
 * @example
 * timeInDomainFromBouts([{ durationMin: 20, intensity: 150 }, { durationMin: 8, intensity: 260 }], { lt1: 180, heavySevere: 240, extreme: null }); // => { moderate: 20, heavy: 0, severe: 8, extreme: 0 }
 */
export function timeInDomainFromBouts(
  bouts: readonly { durationMin: number; intensity: number }[],
  bounds: Bounds,
): DomainMinutes {
  checkBounds('timeInDomainFromBouts', bounds);
  const minutes = { moderate: 0, heavy: 0, severe: 0, extreme: 0 };
  bouts.forEach(({ durationMin, intensity }, index) => {
    within('timeInDomainFromBouts', `bouts[${index}].durationMin`, durationMin, 0, 1440, 'min');
    within('timeInDomainFromBouts', `bouts[${index}].intensity`, intensity, 0, Infinity);
    minutes[domainOf(intensity, bounds)] += durationMin;
  });
  return minutes;
}
