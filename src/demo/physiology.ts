import { addDays } from './days.ts';
import { between, wholeBetween } from './seeded.ts';
import { loadKey } from './cast.ts';
import type { ScenarioAthlete, ThresholdBatch, ThresholdEntry } from './scenario.types.ts';

/** What an athlete's test gave: the intensities every session is prescribed from. */
export interface Tested {
  rowing: Power & Heart;
  cycling: Power;
  running: Heart;
  restingBpm: number;
}

export interface Power {
  lt1W: number;
  lt2W: number;
  criticalW: number;
  wPrimeJ: number;
}

export interface Heart {
  lt1Bpm: number;
  lt2Bpm: number;
  maxBpm: number;
}

/** Days of the log (0 = the first Monday) on which the two tests count. */
export function testDays(athlete: ScenarioAthlete): { first: number; second: number | null } {
  if (athlete.roles.includes('stale-thresholds')) return { first: -3, second: null };
  // Tuesday of week 7, for some of week 6.
  return { first: -3, second: Number(loadKey(athlete).slice(-2)) % 4 === 2 ? 36 : 43 };
}

/** The values of the first or the second test. */
export function tested(scenario: number, athlete: ScenarioAthlete, test: 'first' | 'second'): Tested {
  const own = (low: number, high: number, what: string) => between(low, high, scenario, athlete.key, what);
  const gain = test === 'first' ? 1 : own(1.01, 1.03, 'gain');
  const criticalW = (athlete.sex === 'male' ? own(305, 365, 'critical') : own(215, 265, 'critical')) * gain;
  const lt1Share = own(0.62, 0.68, 'lt1');
  const wPrimeJ = Math.round(own(13_000, 19_000, 'w-prime') / 100) * 100;
  const power = (share: number): Power => ({
    lt1W: Math.round(criticalW * share * lt1Share),
    lt2W: Math.round(criticalW * share * 0.92),
    criticalW: Math.round(criticalW * share),
    wPrimeJ,
  });
  const maxBpm = wholeBetween(186, 201, scenario, athlete.key, 'max');
  const heart = (shift: number): Heart => ({
    lt1Bpm: Math.round(maxBpm * 0.76) + shift,
    lt2Bpm: Math.round(maxBpm * 0.89) + shift,
    maxBpm: maxBpm + shift,
  });
  return {
    rowing: { ...power(1), ...heart(0) },
    cycling: power(0.9),
    running: heart(2),
    restingBpm: wholeBetween(42, 55, scenario, athlete.key, 'resting'),
  };
}

/** The athlete's values on a day of the log, as the coach prescribes them. */
export function testedOn(scenario: number, athlete: ScenarioAthlete, dayIndex: number): Tested {
  const { second } = testDays(athlete);
  return tested(scenario, athlete, second !== null && dayIndex >= second ? 'second' : 'first');
}

/** What the manager enters for one athlete. */
export function thresholdBatches(scenario: number, athlete: ScenarioAthlete, firstDay: string): ThresholdBatch[] {
  const days = testDays(athlete);
  const batch = (test: 'first' | 'second', dayIndex: number): ThresholdBatch => ({
    athlete: athlete.key,
    late: test === 'second' && athlete.roles.includes('late-threshold'),
    values: entries(tested(scenario, athlete, test), addDays(firstDay, dayIndex)),
  });
  const first = batch('first', days.first);
  return days.second === null ? [first] : [first, batch('second', days.second)];
}

function entries(test: Tested, validFrom: string): ThresholdEntry[] {
  const step = 'step test, lactate';
  const efforts = 'three maximal efforts';
  const power = (modality: string, { lt1W, lt2W, criticalW, wPrimeJ }: Power): ThresholdEntry[] =>
    [
      { quantity: 'lt1-power', value: lt1W, standardError: 5, method: step },
      { quantity: 'lt2-power', value: lt2W, standardError: 6, method: step },
      { quantity: 'critical-power', value: criticalW, standardError: 4, method: efforts },
      { quantity: 'w-prime', value: wPrimeJ, standardError: 1200, method: efforts },
    ].map((entry) => ({ ...entry, modality, setting: 'ergometer', validFrom }));
  const heart = (modality: string, { lt1Bpm, lt2Bpm, maxBpm }: Heart): ThresholdEntry[] =>
    [
      { quantity: 'lt1-heart-rate', value: lt1Bpm, standardError: 2, method: step },
      { quantity: 'lt2-heart-rate', value: lt2Bpm, standardError: 2, method: step },
      { quantity: 'max-heart-rate', value: maxBpm, method: 'highest of the test' },
    ].map((entry) => ({ ...entry, modality, validFrom }));
  return [
    ...power('rowing', test.rowing),
    ...heart('rowing', test.rowing),
    ...power('cycling', test.cycling),
    ...heart('running', test.running),
    { quantity: 'resting-heart-rate', value: test.restingBpm, method: 'on waking, lying', validFrom },
  ];
}
