import { above, loadSeries, within } from '../guard.ts';

/**
 * One component of the impulse–response model, read before the day's load (convention E).
 *
 * What is left, on the morning of each day, of all loads of the days before.
 *
 * @param loads daily loads [load units], one per day without gaps; 0 = rest, NaN = unknown
 * @param tauDays time constant [days], above 0
 * @param start value on the morning of the first day [load units], 0 or more
 * @returns component [load units], one value more than loads: [0] is the start, the last is the morning after the last load;
 *   NaN from the morning after an unknown day on
 * @throws NumericInputError on a negative or infinite load, a time constant not above 0 or a negative start
 * @remarks Equation: g(n) = [g(n−1) + w(n−1)]·e^(−1/τ). Limits: on a day with load the two conventions differ; never mix them.
 * @see Busso T et al. 1997, J Appl Physiol 82(5):1685–1693, doi 10.1152/jappl.1997.82.5.1685; Imbach F et al. 2022, Sports Med Open 8:29, Eq. (1)
 * @example
 * impulseComponentExclusive([100, 0], 45); // => [0, 97.80228725, 95.65287391]
 */
export function impulseComponentExclusive(loads: readonly number[], tauDays: number, start = 0): number[] {
  const decay = decayOf('impulseComponentExclusive', loads, tauDays, start);
  const component = [start];
  for (const load of loads) component.push((component.at(-1)! + load) * decay);
  return component;
}

/**
 * One component of the impulse–response model, read after the day's load (convention I).
 *
 * @param loads daily loads [load units], one per day without gaps; 0 = rest, NaN = unknown
 * @param tauDays time constant [days], above 0
 * @param start value on the evening before the first day [load units], 0 or more
 * @returns component [load units], same length; NaN from an unknown day on
 * @throws NumericInputError on a negative or infinite load, a time constant not above 0 or a negative start
 * @remarks Equation: g(n) = g(n−1)·e^(−1/τ) + w(n). Limits: as for convention E.
 * @see Morton RH, Fitz-Clarke JR, Banister EW 1990, J Appl Physiol 69(3):1171–1177 (recursion: value from memory)
 * @example
 * impulseComponentInclusive([100, 0], 45); // => [100, 97.80228725]
 */
export function impulseComponentInclusive(loads: readonly number[], tauDays: number, start = 0): number[] {
  const decay = decayOf('impulseComponentInclusive', loads, tauDays, start);
  let state = start;
  return loads.map((load) => (state = state * decay + load));
}

function decayOf(fn: string, loads: readonly number[], tauDays: number, start: number): number {
  loadSeries(fn, 'loads', loads);
  above(fn, 'tauDays', tauDays, 0, Infinity, 'days');
  within(fn, 'start', start, 0, Infinity);
  return Math.exp(-1 / tauDays);
}
