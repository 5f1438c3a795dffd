import type { FamilyDay, SignPoint } from './types.ts';
import { above, whole, within } from '../guard.ts';
import { ewmaChart, ewmaLimit } from '../monitoring/ewma-chart.ts';
import { expectedRating } from './expected-rating.ts';
import type { RatingRelation } from './rating-relation.ts';
import { ratingRelation } from './rating-relation.ts';
import type { RatedSession } from './session-work.ts';
import { CEILING, isRated } from './session-work.ts';
import { hasSigns, nextRun, NO_RUN } from './sign-run.ts';

/** The sessions of a day beside the athlete's own relation. */
export interface EffortDay extends FamilyDay {
  readonly sessions: readonly JudgedSession[];
  /** The day's departure from the expected ratings, the chart after it and its limit, in own SDs; NaN where nothing was judged. */
  readonly departure: number;
  readonly average: number;
  readonly limit: number;
  /** Null: nothing judged. */
  readonly sign: boolean | null;
  /** The one held, or else what the day was judged by; null where nothing was, or there is too little. */
  readonly relation: RatingRelation | null;
  /** Since when the relation is held; null while it moves. */
  readonly frozenSince: number | null;
}

/** A session's rating beside the expected one, and the SD of a single rating about it [points]. */
export interface JudgedSession {
  readonly id: string;
  readonly rating: number;
  readonly expected: number;
  readonly spread: number;
}

/** Days without a judged session after which the chart starts anew. */
const FORGETS_AFTER = 14;

/**
 * Days on which sessions felt harder than this athlete usually finds such sessions, and whether they have become frequent.
 *
 * The same work that costs more is an early word of fatigue, and the athlete says it every day.
 *
 * @param sessions rated sessions [day numbers; min; CR-10] in any order
 * @param from first day [days since 1970-01-01]
 * @param to last day [days since 1970-01-01]
 * @param options weight 0.2 [fraction] and width 2.5 [SD of the average] of the chart
 * @returns per day from … to the sessions judged [points], departure, average and limit [own SDs], sign, and how the family stands
 * @throws NumericInputError on days that are no whole numbers, a rating outside 0 to 10 or an option out of range
 * @remarks Equation: departure d = Σ(rating − expected) ÷ Σ spread over the day; average z = 0.2·d + 0.8·z before; sign if z > 2.5·√(0.2 ÷ 1.8)
 * = 0.83 own SDs and d > 0. A rating of 9 and more departs as 9 does, and not at all if as much was expected. The relation is held from the
 * first sign until none is left among the last 7 measured days within 14 days; raised by 3 of these 7, cleared at 1.
 * Limits: ordinary ratings raise it on 1 to 2 of 100 Mondays.
 * @see NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.4 for the chart; weight, width and one value a day: own convention
 * @example
 * effortMismatch([], 10, 11).map((one) => one.average); // => [NaN, NaN]
 */
export function effortMismatch(
  sessions: readonly RatedSession[],
  from: number,
  to: number,
  options: { weight?: number; width?: number } = {},
): EffortDay[] {
  const { weight = 0.2, width = 2.5 } = options;
  whole('effortMismatch', 'from', from, -Infinity);
  whole('effortMismatch', 'to', to, from - 1);
  const limit = ewmaLimit(1, above('effortMismatch', 'weight', weight, 0, 1), width, Infinity);
  const byDay = Map.groupBy(sessions, ({ day }) => day);
  let run = NO_RUN;
  let held: { relation: RatingRelation; since: number } | null = null;
  let chart = { average: 0, day: -Infinity };
  return Array.from({ length: to - from + 1 }, (_, index) => {
    const day = from + index;
    const due = (byDay.get(day) ?? []).filter((one) => one.judged && isRated(one));
    const relation: RatingRelation | null = held?.relation ?? (due.length === 0 ? null : ratingRelation(sessions, day));
    const judged = relation === null ? [] : due.flatMap((one) => beside(relation, one));
    const start = day - chart.day > FORGETS_AFTER ? 0 : chart.average;
    const { departure, ...means } = ofDay(judged);
    const average = judged.length === 0 ? NaN : ewmaChart([departure], start, weight)[0]!;
    if (judged.length > 0) chart = { average, day };
    const sign = judged.length === 0 ? null : average > limit && departure > 0;
    // The rating from which on this day was a sign, the chart being where it was.
    const enough = means.expected + Math.max(0, (limit - (1 - weight) * start) / weight) * means.spread;
    const point: SignPoint = { day, ...means, limit: enough, sources: judged.map(({ id }) => id) };
    run = nextRun(run, day, sign === null ? undefined : sign ? point : null);
    if (!hasSigns(run)) held = null;
    else if (held === null && relation !== null) held = { relation, since: day };
    const frozenSince = held?.since ?? null;
    return { day, sessions: judged, departure, average, limit, sign, relation, frozenSince, ...run.state };
  });
}

function beside(relation: RatingRelation, session: RatedSession): JudgedSession[] {
  const { rating: expected, spread } = expectedRating(relation, session);
  const rating = within('effortMismatch', 'rating', session.rating, 0, 10);
  return Number.isNaN(expected) ? [] : [{ id: session.id, rating, expected, spread }];
}

/** Means over the sessions of a day, and its departure in own SDs. */
function ofDay(judged: readonly JudgedSession[]) {
  const mean = (of: (one: JudgedSession) => number) => judged.reduce((sum, one) => sum + of(one), 0) / judged.length;
  const value = mean(({ rating, expected }) => (rating < CEILING ? rating : Math.max(CEILING, expected)));
  const expected = mean((one) => one.expected);
  const spread = mean((one) => one.spread);
  return { value, expected, spread, departure: (value - expected) / spread };
}
