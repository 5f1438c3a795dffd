import { describe, expect, it } from '@jest/globals';
import type { Quantity, ResolvedThreshold, ThresholdSet } from '../../../src/features/thresholds/thresholds.types.ts';
import type { IntervalLine, WeighContext, WeighPolicy } from '../../../src/features/sessions/sessions.types.ts';
import type { Weighable } from '../../../src/features/sessions/weighing/weigh-domain.ts';
import { weighSession } from '../../../src/features/sessions/weighing/weigh-session.ts';

const policy: WeighPolicy = {
  id: '0198f3a0-0000-7000-8000-000000000001',
  weights: { moderate: 1, heavy: 2, severe: 3, extreme: 3 },
  bound: { quantity: 'critical', fallbackLt2Method: null },
};

function set(values: Partial<Record<Quantity, number>>, methods: Partial<Record<Quantity, string>> = {}): ThresholdSet {
  return new Map(
    Object.entries(values).map(([name, value]): [Quantity, ResolvedThreshold] => {
      const quantity = name as Quantity;
      const method = methods[quantity] ?? 'step test';
      return [quantity, { quantity, id: `id of ${name}`, value, validFrom: '2026-01-05', method }];
    }),
  );
}

function context(values: Partial<Record<Quantity, number>> = {}, more: Partial<WeighContext> = {}): WeighContext {
  return { thresholds: set(values), sex: 'female', policy, ...more };
}

function session(more: Partial<Weighable> = {}): Weighable {
  return {
    durationMin: 60,
    modality: 'rowing',
    setting: 'ergometer',
    rating: null,
    meanHeartRateBpm: null,
    content: { kind: 'none' },
    ...more,
  };
}

const intervals = (...lines: IntervalLine[]): Weighable['content'] => ({ kind: 'intervals', lines });
const used = (weight: { thresholdsUsed: ResolvedThreshold[] }) => weight.thresholdsUsed.map(({ quantity }) => quantity);

describe('intervals with power', () => {
  // 4 × 8 min at 300 W (above 280 W: severe), each with 4 min at 150 W; 12 min at 230 W: heavy.
  const content = intervals(
    { repetitions: 4, durationS: 480, powerW: 300, recoveryS: 240, recoveryPowerW: 150 },
    { repetitions: 1, durationS: 720, powerW: 230 },
  );

  it('counts minutes by LT1 and critical power and names only what it used', () => {
    const values = { 'lt1-power': 200, 'critical-power': 280, 'lt2-power': 260, 'lt1-heart-rate': 140 };
    const weight = weighSession(session({ content, rating: 7 }), context(values));
    expect(weight.domain).toEqual({
      state: 'present',
      load: 1 * 16 + 2 * 12 + 3 * 32,
      minutes: { moderate: 16, heavy: 12, severe: 32, extreme: 0 },
      unassignedMin: 0,
    });
    expect(weight).toMatchObject({ basis: 'interval', ratingLoad: 420, policyId: policy.id, methodVersion: '1' });
    expect(used(weight)).toEqual(['critical-power', 'lt1-power']);
    expect(weight.measures).toEqual([
      { measure: 'three-phase', method: 'heart-rate-load-three-phase', version: '1', value: 136, reason: null },
    ]);
  });

  it('at a bound the minutes still belong to the domain below', () => {
    const lines = intervals(
      { repetitions: 1, durationS: 1800, powerW: 200 },
      { repetitions: 1, durationS: 1800, powerW: 280 },
    );
    const weight = weighSession(session({ content: lines }), context({ 'lt1-power': 200, 'critical-power': 280 }));
    expect(weight.domain).toMatchObject({ minutes: { moderate: 30, heavy: 30, severe: 0, extreme: 0 } });
  });

  it('splits the extreme domain off in cycling alone, at critical power + W′ ÷ 136 s', () => {
    const values = { 'lt1-power': 200, 'critical-power': 280, 'w-prime': 13_600 };
    const lines = intervals(
      { repetitions: 1, durationS: 1800, powerW: 380 },
      { repetitions: 1, durationS: 1800, powerW: 381 },
    );
    const cycling = weighSession(session({ modality: 'cycling', setting: 'road', content: lines }), context(values));
    expect(cycling.domain).toMatchObject({ minutes: { severe: 30, extreme: 30 } });
    expect(used(cycling)).toEqual(['critical-power', 'lt1-power', 'w-prime']);
    const rowing = weighSession(session({ content: lines }), context(values));
    expect(rowing.domain).toMatchObject({ minutes: { severe: 60, extreme: 0 } });
    expect(used(rowing)).toEqual(['critical-power', 'lt1-power']);
  });

  it('takes LT2 where there is no critical power, and only that of the method the policy names', () => {
    const thresholds = set({ 'lt1-power': 200, 'lt2-power': 260 }, { 'lt2-power': 'fixed 4 mmol/L' });
    const named = (fallbackLt2Method: string | null, quantity: 'critical' | 'lt2' = 'critical') =>
      weighSession(session({ content }), {
        thresholds,
        sex: null,
        policy: { ...policy, bound: { quantity, fallbackLt2Method } },
      });
    expect(used(named(null))).toEqual(['lt1-power', 'lt2-power']);
    expect(used(named('fixed 4 mmol/L'))).toEqual(['lt1-power', 'lt2-power']);
    expect(named('modified D-max').domain).toEqual({
      state: 'absent',
      reason: 'no value in force for critical-power or lt2-power (modified D-max)',
      unassignedMin: null,
    });
    expect(named('modified D-max', 'lt2').domain).toMatchObject({
      reason: 'no value in force for lt2-power (modified D-max)',
    });
  });

  it('follows the bound of the modality where the policy has one', () => {
    const byModality = { rowing: { quantity: 'lt2' as const, fallbackLt2Method: null } };
    const own = { ...policy, bound: { ...policy.bound, byModality } };
    const values = { 'lt1-power': 200, 'lt2-power': 260, 'critical-power': 280 };
    expect(used(weighSession(session({ content }), context(values, { policy: own })))).toEqual([
      'lt1-power',
      'lt2-power',
    ]);
  });

  it('has no domain load without LT1, and says so', () => {
    const weight = weighSession(session({ content, rating: 7 }), context({ 'critical-power': 280 }));
    expect(weight.domain).toEqual({
      state: 'absent',
      reason: 'no value in force for lt1-power',
      unassignedMin: null,
    });
    expect(weight).toMatchObject({ ratingLoad: 420, basis: 'interval', thresholdsUsed: [], measures: [] });
  });
});

describe('minutes nobody described', () => {
  const values = { 'lt1-power': 200, 'critical-power': 280 };
  const line = (durationS: number): Weighable['content'] => intervals({ repetitions: 1, durationS, powerW: 150 });

  it('may be up to 10 % of the session', () => {
    expect(weighSession(session({ content: line(54 * 60) }), context(values)).domain).toEqual({
      state: 'present',
      load: 54,
      minutes: { moderate: 54, heavy: 0, severe: 0, extreme: 0 },
      unassignedMin: 6,
    });
    expect(weighSession(session({ content: line(54 * 60 - 1) }), context(values)).domain).toMatchObject({
      state: 'absent',
      reason: '11 % of the minutes have no domain (at most 10 %)',
    });
  });

  it('are rest, and moderate, where a recovery has no intensity', () => {
    const content = intervals({ repetitions: 5, durationS: 480, powerW: 300, recoveryS: 240 });
    expect(weighSession(session({ content }), context(values)).domain).toMatchObject({
      minutes: { moderate: 20, severe: 40 },
      unassignedMin: 0,
    });
  });

  it('are unassigned where the intensity is of another kind', () => {
    const content = intervals(
      { repetitions: 1, durationS: 3240, powerW: 150 },
      { repetitions: 1, durationS: 360, heartRateBpm: 150 },
    );
    expect(weighSession(session({ content }), context(values)).domain).toMatchObject({
      state: 'present',
      unassignedMin: 6,
    });
  });

  it('count against hand-given domain minutes as well', () => {
    const content = { kind: 'domain-minutes', moderate: 50, heavy: 0, severe: 0, extreme: 0 } as const;
    expect(weighSession(session({ content }), context()).domain).toMatchObject({ state: 'absent', unassignedMin: 10 });
    const whole = { kind: 'domain-minutes', moderate: 30, heavy: 20, severe: 9, extreme: 1 } as const;
    expect(weighSession(session({ content: whole }), context())).toMatchObject({
      basis: 'minutes',
      domain: { state: 'present', load: 30 + 40 + 27 + 3 },
      thresholdsUsed: [],
    });
  });
});

describe('intervals with speed', () => {
  const values = { 'lt1-speed': 3.5, 'critical-speed': 4.5, 'd-prime': 206 };
  const content = intervals(
    { repetitions: 1, durationS: 1800, speedMps: 3 },
    { repetitions: 1, durationS: 900, speedMps: 6.5 },
    { repetitions: 1, durationS: 900, speedMps: 6.6 },
  );
  const at = (modality: Weighable['modality'], setting: Weighable['setting']) =>
    weighSession(session({ modality, setting, content }), context(values));

  it.each([
    ['running', 'track'],
    ['running', 'treadmill'],
    ['swimming', 'pool'],
    ['skiing', 'treadmill'],
  ] as const)('count for %s on the %s', (modality, setting) => {
    expect(at(modality, setting)).toMatchObject({ basis: 'interval', domain: { state: 'present' } });
  });

  it.each([
    ['rowing', 'water'],
    ['rowing', 'ergometer'],
    ['running', 'road'],
    ['running', 'trail'],
    ['running', 'any'],
    ['swimming', 'open-water'],
    ['skiing', 'snow'],
    ['cycling', 'road'],
  ] as const)('do not count for %s, setting %s', (modality, setting) => {
    expect(at(modality, setting)).toMatchObject({
      domain: { state: 'absent', reason: `speed is no measure of intensity for ${modality} (${setting})` },
      thresholdsUsed: [],
    });
  });

  it('split the extreme domain off in running alone, at critical speed + D′ ÷ 103 s', () => {
    expect(at('running', 'track').domain).toMatchObject({ minutes: { moderate: 30, severe: 15, extreme: 15 } });
    expect(at('swimming', 'pool').domain).toMatchObject({ minutes: { moderate: 30, severe: 30, extreme: 0 } });
  });
});

describe('intervals with heart rate', () => {
  const values = { 'lt1-heart-rate': 140, 'lt2-heart-rate': 165, 'max-heart-rate': 190, 'resting-heart-rate': 50 };

  it('give three domains from bouts of at least 3 min; recoveries without heart rate are moderate', () => {
    const content = intervals(
      { repetitions: 4, durationS: 600, heartRateBpm: 170, recoveryS: 120 },
      { repetitions: 1, durationS: 540, heartRateBpm: 150 },
      { repetitions: 1, durationS: 179, heartRateBpm: 150 },
    );
    const weight = weighSession(session({ content }), context(values));
    expect(weight.basis).toBe('heart-rate');
    expect(weight.domain).toMatchObject({
      state: 'present',
      minutes: { moderate: 8, heavy: 9, severe: 40, extreme: 0 },
      load: 8 + 18 + 120,
    });
    // 179 s too short for a domain and 1 s nobody described.
    expect(weight.domain).toMatchObject({ unassignedMin: expect.closeTo(3, 9) });
  });

  it('give Edwards’ load where nearly all minutes have a heart rate', () => {
    // 95 bpm is half of 190: zone 1. 171 bpm is nine tenths: zone 5.
    const content = intervals(
      { repetitions: 1, durationS: 1800, heartRateBpm: 95 },
      { repetitions: 1, durationS: 1800, heartRateBpm: 171 },
    );
    const weight = weighSession(session({ content }), context(values));
    expect(weight.measures).toContainEqual(expect.objectContaining({ measure: 'edwards', value: 30 + 150 }));
    expect(used(weight)).toEqual(['lt1-heart-rate', 'lt2-heart-rate', 'max-heart-rate']);
    const short = intervals({ repetitions: 4, durationS: 600, heartRateBpm: 170, recoveryS: 300 });
    expect(weighSession(session({ content: short }), context(values)).measures).toContainEqual(
      expect.objectContaining({
        measure: 'edwards',
        value: null,
        reason: 'more than 10 % of the minutes have no heart rate',
      }),
    );
  });
});

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
