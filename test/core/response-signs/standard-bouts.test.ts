import { describe, expect, test } from '@jest/globals';
import fc from 'fast-check';
import { boutVerdict } from '../../../src/core/response-signs/bout-verdict.ts';
import { standardBouts } from '../../../src/core/response-signs/standard-bouts.ts';
import type { StandardBout } from '../../../src/core/response-signs/types.ts';
import { seededNormal } from '../../verify/seeded.ts';
import { FIRST, raisedShare } from './support.ts';

describe('what a bout says', () => {
  const errors = { heartRateTypicalError: 3, ratingTypicalError: 0.7 };
  const of = (heartRateBpm: number, rating: number) =>
    boutVerdict({ heartRateBpm, rating, ...errors }, { heartRateBpm: 140, rating: 3 });

  test.each([
    ['lower heart rate, higher rating', 132, 5, 'sign'],
    ['equal heart rate, higher rating', 140, 5, 'sign'],
    ['heart rate equal within its error, higher rating', 143, 4.06, 'sign'],
    ['higher heart rate, higher rating', 143.1, 6, 'neither'],
    ['lower heart rate, lower rating', 132, 1.9, 'fitness'],
    ['equal heart rate, lower rating', 140, 1.9, 'fitness'],
    ['higher heart rate, lower rating', 150, 1.9, 'neither'],
    ['lower heart rate alone', 125, 3, 'neither'],
    ['rating higher by no more than 1.5 errors', 132, 4.05, 'neither'],
  ])('%s', (_, heartRate, rating, verdict) => {
    expect(of(heartRate, rating)).toBe(verdict);
  });

  test('nothing where one of the figures is missing', () => {
    expect(of(NaN, 5)).toBeNull();
    expect(of(140, NaN)).toBeNull();
    expect(boutVerdict({ heartRateBpm: 140, rating: 5, ...errors }, { heartRateBpm: NaN, rating: 3 })).toBeNull();
    expect(() => boutVerdict({ heartRateBpm: 140, rating: 5, ...errors, ratingTypicalError: 0 }, { heartRateBpm: 1, rating: 1 })).toThrow(/ratingTypicalError/); // prettier-ignore
  });
});

function bout(day: number, rating: number, heartRateBpm = 140, change: Partial<StandardBout> = {}): StandardBout {
  return {
    ...{ day: FIRST + day, id: `bout-${day}`, key: 'a', heartRateBpm, rating, heartRateTypicalError: 3 },
    ...{ ratingTypicalError: 0.7, inBaseline: true, judged: true, ...change },
  };
}

/** Six weekly bouts at 3 on days 0, 7 … 35. */
const usual = [0, 7, 14, 21, 28, 35].map((day) => bout(day, 3));
const run = (bouts: readonly StandardBout[], to: number) => standardBouts([...usual, ...bouts], FIRST, FIRST + to);

describe('standard bouts', () => {
  test('are compared with the mean of the last three to six at least fifteen days old', () => {
    const first = (bouts: StandardBout[], day: number) => standardBouts(bouts, FIRST, FIRST + day).at(-1)!.bouts[0]!;
    expect(first([...usual, bout(42, 5)], 42)).toMatchObject({
      expectedRating: 3,
      expectedHeartRateBpm: 140,
      verdict: 'sign',
    });
    expect(first([...usual.slice(0, 2), bout(42, 5)], 42)).toMatchObject({ expectedRating: NaN, verdict: null });
    expect(first([bout(0, 3), bout(7, 4), bout(14, 5), bout(29, 8)], 29)).toMatchObject({ expectedRating: 4 });
    expect(first([bout(0, 3), bout(7, 4), bout(14, 5), bout(28, 8)], 28)).toMatchObject({ verdict: null });
    expect(first([...usual, bout(42, 5, 140, { key: 'b' })], 42)).toMatchObject({ verdict: null });
    expect(first([...usual.map((one) => ({ ...one, inBaseline: false })), bout(42, 5)], 42)).toMatchObject({
      verdict: null,
    });
    expect(first([...usual, bout(42, 5, 140, { judged: false })], 42)).toMatchObject({ verdict: null });
  });

  test('raised by two signs in a row within sixteen days, cleared by a bout that is none', () => {
    const days = run([bout(42, 5), bout(49, 5), bout(56, 3)], 60);
    expect(days.map(({ raised }) => raised).indexOf(true)).toBe(49);
    expect(days[49]).toMatchObject({ since: FIRST + 49, firstSign: FIRST + 42, measured: 2 });
    expect(days[49]!.signs.map(({ value, expected, limit, sources }) => [value, expected, limit, sources])).toEqual([
      [5, 3, expect.closeTo(4.05, 9), ['bout-42']],
      [5, 3, expect.closeTo(4.05, 9), ['bout-49']],
    ]);
    expect(days.slice(49, 56).every(({ open }) => open)).toBe(true);
    expect(days[56]).toMatchObject({ raised: false, open: false, since: null, firstSign: null });
    expect(run([bout(42, 5), bout(49, 3), bout(56, 5)], 60).some(({ raised }) => raised)).toBe(false);
    expect(run([bout(42, 5), bout(49, 5, 150), bout(56, 5)], 60).some(({ raised }) => raised)).toBe(false);
  });

  test('both bouts have to lie within sixteen days', () => {
    expect(run([bout(42, 5), bout(57, 5)], 57).at(-1)).toMatchObject({ raised: true, measured: 2 });
    expect(run([bout(42, 5), bout(58, 5)], 58).at(-1)).toMatchObject({ raised: false, measured: 1 });
    const old = run([bout(42, 5), bout(49, 5)], 66);
    expect(old[57]).toMatchObject({ raised: true });
    expect(old[58]).toMatchObject({ raised: false, open: true });
    expect(old[65]).toMatchObject({ raised: false, open: false });
  });

  test('bouts from the first sign on are not what is usual', () => {
    const signs = [42, 49, 56, 63, 70, 77, 84, 91].map((day) => bout(day, 5));
    const days = run(signs, 91);
    expect(days.at(-1)!.bouts[0]).toMatchObject({ expectedRating: 3, verdict: 'sign' });
    const after = run([...signs, bout(98, 3), bout(105, 5)], 105);
    // Cleared on day 98: from then on the hard weeks count among the last six.
    expect(after.at(-1)!.bouts[0]!.expectedRating).toBeCloseTo(5, 9);
  });

  test('ordinary weekly bouts raise it on 0.8 of 100 Mondays', () => {
    const runs = Array.from({ length: 1000 }, (_, seed) => {
      const normal = seededNormal(seed);
      const weekly = Array.from({ length: 26 }, (_, week) =>
        bout(7 * week + 1, 3 + 0.7 * normal(), 140 + 3 * normal()),
      );
      return standardBouts(weekly, FIRST, FIRST + 181);
    });
    expect(raisedShare(runs, 41)).toBeCloseTo(0.0076, 3);
  });

  test('a day sees only what is dated up to it', () => {
    const one = fc.record({
      gap: fc.integer({ min: 0, max: 9 }),
      rating: fc.integer({ min: 2, max: 6 }),
      beats: fc.constantFrom(135, 140, 150),
    });
    let open = 0;
    fc.assert(
      fc.property(fc.array(one, { minLength: 6, maxLength: 20 }), fc.nat(100), (given, cut) => {
        let day = 0;
        const bouts = given.map(({ gap, rating, beats }, index) =>
          bout((day += gap), rating, beats, { id: String(index) }),
        );
        const whole = standardBouts(bouts, FIRST, FIRST + 120);
        const upTo = FIRST + cut;
        const prefix = standardBouts(bouts.filter((b) => b.day <= upTo), FIRST, upTo); // prettier-ignore
        expect(prefix).toEqual(whole.slice(0, cut + 1));
        open += prefix.filter((d) => d.open).length;
      }),
      { numRuns: 200 },
    );
    expect(open).toBeGreaterThan(10);
  });

  test('refuses days that are none', () => {
    expect(() => standardBouts([], 0.5, 1)).toThrow(/from/);
    expect(() => standardBouts([], 2, 0)).toThrow(/to/);
  });
});
