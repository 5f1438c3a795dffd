import type { Banded, DayValue, LongShortLoad } from '../types.ts';
import { above, whole } from '../guard.ts';
import { fillUnknown } from '../series/fill-unknown.ts';
import { mean } from '../series/mean.ts';
import { rollingQuantile } from '../series/rolling-quantile.ts';
import { impulseComponentExclusive } from './impulse-component.ts';
import { steadyStateSumExclusive } from './steady-state-sum.ts';

/** Settings of long and short load [days]. */
export interface LongShortOptions {
  readonly longDays?: number;
  readonly shortDays?: number;
  readonly medianDays?: number;
  readonly minLogDays?: number;
  readonly startDays?: number;
  readonly startKnown?: number;
}

/**
 * Long load and short load: two components of nominal 45 and 15 days, in load units and in percent of the own median.
 *
 * What the training of months and of weeks has left, compared with the athlete's own usual; not fitness and not fatigue, as nothing was fitted.
 *
 * @param days daily loads [load units] in order and without gaps
 * @param options longDays 45, shortDays 15 [days]: time constants; medianDays 182, minLogDays 56; startDays 28, startKnown 24: start in
 *   equilibrium with the mean of the first 28 days if 24 of them are known, else at 0 (all but the time constants: own convention)
 * @returns per day, read on the morning after it (so the day is contained): units [load units] and share [%], each with value, low and
 *   high from three ways through unknown days; share NaN before minLogDays of log or where the median is 0
 * @throws NumericInputError on a negative load or a setting out of range
 * @remarks Equation: g(n) = [g(n−1) + w(n−1)]·e^(−1/τ); start S_E(τ)·mean; share = 100·g ÷ median of the value run over the last 182 readings.
 * Limits: 45 and 15 days are nominal values, poor for any one athlete.
 * @see Morton RH, Fitz-Clarke JR, Banister EW 1990, J Appl Physiol 69(3):1171–1177 (nominal 45 and 15 days: value from memory)
 * @example
 * longShortLoad(Array.from({ length: 60 }, (_, day) => ({ day, state: 'known', value: 50 }))).map((d) => d.longShare.value)[59]; // => 100
 */
export function longShortLoad(days: readonly DayValue[], options: LongShortOptions = {}): LongShortLoad[] {
  const { longDays = 45, shortDays = 15, medianDays = 182, minLogDays = 56, startDays = 28, startKnown = 24 } = options;
  const fn = 'longShortLoad';
  above(fn, 'longDays', longDays, 0, Infinity, 'days');
  above(fn, 'shortDays', shortDays, 0, Infinity, 'days');
  whole(fn, 'medianDays', medianDays, 1);
  whole(fn, 'minLogDays', minLogDays, 1);
  whole(fn, 'startDays', startDays, 1);
  whole(fn, 'startKnown', startKnown, 1, startDays);
  const first = days.slice(0, startDays).filter((day) => day.state === 'known');
  const startMean = first.length >= startKnown ? mean(first.map((day) => day.value)) : 0;
  const filled = fillUnknown(days);
  const component = (tau: number): { units: Banded[]; share: Banded[] } => {
    const start = steadyStateSumExclusive(tau) * startMean;
    const run = (loads: readonly number[]): number[] => impulseComponentExclusive(loads, tau, start).slice(1);
    const units = bands(run(filled.value), run(filled.low), run(filled.high));
    const usual = rollingQuantile(
      units.map((unit) => unit.value),
      medianDays,
      0.5,
    );
    return { units, share: units.map((unit, i) => shareOf(unit, i + 1 < minLogDays ? NaN : usual[i]!)) };
  };
  const long = component(longDays);
  const short = component(shortDays);
  return days.map((_, index) => ({
    longUnits: long.units[index]!,
    shortUnits: short.units[index]!,
    longShare: long.share[index]!,
    shortShare: short.share[index]!,
  }));
}

function bands(value: readonly number[], low: readonly number[], high: readonly number[]): Banded[] {
  return value.map((middle, index) => ({ value: middle, low: low[index]!, high: high[index]! }));
}

function shareOf(unit: Banded, usual: number): Banded {
  const percent = (part: number): number => (usual > 0 ? (100 * part) / usual : NaN);
  return { value: percent(unit.value), low: percent(unit.low), high: percent(unit.high) };
}
