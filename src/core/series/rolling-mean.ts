import { loadSeries, whole } from '../guard.ts';

/**
 * Mean load over the last days, counting known days only.
 *
 * Answers "how much a day, lately" without taking a gap in the log for rest.
 *
 * @param values daily loads [load units], one per day without gaps; 0 = rest, NaN = unknown
 * @param windowDays length of the window [days], 1 or more; the window ends on the day itself
 * @param minKnown fewest known days [days] for which a mean is given, 1 to windowDays
 * @returns mean per known day [load units], same length; NaN where the log is shorter than the window or too few days are known
 * @throws NumericInputError on a negative or infinite load, or a window or floor out of range
 * @remarks Equation: m(t) = sum of known values in t−N+1 … t ÷ number of known days there.
 * Limits: a mean of known days supposes that unknown days were like the known ones; hence the floor, which is an own convention.
 * @see own convention for the floor; arithmetic mean otherwise
 * @example
 * rollingMean([2, 4, NaN, 6], 2, 1); // => [NaN, 3, 4, 6]
 */
export function rollingMean(values: readonly number[], windowDays: number, minKnown: number): number[] {
  loadSeries('rollingMean', 'values', values);
  whole('rollingMean', 'windowDays', windowDays, 1);
  whole('rollingMean', 'minKnown', minKnown, 1, windowDays);
  return values.map((_, index) => {
    if (index < windowDays - 1) return NaN;
    let sum = 0;
    let known = 0;
    for (let i = index - windowDays + 1; i <= index; i += 1) {
      const value = values[i]!;
      if (Number.isNaN(value)) continue;
      sum += value;
      known += 1;
    }
    return known >= minKnown ? sum / known : NaN;
  });
}
