import { describe, expect, it } from '@jest/globals';
import type { Weighable } from '../../../src/features/sessions/weighing/weigh-domain.ts';
import { weighSession } from '../../../src/features/sessions/weighing/weigh-session.ts';
import { context, intervals, session, used } from './support/weighing.ts';

describe('what gives no domain minutes', () => {
  it('a mean heart rate alone, which gives Banister’s load of the mean', () => {
    const values = { 'max-heart-rate': 200, 'resting-heart-rate': 50 };
    const weight = weighSession(session({ meanHeartRateBpm: 140, rating: 3 }), context(values));
    expect(weight.domain).toMatchObject({ state: 'absent', reason: expect.stringContaining('mean heart rate alone') });
    // x = (140 − 50) ÷ (200 − 50) = 0.6; women: 60 · 0.6 · 0.86 · e^(1.67 · 0.6).
    const expected = 60 * 0.6 * 0.86 * Math.exp(1.67 * 0.6);
    expect(weight.measures).toEqual([
      expect.objectContaining({ measure: 'banister-of-mean', value: expect.closeTo(expected, 9), reason: null }),
    ]);
    expect(used(weight)).toEqual(['max-heart-rate', 'resting-heart-rate']);
  });

  it.each([
    [{ 'max-heart-rate': 200, 'resting-heart-rate': 50 }, null, 'the sex is not entered', 0],
    [{ 'resting-heart-rate': 50 }, 'male', 'no value in force for max-heart-rate', 0],
    [{ 'max-heart-rate': 200 }, 'male', 'no value in force for resting-heart-rate', 0],
    [{ 'max-heart-rate': 139, 'resting-heart-rate': 50 }, 'male', 'the mean heart rate is above the stored maximum', 2],
    [
      { 'max-heart-rate': 200, 'resting-heart-rate': 141 },
      'male',
      'the mean heart rate is below the stored resting value',
      2,
    ],
  ] as const)('no Banister value: %j, sex %s', (values, sex, reason, count) => {
    const weight = weighSession(session({ meanHeartRateBpm: 140 }), context(values, { sex }));
    expect(weight.measures).toEqual([expect.objectContaining({ value: null, reason })]);
    expect(weight.thresholdsUsed).toHaveLength(count);
  });

  it('a rating alone, or nothing', () => {
    expect(weighSession(session({ rating: 5 }), context())).toMatchObject({
      ratingLoad: 300,
      basis: 'rating',
      domain: { state: 'absent', reason: 'a rating alone gives no domain minutes' },
    });
    expect(weighSession(session(), context())).toMatchObject({
      ratingLoad: null,
      domain: { state: 'absent', reason: 'nothing says how hard it was' },
    });
  });

  it('strength and games: domain load is not applicable; strength has volume load', () => {
    const content: Weighable['content'] = {
      kind: 'strength',
      sets: [
        { exercise: 'squat', sets: 3, repetitions: 5, loadKg: 100 },
        { exercise: 'pull', sets: 2, repetitions: 10, loadKg: 40 },
      ],
    };
    const weight = weighSession(session({ modality: 'strength', setting: 'gym', rating: 6, content }), context());
    expect(weight).toMatchObject({
      ratingLoad: 360,
      basis: 'rating',
      domain: { state: 'not-applicable' },
      measures: [{ measure: 'volume-load', value: 2300 }],
    });
    expect(weighSession(session({ modality: 'games', rating: 6 }), context()).domain.state).toBe('not-applicable');
  });
});

it('does not change what it is given and always answers the same', () => {
  const given = session({ content: intervals({ repetitions: 1, durationS: 3600, powerW: 250 }), rating: 5 });
  const frozen = JSON.stringify(given);
  const around = context({ 'lt1-power': 200, 'critical-power': 280 });
  expect(weighSession(given, around)).toEqual(weighSession(given, around));
  expect(JSON.stringify(given)).toBe(frozen);
});
