import { within } from '../guard.ts';
import { median } from '../series/median.ts';

const NEIGHBOURS_EACH_SIDE = 2;
const LARGEST_DEPARTURE = 0.2;

/**
 * RR intervals without ectopic beats and missed or double detections.
 *
 * An interval that departs from the median of its neighbours by more than a fifth is no beat of the quiet rhythm.
 *
 * @param intervalsMs RR intervals in the order they were measured [ms]
 * @returns intervals [ms], same length; NaN where one was removed
 * @throws NumericInputError on an interval that is not above 0 and finite
 * @remarks Equation: removed if |RR − m| > 0.2·m, m = median of the interval and up to two neighbours on each side.
 * Limits: a run of three or more artefacts can pass; a strong breathing rhythm at a low heart rate can lose true beats.
 * @see common practice, no source for the 20 % and the neighbours
 * @example
 * cleanRrIntervals([800, 810, 1600, 805, 795]); // => [800, 810, NaN, 805, 795]
 */
export function cleanRrIntervals(intervalsMs: readonly number[]): number[] {
  intervalsMs.forEach((interval, index) => {
    within('cleanRrIntervals', `intervalsMs[${index}]`, interval, Number.MIN_VALUE, Infinity, 'ms');
  });
  return intervalsMs.map((interval, index) => {
    const from = Math.max(0, index - NEIGHBOURS_EACH_SIDE);
    const middle = median(intervalsMs.slice(from, index + NEIGHBOURS_EACH_SIDE + 1));
    return Math.abs(interval - middle) > LARGEST_DEPARTURE * middle ? NaN : interval;
  });
}
