import { whole, within } from '../guard.ts';
import type { Factor } from '../numeric/cholesky.ts';
import { solve } from '../numeric/cholesky.ts';
import type { HuberFit } from './huber-regression.ts';
import { huberRegression } from './huber-regression.ts';
import type { RatedSession } from './session-work.ts';
import { CEILING, columnsOf, isRated } from './session-work.ts';

/** How this athlete rates what kind of session. */
export interface RatingRelation {
  readonly status: HuberFit['status'];
  /** First and last day looked at. */
  readonly from: number;
  readonly to: number;
  readonly pairs: number;
  /** The first is the one the constant stands for; each other has a column. */
  readonly modalities: readonly string[];
  /** Points; points per hour in total, heavy, severe with extreme; points per modality. */
  readonly coefficients: readonly number[];
  /** Own robust SD of a rating about the relation [points]. */
  readonly sd: number;
  readonly factor: Factor;
  /** Columns that never varied by themselves, as sums of the kept ones. */
  readonly dependent: readonly { readonly column: number; readonly on: readonly number[] }[];
}

const FROM_DAYS_BEFORE = 70;
const TO_DAYS_BEFORE = 15;
const FEWEST_PAIRS = 20;
const FEWEST_OF_MODALITY = 5;
const LEAST_SD = 0.5;
/** A thousandth of the own SD is far less than a rating can say. */
const SETTLED = 1e-3;

/**
 * How one athlete's session rating follows from minutes and modality.
 *
 * Learned from sessions of some weeks ago, so that what is going on now has no part in it.
 *
 * @param sessions rated sessions [day numbers; min; CR-10] in any order
 * @param day day the relation is for [days since 1970-01-01]
 * @returns coefficients [points, points per hour], own robust SD [points], pairs; null with fewer than 20 pairs, or if most are at the ceiling
 * @throws NumericInputError on a day that is no whole number or a rating outside 0 to 10
 * @remarks Equation: rating = a + b·total + c·heavy + d·(severe + extreme) + e(modality), moderate being what is left of the total; fitted by
 * Huber's regression to sessions with inBaseline on t−70 … t−15. Ratings of 9 and more count as "at least 9". Modalities with fewer than 5 pairs
 * are left out. SD: robust scale, at least 0.5, × √(n ÷ (n − columns)). Limits: effects add up; new thresholds move minutes, not effort.
 * @see Huber PJ 1973, Ann Stat 1(5):799–821 for the fit; form, days and floors: own convention, after Martin DT, Andersen MB 2000, J Sports Med Phys Fitness 40(3):201–208
 * @example
 * ratingRelation(Array.from({ length: 20 }, (_, day) => ({ day, id: '', modality: 'row', totalMin: 60, minutes: { moderate: 60, heavy: 0, severe: 0, extreme: 0 }, rating: 3 + (day % 2), inBaseline: true, judged: true })), 40).coefficients; // => [3.5, 0, 0, 0]
 */
export function ratingRelation(sessions: readonly RatedSession[], day: number): RatingRelation | null {
  whole('ratingRelation', 'day', day, -Infinity);
  const [from, to] = [day - FROM_DAYS_BEFORE, day - TO_DAYS_BEFORE];
  const usable = sessions.filter((one) => one.day >= from && one.day <= to && one.inBaseline && isRated(one));
  const modalities = frequent(usable.map(({ modality }) => modality));
  const pairs = usable.filter(({ modality }) => modalities.includes(modality));
  const atLeast = pairs.map(({ rating }) => within('ratingRelation', 'rating', rating, 0, 10) >= CEILING);
  if (pairs.length < FEWEST_PAIRS || atLeast.filter(Boolean).length > pairs.length / 2) return null;
  const rows = pairs.map((one) => columnsOf(one, modalities));
  const ratings = pairs.map(({ rating }) => Math.min(rating, CEILING));
  const { status, coefficients, scale, weights, factor } = huberRegression(rows, ratings, {
    ...{ leastScale: LEAST_SD, tolerance: SETTLED, atLeast },
  });
  const dependent = coefficients.flatMap((_, column) => {
    if (factor.kept.includes(column)) return [];
    const right = factor.kept.map((k) => rows.reduce((sum, row, i) => sum + weights[i]! * row[k]! * row[column]!, 0));
    return [{ column, on: solve(factor, right) }];
  });
  const freedom = pairs.length / (pairs.length - factor.kept.length);
  const sd = scale * Math.sqrt(freedom);
  return { status, from, to, pairs: pairs.length, modalities, coefficients, sd, factor, dependent };
}

/** The modalities with enough pairs, in the order they first appear. */
function frequent(modalities: readonly string[]): string[] {
  const counts = new Map<string, number>();
  for (const one of modalities) counts.set(one, (counts.get(one) ?? 0) + 1);
  return [...counts].filter(([, count]) => count >= FEWEST_OF_MODALITY).map(([modality]) => modality);
}
