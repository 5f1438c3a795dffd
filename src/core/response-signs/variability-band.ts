import type { FamilyDay, MeasuredDay, OwnBaseline, SignPoint } from './types.ts';
import { within } from '../guard.ts';
import { mondayOf, weekday } from '../series/day.ts';
import { mean as meanOf } from '../series/mean.ts';
import { checkDays } from './check-days.ts';
import { ownBaseline } from './own-baseline.ts';
import { variabilityHalfWidth } from './variability-half-width.ts';

/** The mean of a week beside the own band. */
export interface VariabilityWeek {
  readonly validDays: number;
  /** NaN with fewer than 3 valid days. */
  readonly mean: number;
  readonly baseline: OwnBaseline | null;
  /** Edges of the band; NaN where nothing is judged. */
  readonly low: number;
  readonly high: number;
  /** Null: not judged. */
  readonly place: 'below' | 'inside' | 'above' | null;
}

/** How the variability family stands; `week` on Sundays, the week that ends then. */
export interface VariabilityDay extends FamilyDay {
  readonly week: VariabilityWeek | null;
}

const SUNDAY = 7;
const FEWEST_VALID = 3;
const IN_A_ROW = 2;

/** Weeks outside in a row, the band they are held against, and weeks without a mean since. */
interface Outside {
  readonly signs: readonly SignPoint[];
  readonly held: OwnBaseline | null;
  readonly since: number | null;
  readonly blanks: number;
}

const NOTHING: Outside = { signs: [], held: null, since: null, blanks: 0 };

/**
 * Weeks in which ln RMSSD lay outside the own band, and whether two followed each other.
 *
 * Both a fall and a rise can go with maladaptation; a single day, or a single week, says little.
 *
 * @param days ln RMSSD [ln ms] in order without gaps, NaN not measured
 * @returns per day how the family stands, on Sundays with the week's mean and band [ln ms]; same length
 * @throws NumericInputError on days with gaps or an infinite value
 * @remarks Equation: mean of the judged days of an ISO week, at least 3; outside if |mean − baseline mean| > half-width.
 * Raised by two weeks outside in a row, on either side; cleared by a week inside, or two without a mean.
 * The baseline ends on the Sunday before these two weeks and is held from the first week outside until it clears.
 * Limits: studies disagree, hence only with another sign; normal mornings raise it on 3 to 4 of 100 Mondays.
 * @see Plews DJ et al. 2013, Sports Med 43(9):773–781; at least 3 days: Plews DJ et al. 2014, Int J Sports Physiol Perform 9(6):1026–1032; two weeks: own convention
 * @example
 * variabilityBand([{ day: 3, value: 4.1, inBaseline: true, judged: true }]).map((one) => one.week.validDays); // => [1]
 */
export function variabilityBand(days: readonly MeasuredDay[]): VariabilityDay[] {
  checkDays('variabilityBand', days);
  let outside = NOTHING;
  return days.map(({ day, value }, index) => {
    if (!Number.isNaN(value)) within('variabilityBand', `days[${index}].value`, value, -Infinity, Infinity);
    const week = weekday(day) === SUNDAY ? weekOf(days, index, outside.held) : null;
    if (week !== null) outside = next(outside, day, week);
    const { signs, since, blanks } = outside;
    const open = since !== null;
    const firstSign = open ? mondayOf(since) - 7 : null;
    return { day, raised: open && blanks === 0, open, since, firstSign, measured: IN_A_ROW, signs, week };
  });
}

function weekOf(days: readonly MeasuredDay[], index: number, held: OwnBaseline | null): VariabilityWeek {
  const valid = days
    .slice(Math.max(0, index - 6), index + 1)
    .filter(({ value, judged }) => judged && !Number.isNaN(value));
  const validDays = valid.length;
  const mean = validDays < FEWEST_VALID ? NaN : meanOf(valid.map(({ value }) => value));
  const baseline = held ?? ownBaseline(days, index);
  if (baseline === null || Number.isNaN(mean) || baseline.sd === 0) {
    return { validDays, mean, baseline, low: NaN, high: NaN, place: null };
  }
  const half = variabilityHalfWidth(baseline.sd, validDays);
  const [low, high] = [baseline.mean - half, baseline.mean + half];
  return { validDays, mean, baseline, low, high, place: mean < low ? 'below' : mean > high ? 'above' : 'inside' };
}

function next(before: Outside, day: number, { mean, baseline, low, high, place }: VariabilityWeek): Outside {
  if (place === null && before.since !== null && before.blanks + 1 < IN_A_ROW) {
    return { ...before, blanks: before.blanks + 1 };
  }
  if (place === null || place === 'inside' || baseline === null) return NOTHING;
  const limit = place === 'below' ? low : high;
  const point = {
    day,
    value: mean,
    expected: baseline.mean,
    spread: baseline.sd,
    limit,
    sources: [`variability:${day}`],
  };
  const signs = [...before.signs, point].slice(-IN_A_ROW);
  const since = before.since ?? (signs.length < IN_A_ROW ? null : day);
  return { signs, held: baseline, since, blanks: 0 };
}
