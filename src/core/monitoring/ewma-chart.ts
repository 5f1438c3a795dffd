import { above, whole, within } from '../guard.ts';

/**
 * Exponentially weighted moving average of a control chart.
 *
 * A slow drift shows earlier in it than in the single values.
 *
 * @param values values in order [any unit]; NaN = not measured, the average stays
 * @param target value the process is meant to have, the start [same unit]
 * @param weight weight of the newest value [fraction], above 0, at most 1
 * @returns averages [same unit], same length
 * @throws NumericInputError on an infinite value or target, or a weight out of range
 * @remarks Equation: z(i) = weight·x(i) + (1 − weight)·z(i−1), z(0) = target. Limits: as for its limits.
 * @see NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.4
 * @example
 * ewmaChart([52, 47, 53], 50, 0.3); // => [50.6, 49.52, 50.564]
 */
export function ewmaChart(values: readonly number[], target: number, weight: number): number[] {
  let average = within('ewmaChart', 'target', target, -Infinity, Infinity);
  above('ewmaChart', 'weight', weight, 0, 1);
  return values.map((value, index) => {
    if (Number.isNaN(value)) return average;
    within('ewmaChart', `values[${index}]`, value, -Infinity, Infinity);
    average = weight * value + (1 - weight) * average;
    return average;
  });
}

/**
 * Distance of the control limits from the target of such a chart.
 *
 * @param sd standard deviation of single values [any unit], 0 or more
 * @param weight weight of the newest value [fraction], above 0, at most 1
 * @param width multiple of the average's own standard deviation [no unit], above 0
 * @param count number of values so far, 1 or more; Infinity: the limit the distance grows to
 * @returns distance of either limit from the target [unit of the SD]
 * @throws NumericInputError on an input out of range
 * @remarks Equation: width·SD·√(weight ÷ (2 − weight)·[1 − (1 − weight)^(2·count)]).
 * Limits: supposes independent values with known spread; a short baseline makes the true limits wider.
 * @see NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.4
 * @example
 * ewmaLimit(2.0539, 0.3, 3, Infinity); // => 2.5884317
 */
export function ewmaLimit(sd: number, weight: number, width: number, count: number): number {
  within('ewmaLimit', 'sd', sd, 0, Infinity);
  above('ewmaLimit', 'weight', weight, 0, 1);
  above('ewmaLimit', 'width', width, 0);
  if (count !== Infinity) whole('ewmaLimit', 'count', count, 1);
  const grown = count === Infinity ? 1 : 1 - (1 - weight) ** (2 * count);
  return width * sd * Math.sqrt((weight / (2 - weight)) * grown);
}
