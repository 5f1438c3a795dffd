import { above, within } from '../guard.ts';

/** Both sums after each value, and the places where one of them exceeds the limit. */
export interface CusumChart {
  readonly high: number[];
  readonly low: number[];
  /** Indices from 0. */
  readonly signals: number[];
}

/**
 * Tabular cumulative sum, both sides.
 *
 * Adds up small departures in one direction until they are too many for chance.
 *
 * @param values values in order [any unit], finite
 * @param target value the process is meant to have [same unit]
 * @param slack departure that is not counted, half the shift to detect [same unit], 0 or more
 * @param limit sum above which it signals [same unit], above 0
 * @returns sums upward and downward [same unit], same length, and the indices [from 0] where one exceeds the limit
 * @throws NumericInputError on a value that is not finite, a negative slack or a limit not above 0
 * @remarks Equation: high = max(0, high + x − target − slack), low = max(0, low + target − slack − x).
 * Limits: run lengths suppose independent values with known spread; daily values of an athlete depend on each other.
 * @see NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.3
 * @example
 * tabularCusum([10, 12, 13], 10, 0.5, 3).high; // => [0, 1.5, 4]
 */
export function tabularCusum(values: readonly number[], target: number, slack: number, limit: number): CusumChart {
  within('tabularCusum', 'target', target, -Infinity, Infinity);
  within('tabularCusum', 'slack', slack, 0, Infinity);
  above('tabularCusum', 'limit', limit, 0);
  const chart: CusumChart = { high: [], low: [], signals: [] };
  let [high, low] = [0, 0];
  values.forEach((value, index) => {
    within('tabularCusum', `values[${index}]`, value, -Infinity, Infinity);
    high = Math.max(0, high + value - target - slack);
    low = Math.max(0, low + target - slack - value);
    chart.high.push(high);
    chart.low.push(low);
    if (high > limit || low > limit) chart.signals.push(index);
  });
  return chart;
}
