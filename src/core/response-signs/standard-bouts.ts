import type { FamilyDay, SignPoint, StandardBout } from './types.ts';
import { whole } from '../guard.ts';
import { expectedResult } from '../monitoring/expected-result.ts';
import type { BoutVerdict } from './bout-verdict.ts';
import { boutVerdict, HIGHER_FROM } from './bout-verdict.ts';

/** A bout beside the own earlier ones. */
export interface JudgedBout {
  readonly bout: StandardBout;
  readonly expectedHeartRateBpm: number;
  readonly expectedRating: number;
  /** Null: too little to compare with, or not judged. */
  readonly verdict: BoutVerdict | null;
}

/** How the standard bouts stand on a day. */
export interface BoutDay extends FamilyDay {
  readonly bouts: readonly JudgedBout[];
}

const LAST = 2;
const WITHIN_DAYS = 16;

/** The last two bouts with a verdict; since when one of them has been a sign. */
interface Latest {
  readonly recent: readonly { readonly day: number; readonly sign: SignPoint | null }[];
  readonly signSince: number | null;
}

/**
 * Standard bouts that cost more effort at no more heart rate, and whether two followed each other.
 *
 * The same warm-up every week; the heart says it is easy while the athlete says it is hard.
 *
 * @param bouts standard bouts [day numbers; bpm; CR-10] in any order, heart rate or rating NaN where not taken
 * @param from first day [days since 1970-01-01]
 * @param to last day [days since 1970-01-01]
 * @returns per day from … to the day's bouts beside the expected heart rate [bpm] and rating [points], and how the family stands
 * @throws NumericInputError on days that are no whole numbers or a typical error not above 0
 * @remarks Equation: expected = mean of the last 3 to 6 own bouts of the same work, at least 15 days old and before the first sign.
 * Raised by a sign in both of the last two bouts within 16 days; cleared by a bout that is none, or when they are older.
 * Limits: ordinary bouts a week apart raise it on about 1 of 100 Mondays.
 * @see Roete AJ et al. 2021, Int J Sports Physiol Perform 16(8):1065–1073; days and counts: own convention
 * @example
 * standardBouts([], 3, 4).map((one) => one.raised); // => [false, false]
 */
export function standardBouts(bouts: readonly StandardBout[], from: number, to: number): BoutDay[] {
  whole('standardBouts', 'from', from, -Infinity);
  whole('standardBouts', 'to', to, from - 1);
  const byDay = Map.groupBy(bouts, ({ day }) => day);
  let latest: Latest = { recent: [], signSince: null };
  let state: Omit<FamilyDay, 'day'> = {
    ...{ raised: false, open: false, since: null, firstSign: null, measured: 0, signs: [] },
  };
  return Array.from({ length: to - from + 1 }, (_, index) => {
    const day = from + index;
    const today = (byDay.get(day) ?? []).map((bout) => judge(bouts, bout, latest.signSince));
    latest = withBouts(latest, day, today);
    const signs = latest.recent.flatMap(({ sign }) => sign ?? []);
    const raised = signs.length === LAST;
    const open = raised || (state.open && endsWithSign(latest.recent));
    const since = open ? (state.since ?? day) : null;
    const firstSign = open ? (state.firstSign ?? signs[0]!.day) : null;
    state = { raised, open, since, firstSign, measured: latest.recent.length, signs };
    return { day, ...state, bouts: today };
  });
}

function judge(all: readonly StandardBout[], bout: StandardBout, signSince: number | null): JudgedBout {
  const own = all.filter(({ key, inBaseline }) => inBaseline && key === bout.key);
  const expected = (of: (one: StandardBout) => number): number =>
    expectedResult(
      own.map((one) => ({ day: one.day, value: of(one) })),
      bout.day,
      signSince ?? Infinity,
    );
  const expectedHeartRateBpm = expected((one) => one.heartRateBpm);
  const expectedRating = expected((one) => one.rating);
  const verdict = bout.judged
    ? boutVerdict(bout, { heartRateBpm: expectedHeartRateBpm, rating: expectedRating })
    : null;
  return { bout, expectedHeartRateBpm, expectedRating, verdict };
}

function withBouts(before: Latest, day: number, today: readonly JudgedBout[]): Latest {
  const added = today.filter(({ verdict }) => verdict !== null).map((one) => ({ day, sign: pointOf(one) }));
  const recent = [...before.recent, ...added].slice(-LAST).filter((one) => one.day > day - WITHIN_DAYS);
  return { recent, signSince: endsWithSign(recent) ? (before.signSince ?? day) : null };
}

function endsWithSign(recent: Latest['recent']): boolean {
  const last = recent.at(-1);
  return last !== undefined && last.sign !== null;
}

function pointOf({ bout, expectedRating, verdict }: JudgedBout): SignPoint | null {
  if (verdict !== 'sign') return null;
  const { day, id, rating, ratingTypicalError: spread } = bout;
  return {
    day,
    value: rating,
    expected: expectedRating,
    spread,
    limit: expectedRating + HIGHER_FROM * spread,
    sources: [id],
  };
}
