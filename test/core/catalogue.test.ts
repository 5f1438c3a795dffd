import { expect, test } from '@jest/globals';
import { catalogue } from '../../src/core/catalogue.ts';
import { NumericInputError } from '../../src/core/numeric-input-error.ts';

const run = (id: string, input: object): unknown => catalogue.find((method) => method.id === id)!.run(input);
const bounds = { lt1: 180, heavySevere: 240, extreme: null };
const gains = { k1: 1, k2: 2, tau1: 45, tau2: 15 };
const known = [0, 1, 2].map((day) => ({ day, state: 'known', value: 60 }));
const concernDay = { ratio: 1.6, chronic: 50, monotony: null, strain: null, muted: null, spike: null };

const marks = { inBaseline: true, judged: true };
const errors = { heartRateTypicalError: 3, ratingTypicalError: 0.7 };
const boutRow = { day: 3, id: 'b', key: 'easy', heartRateBpm: 140, rating: 3, ...errors, ...marks };
const minutes = { moderate: 60, heavy: 0, severe: 0, extreme: 0 };
const session = { day: 3, id: 's', modality: 'rowing', totalMin: 60, minutes, rating: 3, ...marks };
const relation = {
  ...{ status: 'converged', from: 0, to: 55, pairs: 20, modalities: ['rowing'], coefficients: [2, 0, 0, 0], sd: 1 },
  ...{ factor: { kept: [0], lower: [[4]] }, dependent: [] },
};

/** A fitting input of every method, and what it gives. */
const inputs: Readonly<Record<string, [object, unknown]>> = {
  'session-rating-load': [{ rating: 7, durationMin: 120 }, 840],
  'daily-sum': [{ loads: [840, 280] }, 1120],
  'monotony-population': [{ days: [0, 100, 200, 300, 400, 500, 600] }, 1.5],
  'monotony-sample': [{ days: [0, 100, 200, 300, 400, 500, null] }, NaN],
  strain: [{ weekLoad: 2100, monotony: 1.5 }, 3150],
  'domain-load': [{ minutes: { moderate: 40, heavy: 10, severe: 5, extreme: 0 } }, 75],
  'volume-load': [{ sets: [{ sets: 3, repetitions: 10, loadKg: 60 }] }, 1800],
  'clock-minutes': [{ clock: '72:59' }, 4379],
  'check-heart-rate': [{ heartRateBpm: 60 }, 60],
  'heart-rate-fraction': [{ heartRateBpm: 125, restingBpm: 50, maxBpm: 200 }, 0.5],
  'heart-rate-load-banister': [{ durationMin: 60, heartRateBpm: 60, restingBpm: 60, maxBpm: 190, sex: 'female' }, 0],
  'heart-rate-load-edwards': [{ zoneMinutes: [5, 10, 20, 15, 10] }, 195],
  'edwards-zone-edges': [{ maxBpm: 200 }, [100, 120, 140, 160, 180, 200]],
  'edwards-zone-minutes': [{ bouts: [{ durationMin: 5, heartRateBpm: 150 }], maxBpm: 200 }, [0, 0, 5, 0, 0]],
  'heart-rate-load-three-phase': [{ minutes: [10, 10, 10] }, 60],
  'phase-shares': [{ minutes: [30, 10] }, [0.75, 0.25]],
  'domain-of': [{ intensity: 200, bounds }, 'heavy'],
  'extreme-bound-cycling': [{ criticalPowerW: 200, wPrimeJ: 13_600 }, 300],
  'extreme-bound-running': [{ criticalSpeedMps: 4, dPrimeM: 206 }, 6],
  'time-in-domain-from-bouts': [
    { bouts: [{ durationMin: 5, intensity: 300 }], bounds },
    { moderate: 0, heavy: 0, severe: 5, extreme: 0 },
  ],
  'time-in-domain-from-heart-rate': [
    { bouts: [{ durationMin: 5, heartRateBpm: 140 }], bounds, options: { minimumBoutMin: 6 } },
    { minutes: { moderate: 0, heavy: 0, severe: 0, extreme: 0 }, unassignedMin: 5 },
  ],
  mean: [{ values: [1, 2, 3] }, 2],
  'standard-deviation-population': [{ values: [1, 3] }, 1],
  'standard-deviation-sample': [{ values: [2, 4, 6] }, 2],
  quantile: [{ values: [1, null, 2, 3], q: 0.25 }, 1.5],
  'quantile-sorted': [{ sorted: [1, 2, 3], q: 1 }, 3],
  median: [{ values: [3, null, 1] }, 2],
  'rolling-quantile': [{ values: [1, 2, 3], windowDays: 2, q: 1 }, [1, 2, 3]],
  'rolling-mean': [{ values: [1, null, 3], windowDays: 2, minKnown: 1 }, [NaN, 1, 3]],
  'known-days': [{ values: [1, null], windowDays: 7 }, [1, 1]],
  'smoothing-factor': [{ windowDays: 7 }, 0.25],
  'exponential-mean': [{ values: [300, 0], windowDays: 7, start: 'first' }, [300, 225]],
  'fill-unknown': [{ days: known }, { value: [60, 60, 60], low: [60, 60, 60], high: [60, 60, 60] }],
  'acute-chronic-coupled': [
    { days: [1, 3], options: { acuteDays: 1, chronicDays: 2 } },
    { acute: [1, 3], chronic: [NaN, 2], ratio: [NaN, 1.5] },
  ],
  'acute-chronic-uncoupled': [
    { days: [1, 3], options: { acuteDays: 1, chronicDays: 2 } },
    { acute: [1, 3], chronic: [NaN, 1], ratio: [NaN, 3] },
  ],
  'acute-chronic-exponential': [{ days: [60] }, { acute: [60], chronic: [60], ratio: [1] }],
  'coupled-from-uncoupled': [{ uncoupled: 2 }, 1.6],
  'uncoupled-from-coupled': [{ coupled: 2 }, 3],
  correlation: [{ x: [1, 2], y: [2, 1] }, -1],
  'impulse-component-exclusive': [{ loads: [], tauDays: 45, start: 3 }, [3]],
  'impulse-component-inclusive': [{ loads: [5], tauDays: 45 }, [5]],
  'impulse-response': [{ loads: [], parameters: { p0: 500, ...gains } }, [500]],
  'impulse-response-inclusive': [{ loads: [100], parameters: { p0: 500, ...gains } }, [400]],
  'impulse-response-convolution': [{ loads: [], parameters: { p0: 500, ...gains } }, [500]],
  'impulse-influence': [{ daysBefore: 0, gains }, -1],
  'time-to-recover': [{ ...gains, k2: 1 }, 0],
  'time-to-peak': [{ ...gains, k1: 3, k2: 1 }, 0],
  'gain-ratio-from-recovery': [{ tau1: 38, tau2: 19, timeToRecoverDays: 0 }, 1],
  'steady-state-sum-inclusive': [{ tauDays: 1 / Math.LN2 }, expect.closeTo(2, 9)],
  'steady-state-sum-exclusive': [{ tauDays: 1 / Math.LN2 }, expect.closeTo(1, 9)],
  'partial-sum-inclusive': [{ tauDays: 45, dayCount: 0 }, 0],
  'long-short-load': [{ days: known.slice(0, 0), options: { longDays: 42 } }, []],
  'load-concern': [
    { days: [{ ...concernDay, day: 3 }], firstDay: 0 },
    [expect.objectContaining({ since: 3, until: null, strongest: 'ratio' })],
  ],
  'session-spike-percent': [{ distanceKm: 15, longestBeforeKm: 10 }, 50],
  'spike-class': [{ percent: 50 }, 'moderate'],
  'log-gap': [{ days: [{ day: 1, state: 'unknown' }] }, []],
  'thresholds-out-of-date': [{ days: [{ day: 1, ageDays: null }] }, []],
  'return-phase': [{ days: [{ day: 1, unavailable: true, chronic: 5 }] }, [null]],
  'planned-overload-phase': [
    { day: 2, periods: [{ from: 1, to: 3 }] },
    { phase: 'within', dayN: 2, ofM: 3 },
  ],
  'primary-measure': [
    { days: [], options: { minKnown: 1 } },
    { measure: 'rating-load', reason: 'domain load is known on 0 of 0 days' },
  ],
  'coefficient-of-variation': [{ values: [1, 1] }, 0],
  rmssd: [{ intervalsMs: [800, 810, 800, null] }, 10],
  'ln-rmssd': [{ rmssdMs: 1 }, 0],
  'clean-rr-intervals': [{ intervalsMs: [800, 1600, 800] }, [800, NaN, 800]],
  'hooper-sum': [{ sleep: 1, fatigue: 2, stress: 3, soreness: 4 }, 10],
  'total-mood-disturbance': [
    { scores: { tension: 1, depression: 1, anger: 1, fatigue: 1, confusion: 1, vigour: 6 }, offset: 100 },
    99,
  ],
  'typical-error': [{ first: [1, 2], second: [2, 3] }, 0],
  'typical-error-percent': [{ first: [1, 2], second: [2, 4] }, 0],
  'limits-of-agreement': [{ typicalErrorOfOne: 0 }, 0],
  'smallest-worthwhile-change': [{ results: [10, 10] }, 0],
  'expected-result': [{ results: [1, 2, 3].map((day) => ({ day, value: 10 * day })), day: 18 }, 20],
  'deviation-in-typical-errors': [{ value: 294, expected: 302, typicalErrorOfOne: 4, higherIsBetter: 1 }, -2],
  'tabular-cusum': [
    { values: [1, 9], target: 0, slack: 1, limit: 4 },
    { high: [0, 8], low: [0, 0], signals: [1] },
  ],
  'ewma-chart': [{ values: [2, null], target: 0, weight: 0.5 }, [1, 1]],
  'ewma-limit': [{ sd: 2, weight: 1, width: 3, count: 1 }, 6],
  'average-run-length-cusum': [{ slack: 0.5, limit: 4, shift: 1 }, expect.closeTo(8.38, 2)],
  'average-run-length-ewma': [{ weight: 0.2, width: 2.962, shift: 1 }, expect.closeTo(10.54, 2)],
  'day-marks': [
    { days: [{ ill: false, returning: false, away: true, suspect: false, disputed: false }] },
    [{ inBaseline: false, judged: false, explained: true }],
  ],
  'own-baseline': [{ days: [{ day: 1, value: null, inBaseline: true, judged: true }], index: 0 }, null],
  'morning-signs': [
    { days: [{ day: 1, value: null, inBaseline: true, judged: true }], options: { spreads: 2 } },
    [expect.objectContaining({ day: 1, sign: null, raised: false })],
  ],
  'variability-half-width': [{ sd: 1, validDays: 4 }, 0.82],
  'variability-band': [
    { days: [{ day: 3, value: 4, inBaseline: true, judged: true }] },
    [expect.objectContaining({ week: expect.objectContaining({ validDays: 1 }), open: false })],
  ],
  'bout-verdict': [
    { bout: { heartRateBpm: 140, rating: 2, ...errors }, expected: { heartRateBpm: 140, rating: 4 } },
    'fitness',
  ],
  'standard-bouts': [{ bouts: [boutRow], from: 3, to: 3 }, [expect.objectContaining({ day: 3, measured: 0 })]],
  'criterion-evidence': [{ log: { results: [], bouts: [] }, day: 3, firstSign: 3, used: [] }, null],
  'overreaching-screen': [{ days: [{ day: 3, explained: false }], families: {}, results: [], bouts: [boutRow] }, []],
  'huber-regression': [
    { rows: [[1], [1], [1]], values: [1, 2, 3], options: { leastScale: 1 } },
    expect.objectContaining({ status: 'converged', coefficients: [expect.closeTo(2, 9)], weights: [1, 1, 1] }),
  ],
  'censored-mean': [{ bound: 0, centre: 0, sd: 1 }, expect.closeTo(Math.sqrt(2 / Math.PI), 9)],
  'rating-relation': [{ sessions: [session], day: 30 }, null],
  'expected-rating': [
    { relation, session: { modality: 'running', totalMin: 60, minutes: session.minutes } },
    { rating: NaN, spread: NaN },
  ],
  'effort-mismatch': [
    { sessions: [session], from: 3, to: 3, options: { weight: 0.1 } },
    [expect.objectContaining({ day: 3, sessions: [], sign: null })],
  ],
  'basis-mix-shift': [{ acute: { power: 5 }, chronic: { power: 5, speed: 5 } }, 50],
};

test('every method has a fitting input here', () => {
  expect(Object.keys(inputs).sort()).toEqual(catalogue.map(({ id }) => id).sort());
  expect(new Set(catalogue.map(({ name }) => name)).size).toBe(catalogue.length);
});

test.each(Object.entries(inputs))('%s runs on named inputs', (id, [input, expected]) => {
  expect(run(id, input)).toEqual(expected);
});

test.each(Object.entries(inputs))('%s refuses an input it does not know, and one that is missing', (id, [input]) => {
  expect(() => run(id, { ...input, colour: 'blue' })).toThrow(/colour = "blue", allowed: only /);
  const { inputs: wanted } = catalogue.find((method) => method.id === id)!;
  const [first] = wanted.filter(({ optional }) => optional !== true);
  const without = Object.fromEntries(Object.entries(input).filter(([name]) => name !== first!.name));
  expect(() => run(id, without)).toThrow(NumericInputError);
  expect(() => run(id, without)).toThrow(first!.name);
});

test('a wrong value inside a list or a row is named with its place', () => {
  expect(() => run('daily-sum', { loads: [1, 'x'] })).toThrow('loads[1] = "x", allowed: a number, or null for unknown');
  expect(() => run('fill-unknown', { days: [{ day: 1, state: 'rest', value: 0 }] })).toThrow('days[0].state = "rest"');
  expect(() => run('log-gap', { days: [{ day: 1, state: 'known', load: 3 }] })).toThrow('days[0].load = 3');
  expect(() => run('return-phase', { days: [{ day: 1, unavailable: 'yes', chronic: 1 }] })).toThrow('true or false');
  expect(() => run('basis-mix-shift', { acute: [], chronic: {} })).toThrow('acute = []');
  expect(() => run('mean', { values: 3 })).toThrow('a list');
  expect(() => run('acute-chronic-coupled', { days: [1], options: { acuteDays: null } })).toThrow('options.acuteDays');
  expect(() => run('mean', [])).toThrow('an object with named inputs');
});
