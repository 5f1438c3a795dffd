import { describe, expect, it } from '@jest/globals';
import type { Weighable } from '../../../src/features/sessions/weighing/weigh-domain.ts';
import { weighSession } from '../../../src/features/sessions/weighing/weigh-session.ts';
import { context, intervals, policy, session, set, used } from './support/weighing.ts';

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
