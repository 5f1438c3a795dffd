import { describe, expect, it } from '@jest/globals';
import type { Weighable } from '../../../src/features/sessions/weighing/weigh-domain.ts';
import { weighSession } from '../../../src/features/sessions/weighing/weigh-session.ts';
import { context, intervals, session, used } from './support/weighing.ts';

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
