import type { DayValue } from '../types.ts';
import { weekday } from './day.ts';
import { median } from './median.ts';
import { quantile } from './quantile.ts';

const LOOK_BACK_DAYS = 56;
const MIN_SAME_WEEKDAYS = 3;
const HIGH_SHARE = 0.9;

/**
 * A value and its bounds for every day whose load is not known.
 *
 * A recursion has to pass through a gap; it does so three times: with the athlete's usual for that day, with rest, and with a hard day.
 *
 * @param days daily loads [load units] in order and without gaps; state known, partial (the value is a lower bound) or unknown
 * @returns three series [load units] of the same length: value, low and high; equal on known days; never NaN
 * @remarks Equation: value = median of the known loads of that weekday in the 56 days before; with fewer than 3 of them the median of all
 * earlier known days; low = 0; high = 90th percentile of the known loads in those 56 days (in the second case of all earlier known days).
 * None lies below a partial day's known sum. Filled values enter no median. Before the first known day all are 0 or the partial sum.
 * Limits: a usual day is a guess, and a camp or an illness is not usual: look at the bounds.
 * @see own convention
 * @example
 * fillUnknown([{ day: 0, state: 'known', value: 60 }, { day: 1, state: 'unknown', value: NaN }]).value; // => [60, 60]
 */
export function fillUnknown(days: readonly DayValue[]): { value: number[]; low: number[]; high: number[] } {
  const filled = days.map((day, index) => {
    if (day.state === 'known') return { value: day.value, low: day.value, high: day.value };
    const floor = day.state === 'partial' && Number.isFinite(day.value) ? day.value : 0;
    const usual = usualDay(days, index);
    return {
      value: Math.max(usual.value, floor),
      low: floor,
      high: Math.max(usual.high, usual.value, floor),
    };
  });
  return {
    value: filled.map((day) => day.value),
    low: filled.map((day) => day.low),
    high: filled.map((day) => day.high),
  };
}

function usualDay(days: readonly DayValue[], index: number): { value: number; high: number } {
  const recent = known(days, Math.max(0, index - LOOK_BACK_DAYS), index);
  const target = weekday(days[index]!.day);
  const sameWeekday = recent.filter((day) => weekday(day.day) === target).map((day) => day.value);
  if (sameWeekday.length >= MIN_SAME_WEEKDAYS) {
    return { value: median(sameWeekday), high: quantile(loads(recent), HIGH_SHARE) };
  }
  const earlier = loads(known(days, 0, index));
  if (earlier.length === 0) return { value: 0, high: 0 };
  return { value: median(earlier), high: quantile(earlier, HIGH_SHARE) };
}

function known(days: readonly DayValue[], from: number, to: number): DayValue[] {
  return days.slice(from, to).filter((day) => day.state === 'known');
}

function loads(days: readonly DayValue[]): number[] {
  return days.map((day) => day.value);
}
