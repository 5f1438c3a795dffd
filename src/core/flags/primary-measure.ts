import type { DayState, Measure } from '../types.ts';
import { whole, within } from '../guard.ts';

/** One day as the choice of the measure sees it. */
export interface MeasureDay {
  /** What is known of the day's domain load. */
  readonly domain: DayState;
  /** Minutes of training, strength and games left out [min]. */
  readonly minutes: number;
  /** Those of them that have minutes in domain [min]. */
  readonly domainMinutes: number;
}

/**
 * The measure that drives an athlete's figures for a window of 28 days.
 *
 * Domain load says more, but only where it covers the training; else the athlete's ratings carry the figures.
 *
 * @param days the 28 days: state of the domain load, minutes and minutes in domain [min]
 * @param options minKnown 24 [days], minShare 0.8 [fraction]
 * @returns measure and the reason in words
 * @throws NumericInputError on negative minutes, more domain minutes than minutes, or options out of range
 * @remarks Equation: domain load if known days ≥ 24 and Σ domain minutes ÷ Σ minutes ≥ 0.8, else rating load. Without any such minutes the
 * share does not speak. Limits: decide it once a week, then keep it for the whole window, else a figure changes its meaning from day to day.
 * @see own convention
 * @example
 * primaryMeasure(Array.from({ length: 28 }, () => ({ domain: 'known', minutes: 60, domainMinutes: 30 }))).measure; // => 'rating-load'
 */
export function primaryMeasure(
  days: readonly MeasureDay[],
  options: { minKnown?: number; minShare?: number } = {},
): { measure: Measure; reason: string } {
  const { minKnown = 24, minShare = 0.8 } = options;
  whole('primaryMeasure', 'minKnown', minKnown, 1);
  within('primaryMeasure', 'minShare', minShare, 0, 1);
  days.forEach((day, index) => {
    within('primaryMeasure', `days[${index}].minutes`, day.minutes, 0, Infinity, 'min');
    within('primaryMeasure', `days[${index}].domainMinutes`, day.domainMinutes, 0, day.minutes, 'min');
  });
  const known = days.filter((day) => day.domain === 'known').length;
  if (known < minKnown) {
    return { measure: 'rating-load', reason: `domain load is known on ${known} of ${days.length} days` };
  }
  const minutes = days.reduce((sum, day) => sum + day.minutes, 0);
  const inDomain = days.reduce((sum, day) => sum + day.domainMinutes, 0);
  if (minutes === 0) {
    return { measure: 'domain-load', reason: `known on ${known} of ${days.length} days, no minutes to share out` };
  }
  const percent = Math.floor((100 * inDomain) / minutes);
  const enough = inDomain >= minShare * minutes;
  return {
    measure: enough ? 'domain-load' : 'rating-load',
    reason: `${percent} % of the minutes, strength and games left out, have minutes in domain`,
  };
}
