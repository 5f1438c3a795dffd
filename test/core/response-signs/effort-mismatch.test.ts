import { describe, expect, test } from '@jest/globals';
import fc from 'fast-check';
import { effortMismatch } from '../../../src/core/response-signs/effort-mismatch.ts';
import { expectedRating } from '../../../src/core/response-signs/expected-rating.ts';
import { ratingRelation } from '../../../src/core/response-signs/rating-relation.ts';
import type { RatedSession } from '../../../src/core/response-signs/session-work.ts';
import { FIRST, madeUpLog, raisedShare, session } from './support.ts';

/** Sixty days of easy rows of 40 to 80 minutes, rated 1 + 3 an hour, half a point up and down in turn. */
const easy = Array.from({ length: 60 }, (_, day) => {
  const totalMin = 40 + 10 * (day % 5);
  return session(day, 1 + (3 * totalMin) / 60 + (day % 2 === 0 ? 0.5 : -0.5), { totalMin });
});
const work = (totalMin: number, heavy = 0, severe = 0, modality = 'rowing') => {
  const { minutes } = session(0, 0, { totalMin, heavy, severe });
  return { modality, totalMin, minutes };
};
const lastDay = (sessions: readonly RatedSession[], to: number) => effortMismatch(sessions, FIRST, FIRST + to).at(-1)!;

describe('the own relation', () => {
  test('finds what each hour adds', () => {
    const sessions = Array.from({ length: 60 }, (_, day) => {
      const [totalMin, heavy, severe] = [50 + ((7 * day) % 40), (3 * day) % 25, (5 * day) % 12];
      const strength = day % 6 === 5;
      const rating = strength ? 3 + totalMin / 60 : 1 + (totalMin + 4 * heavy + 12 * severe) / 60;
      return session(day, rating, strength ? { totalMin, modality: 'strength' } : { totalMin, heavy, severe });
    });
    const relation = ratingRelation(sessions, FIRST + 74)!;
    expect(relation).toMatchObject({
      status: 'converged',
      pairs: 56,
      modalities: ['rowing', 'strength'],
      sd: expect.closeTo(0.5 * Math.sqrt(56 / 51), 9),
    });
    [1, 1, 4, 12, 2].forEach((one, column) => expect(relation.coefficients[column]!).toBeCloseTo(one, 4));
    const planned = expectedRating(relation, work(90, 10, 6));
    expect(planned.rating).toBeCloseTo(1 + (90 + 40 + 72) / 60, 3);
    expect(planned.spread).toBeGreaterThan(0.5);
    expect(expectedRating(relation, work(600)).rating).toBeNaN();
  });

  test('looks at days −70 to −15, and needs 20 pairs there', () => {
    const on = (first: number, count: number) => ratingRelation(easy.slice(first, first + count), FIRST + 70);
    expect(on(36, 19)).toBeNull();
    expect(on(36, 20)).toMatchObject({ pairs: 20, from: FIRST, to: FIRST + 55 });
    expect(on(36, 24)).toMatchObject({ pairs: 20 });
    expect(ratingRelation(easy, FIRST + 71)).toMatchObject({ pairs: 56 });
    expect(ratingRelation(easy, FIRST + 110)).toMatchObject({ pairs: 20 });
    expect(ratingRelation(easy, FIRST + 111)).toBeNull();
  });

  test('leaves out marked sessions, those without rating or minutes, and modalities with fewer than five pairs', () => {
    const some = (change: (one: RatedSession) => Partial<RatedSession>) =>
      ratingRelation(easy.map((one, index) => (index < 4 ? { ...one, ...change(one) } : one)), FIRST + 70)!; // prettier-ignore
    expect(some(() => ({})).pairs).toBe(56);
    expect(some(() => ({ inBaseline: false })).pairs).toBe(52);
    expect(some(() => ({ rating: NaN })).pairs).toBe(52);
    expect(some(() => ({ totalMin: NaN })).pairs).toBe(52);
    expect(some((one) => ({ minutes: { ...one.minutes, heavy: NaN } })).pairs).toBe(52);
    expect(some(() => ({ modality: 'skiing' }))).toMatchObject({ pairs: 52, modalities: ['rowing'] });
    expect(() => some(() => ({ rating: 11 }))).toThrow(/rating = 11/);
  });

  test('one modality, never a heavy or severe minute: no coefficient, and no answer for what was never seen', () => {
    const relation = ratingRelation(easy, FIRST + 70)!;
    expect(relation.factor.kept).toEqual([0, 1]);
    expect(expectedRating(relation, work(60)).rating).toBeCloseTo(4, 1);
    expect(expectedRating(relation, work(60, 0, 1)).rating).toBeCloseTo(4, 1);
    expect(expectedRating(relation, work(60, 0, 10))).toEqual({ rating: NaN, spread: NaN });
    expect(expectedRating(relation, work(60, 0, 0, 'running'))).toEqual({ rating: NaN, spread: NaN });
    expect(expectedRating(relation, work(NaN)).rating).toBeNaN();
    expect(() => expectedRating(relation, work(-1))).toThrow(/totalMin/);
  });

  test('all sessions of one length, heavy minutes always a quarter: still an answer for such a session, and none for another', () => {
    const same = easy.map((one) => ({ ...one, ...work(60, 15) }));
    const relation = ratingRelation(same, FIRST + 70)!;
    expect(relation.factor.kept).toEqual([0]);
    expect(expectedRating(relation, work(60, 15)).rating).toBeGreaterThan(3);
    expect(expectedRating(relation, work(90, 15)).rating).toBeNaN();
    expect(expectedRating(relation, work(60, 25)).rating).toBeNaN();
    const quarter = easy.map((one) => ({ ...one, ...work(one.totalMin, one.totalMin / 4) }));
    const other = ratingRelation(quarter, FIRST + 70)!;
    expect(expectedRating(other, work(70, 17.5)).rating).toBeCloseTo(4.5, 1);
    expect(expectedRating(other, work(70, 0)).rating).toBeNaN();
  });

  test('ratings of 9 and more count as "at least 9": the slope is that of the others', () => {
    const steep = Array.from({ length: 56 }, (_, day) => {
      const totalMin = 50 + 10 * (day % 8);
      return session(day, Math.min(9, (5.5 * totalMin) / 60 + 0.6 * ((day % 3) - 1)), { totalMin });
    });
    expect(steep.filter(({ rating }) => rating >= 9).length).toBeGreaterThan(10);
    const { coefficients } = ratingRelation(steep, FIRST + 70)!;
    expect(Math.abs(coefficients[1]! - 5.5)).toBeLessThan(0.5);
    const below = steep.map((one) => ({ ...one, rating: Math.min(8.9, one.rating) }));
    expect(ratingRelation(below, FIRST + 70)!.coefficients[1]!).toBeLessThan(4.5);
  });

  test('gives no relation if most ratings are at the ceiling, and expects nothing beyond the scale', () => {
    expect(ratingRelation(easy.map((one) => ({ ...one, rating: 9 })), FIRST + 70)).toBeNull(); // prettier-ignore
    const low = ratingRelation(easy.map((one) => ({ ...one, rating: one.totalMin < 55 ? 0 : one.totalMin / 40 })), FIRST + 70)!; // prettier-ignore
    expect(expectedRating(low, work(5)).rating).toBe(0);
  });
});

describe('effort mismatch', () => {
  test('one day by hand: departure, average and limit', () => {
    const day = lastDay([...easy, session(60, 6, { totalMin: 60 })], 60);
    const { expected, spread } = day.sessions[0]!;
    expect(day.departure).toBeCloseTo((6 - expected) / spread, 12);
    const before = effortMismatch(easy, FIRST, FIRST + 59).at(-1)!.average;
    expect(day.average).toBeCloseTo(0.2 * day.departure + 0.8 * before, 12);
    expect(day.limit).toBeCloseTo(2.5 / 3, 12);
    expect(day.sign).toBe(day.average > day.limit);
  });

  test('a rating at the limit of the day is where the sign begins', () => {
    const harder = [0, 1, 2, 3].map((day) => session(60 + day, 6.5, { totalMin: 60 }));
    const { signs } = lastDay([...easy, ...harder], 63);
    const { limit, day } = signs.at(-1)!;
    const at = (rating: number) =>
      lastDay([...easy, ...harder.map((one) => (one.day === day ? { ...one, rating } : one))], day - FIRST).sign;
    expect(at(limit + 0.001)).toBe(true);
    expect(at(limit - 0.001)).toBe(false);
  });

  test('harder than usual raises it, easier never does', () => {
    const shifted = (by: number) => [
      ...easy,
      ...easy.slice(0, 14).map((one, index) => session(60 + index, one.rating + by, { totalMin: one.totalMin })),
    ];
    const up = lastDay(shifted(2), 73);
    expect(up).toMatchObject({ raised: true, measured: 7 });
    expect(up.signs.every(({ value, expected }) => value > expected + 1)).toBe(true);
    expect(effortMismatch(shifted(-2), FIRST, FIRST + 73).some(({ sign }) => sign)).toBe(false);
    expect(effortMismatch(shifted(0), FIRST, FIRST + 73).some(({ sign }) => sign)).toBe(false);
  });

  test('an easy day while the average is still high is no sign', () => {
    const hard = Array.from({ length: 8 }, (_, index) => session(60 + index, 8, { totalMin: 60 }));
    const day = lastDay([...easy, ...hard, session(68, 1, { totalMin: 60 })], 68);
    expect(day.average).toBeGreaterThan(day.limit);
    expect(day.sign).toBe(false);
  });

  test('a rating of 9 and more departs as 9 does, and not at all where as much was expected', () => {
    const of = (rating: number, totalMin: number) => lastDay([...easy, session(60, rating, { totalMin })], 60);
    expect(of(10, 60).departure).toBeCloseTo(of(9, 60).departure, 12);
    expect(of(9, 60).departure).toBeGreaterThan(of(8.9, 60).departure);
    const steep = easy.map((one) => ({ ...one, rating: Math.min(10, one.rating * 2) }));
    const day = lastDay([...steep, session(60, 10, { totalMin: 80 })], 60);
    expect(day.sessions[0]!.expected).toBeGreaterThan(9);
    expect(day.departure).toBe(0);
  });

  test('sessions that may not be judged, and two of one day', () => {
    expect(lastDay([...easy, { ...session(60, 9), judged: false }], 60)).toMatchObject({ sessions: [], sign: null });
    const two = lastDay([...easy, session(60, 5, { id: 'a' }), session(60, 6, { id: 'b', totalMin: 80 })], 60);
    expect(two.sessions.map(({ id }) => id)).toEqual(['a', 'b']);
    const [a, b] = two.sessions;
    const departure = (11 - a!.expected - b!.expected) / (a!.spread + b!.spread);
    expect(two.departure).toBeCloseTo(departure, 12);
  });

  test('after fourteen days without a judged session the average starts anew', () => {
    const hard = Array.from({ length: 4 }, (_, index) => session(60 + index, 8, { totalMin: 60 }));
    const next = (day: number) => lastDay([...easy, ...hard, session(day, 4, { totalMin: 60 })], day);
    expect(next(77).average).toBeGreaterThan(0.5);
    expect(Math.abs(next(78).average)).toBeLessThan(0.2);
  });

  test('the relation is held from the first sign: what became hard stays hard', () => {
    const { sessions } = madeUpLog(3, 182, { rating: (day) => (day >= 70 ? 1.8 : 0) });
    const days = effortMismatch(sessions, FIRST, FIRST + 181);
    const last = days.at(-2)!;
    expect(last).toMatchObject({ raised: true, relation: { to: expect.any(Number) } });
    expect(last.relation!.to).toBeLessThan(FIRST + 65);
    expect(last.frozenSince! - FIRST).toBeLessThan(80);
    // One that moved would have taken the new ratings for usual.
    const moved = expectedRating(ratingRelation(sessions, FIRST + 181)!, work(60)).rating;
    expect(moved - expectedRating(last.relation!, work(60)).rating).toBeGreaterThan(1);
  });

  test('two spreads harder is found after 5 days in half of the athletes, after 9 in nine of ten', () => {
    const waits = Array.from({ length: 60 }, (_, seed) => {
      const { sessions } = madeUpLog(seed, 130, { rating: (day) => (day >= 90 ? 1.6 : 0) });
      const days = effortMismatch(sessions, FIRST, FIRST + 129);
      const found = days.findIndex(({ raised }, index) => index >= 90 && raised);
      return found < 0 ? Infinity : found - 90;
    }).sort((a, b) => a - b);
    expect([waits[30], waits[54]]).toEqual([5, 9]);
  });

  test('ordinary ratings raise it on 1.3 of 100 Mondays', () => {
    const runs = Array.from({ length: 200 }, (_, seed) =>
      effortMismatch(madeUpLog(seed, 182).sessions, FIRST, FIRST + 181),
    );
    expect(raisedShare(runs, 48)).toBeCloseTo(0.013, 3);
  });

  test('a day sees only what is dated up to it', () => {
    const part = fc.record({
      ...{ rating: fc.integer({ min: 0, max: 20 }).map((one) => one / 2), totalMin: fc.integer({ min: 30, max: 90 }) },
      ...{ severe: fc.constantFrom(0, 0, 5, 10), modality: fc.constantFrom('rowing', 'rowing', 'strength') },
      ...{
        inBaseline: fc.integer({ max: 9, min: 0 }).map((one) => one > 0),
        judged: fc.integer({ max: 9, min: 0 }).map((one) => one > 0),
      },
    });
    let [open, related] = [0, 0];
    fc.assert(
      fc.property(fc.array(part, { minLength: 50, maxLength: 90 }), fc.nat(90), fc.nat(30), (given, cut, harder) => {
        const sessions = given.map(({ rating, ...one }, index) =>
          session(index, Math.min(10, index > 40 && index < 60 ? rating / 4 + harder / 4 : rating / 4), one),
        );
        const to = FIRST + given.length - 1;
        const whole = effortMismatch(sessions, FIRST, to);
        const upTo = FIRST + Math.min(cut, given.length - 1);
        const prefix = effortMismatch(
          sessions.filter(({ day }) => day <= upTo),
          FIRST,
          upTo,
        );
        expect(prefix).toEqual(whole.slice(0, prefix.length));
        open += prefix.filter((day) => day.open).length;
        related += prefix.filter((day) => day.relation !== null).length;
      }),
      { numRuns: 60 },
    );
    expect(related).toBeGreaterThan(100);
    expect(open).toBeGreaterThan(30);
  });

  test('refuses days and settings that mean nothing', () => {
    expect(() => effortMismatch([], 0.5, 3)).toThrow(/from/);
    expect(() => effortMismatch([], 3, 1)).toThrow(/to = 1/);
    expect(() => effortMismatch([], 3, 4, { weight: 0 })).toThrow(/weight/);
    expect(() => effortMismatch([], 3, 4, { width: 0 })).toThrow(/width/);
    expect(effortMismatch([], 3, 2)).toEqual([]);
  });
});
