import { describe, expect, test } from '@jest/globals';
import { criterionEvidence } from '../../../src/core/response-signs/criterion-evidence.ts';
import type { CriterionResult, StandardBout } from '../../../src/core/response-signs/types.ts';
import { FIRST } from './support.ts';

function result(day: number, value: number, change: Partial<CriterionResult> = {}): CriterionResult {
  return {
    ...{
      day: FIRST + day,
      id: `test-${day}`,
      key: 'power',
      kind: 'test',
      value,
      typicalError: 4,
      higherIsBetter: true,
    },
    ...{ inBaseline: true, judged: true, ...change },
  };
}

function bout(day: number, rating: number, change: Partial<StandardBout> = {}): StandardBout {
  return {
    ...{ day: FIRST + day, id: `bout-${day}`, key: 'easy', heartRateBpm: 140, rating, heartRateTypicalError: 3 },
    ...{ ratingTypicalError: 0.7, inBaseline: true, judged: true, ...change },
  };
}

/** Tests of 300 on days 0, 14, 28; bouts of 3 on days 0 to 35. */
const results = [0, 14, 28].map((day) => result(day, 300));
const bouts = [0, 7, 14, 21, 28, 35].map((day) => bout(day, 3));
const on = (
  day: number,
  more: { results?: CriterionResult[]; bouts?: StandardBout[]; firstSign?: number; used?: string[] },
) =>
  criterionEvidence(
    { results: [...results, ...(more.results ?? [])], bouts: [...bouts, ...(more.bouts ?? [])] },
    FIRST + day,
    more.firstSign === undefined ? Infinity : FIRST + more.firstSign,
    more.used ?? [],
  );

describe('criterion evidence', () => {
  test('a test worse by more than 2 typical errors, confirmed by a repeat', () => {
    const given = { results: [result(50, 291), result(55, 290)] };
    expect(on(55, given)).toEqual({
      test: { id: 'test-50', key: 'power', day: FIRST + 50, value: 291, expected: 300, typicalErrors: -2.25 },
      confirmedBy: {
        ...{
          kind: 'repeat',
          id: 'test-55',
          key: 'power',
          day: FIRST + 55,
          value: 290,
          expected: 300,
          typicalErrors: -2.5,
        },
      },
    });
    expect(on(54, given)).toBeNull();
  });

  test('2 typical errors are not enough, on either of the two; better is never evidence', () => {
    expect(on(55, { results: [result(50, 292), result(55, 290)] })).toBeNull();
    expect(on(55, { results: [result(50, 290), result(55, 292)] })).toBeNull();
    expect(on(55, { results: [result(50, 330), result(55, 330)] })).toBeNull();
  });

  test('where lower is better the direction turns', () => {
    const slow = (day: number, value: number) =>
      result(day, value, { key: 'time', higherIsBetter: false, typicalError: 2 });
    const before = [0, 14, 28].map((day) => slow(day, 420));
    expect(on(55, { results: [...before, slow(50, 425), slow(55, 425)] })?.test).toMatchObject({ typicalErrors: -2.5 });
    expect(on(55, { results: [...before, slow(50, 415), slow(55, 415)] })).toBeNull();
  });

  test('ten days are the most between the two, and a confirmation does not come before', () => {
    expect(on(60, { results: [result(50, 290), result(60, 290)] })).not.toBeNull();
    expect(on(61, { results: [result(50, 290), result(61, 290)] })).toBeNull();
    const race = (day: number) => result(day, 290, { kind: 'competition' });
    expect(on(60, { results: [race(48), result(50, 290)] })).toBeNull();
    expect(on(60, { results: [result(50, 290), race(52)] })?.confirmedBy).toMatchObject({ kind: 'competition' });
  });

  test('fewer than three own results: none', () => {
    const given = { results: [result(43, 290), result(48, 290)] };
    expect(on(48, given)).not.toBeNull();
    expect(on(48, { ...given, firstSign: 28 })).toBeNull();
    expect(
      criterionEvidence({ results: [...results.slice(1), ...given.results], bouts }, FIRST + 48, Infinity, []),
    ).toBeNull();
    // On day 42 the third result is fourteen days old.
    expect(on(48, { results: [result(42, 290), result(48, 290)] })?.test.id).not.toBe('test-42');
  });

  test('results since the first sign are not what is expected', () => {
    const falling = [result(42, 296), result(56, 292), result(70, 286), result(75, 286)];
    expect(on(75, { results: falling, firstSign: 40 })?.test).toMatchObject({ expected: 300, typicalErrors: -3.5 });
    expect(on(75, { results: falling })?.test.expected ?? 297).toBeLessThan(300);
  });

  test('marked results neither count as usual nor as evidence', () => {
    expect(on(55, { results: [result(50, 290, { judged: false }), result(55, 290)] })).toBeNull();
    expect(on(55, { results: [result(50, 290), result(55, 290, { judged: false })] })).toBeNull();
    const out = results.map((one) => ({ ...one, inBaseline: false }));
    expect(
      criterionEvidence({ results: [...out, result(50, 290), result(55, 290)], bouts }, FIRST + 55, Infinity, []),
    ).toBeNull();
  });

  test('a competition is no test: two of them are no evidence, nor is another test a repeat', () => {
    const race = (day: number) => result(day, 290, { kind: 'competition' });
    expect(on(55, { results: [race(50), race(55)] })).toBeNull();
    const other = [
      ...[0, 14, 28].map((day) => result(day, 300, { key: 'speed', id: `s-${day}` })),
      result(55, 280, { key: 'speed' }),
    ];
    expect(on(55, { results: [...other, result(50, 290)] })).toBeNull();
  });

  describe('a standard bout confirms', () => {
    const given = { results: [result(50, 290)] };

    test('by a rating more than 2 of its typical errors higher, whatever the heart rate', () => {
      expect(on(52, { ...given, bouts: [bout(52, 4.5)] })?.confirmedBy).toMatchObject({
        kind: 'standard-bout',
        expected: 3,
        value: 4.5,
      });
      expect(on(52, { ...given, bouts: [bout(52, 4.4)] })).toBeNull();
      expect(on(52, { ...given, bouts: [bout(52, 4.5, { heartRateBpm: 160 })] })).not.toBeNull();
      expect(on(50, { ...given, bouts: [bout(50, 4.5)] })).not.toBeNull();
    });

    test('and never by heart rate alone', () => {
      expect(on(52, { ...given, bouts: [bout(52, 3, { heartRateBpm: 110 })] })).toBeNull();
      expect(on(52, { ...given, bouts: [bout(52, NaN, { heartRateBpm: 110 })] })).toBeNull();
    });

    test('unless its rating counts as a sign already', () => {
      expect(on(52, { ...given, bouts: [bout(52, 4.5)], used: ['bout-52'] })).toBeNull();
      expect(on(59, { ...given, bouts: [bout(52, 4.5), bout(59, 5)], used: ['bout-52'] })?.confirmedBy.id).toBe(
        'bout-59',
      );
    });
  });

  test('it counts for 28 days from the confirmation', () => {
    const given = { results: [result(50, 290), result(55, 290)] };
    expect(on(83, given)).not.toBeNull();
    expect(on(84, given)).toBeNull();
  });

  test('a later result of that test within 1 typical error ends it; one in between does not', () => {
    const given = (value: number) => ({ results: [result(50, 290), result(55, 290), result(64, value)] });
    expect(on(63, given(296))).not.toBeNull();
    expect(on(64, given(296))).toBeNull();
    expect(on(64, given(295))).not.toBeNull();
    expect(on(64, given(310))).toBeNull();
  });

  test('the latest confirmed test is shown', () => {
    const given = { results: [result(50, 290), result(55, 290), result(64, 288), result(70, 288)] };
    expect(on(69, { ...given, firstSign: 50 })?.test.id).toBe('test-55');
    expect(on(70, { ...given, firstSign: 50 })?.test.id).toBe('test-64');
    expect(() => criterionEvidence({ results, bouts }, 0.5, Infinity, [])).toThrow(/day/);
  });
});
