import type { MeasuredDay, OwnBaseline } from './types.ts';
import { whole } from '../guard.ts';
import { mean } from '../series/mean.ts';
import { standardDeviationSample } from '../series/standard-deviation.ts';

/** Stable days wanted, days between the last of them and the day, fewest values, and how far back is looked. */
export const BASELINE = { stableDays: 28, lagDays: 14, fewestValues: 14, furthestDays: 70 } as const;

/**
 * Own mean and spread over the stable days that end some time before a day.
 *
 * What is usual for this athlete, taken from before whatever is going on now.
 *
 * @param days values [any unit, NaN not measured] in order without gaps
 * @param index place of the day the baseline is for [from 0]
 * @returns mean, sd (n − 1) [unit of the values], count [values] and the days from, to; null with fewer than 14 values
 * @throws NumericInputError if the index is no place in the list
 * @remarks Equation: mean and SD of the values on the latest 28 days with inBaseline among t−70 … t−14.
 * Days left out are passed over, so that an illness makes the window reach further back, not thinner.
 * Limits: 14 values know the mean to about a quarter of the SD; signs near the limit are then often chance.
 * @see own convention
 * @example
 * ownBaseline(Array.from({ length: 30 }, (_, day) => ({ day, value: day % 2, inBaseline: true, judged: true })), 29); // => { mean: 0.5, sd: 0.5163978, count: 16, from: 0, to: 15 }
 */
export function ownBaseline(days: readonly MeasuredDay[], index: number): OwnBaseline | null {
  whole('ownBaseline', 'index', index, 0, days.length - 1);
  const values: number[] = [];
  let stable = 0;
  let from = index;
  let to = -1;
  for (let i = index - BASELINE.lagDays; i >= Math.max(0, index - BASELINE.furthestDays); i -= 1) {
    const { value, inBaseline } = days[i]!;
    if (!inBaseline) continue;
    if (to < 0) to = i;
    from = i;
    stable += 1;
    if (!Number.isNaN(value)) values.push(value);
    if (stable === BASELINE.stableDays) break;
  }
  if (values.length < BASELINE.fewestValues) return null;
  return {
    mean: mean(values),
    sd: standardDeviationSample(values),
    count: values.length,
    from: days[from]!.day,
    to: days[to]!.day,
  };
}
