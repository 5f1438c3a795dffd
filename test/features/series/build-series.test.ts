import { describe, expect, test } from '@jest/globals';
import { dayNumber, isoDay } from '../../../src/core/series/day.ts';
import type { DayRecord } from '../../../src/features/days/days.types.ts';
import { defaultSettings } from '../../../src/features/policies/default-settings.ts';
import { buildSeries } from '../../../src/features/series/build-series.ts';
import { dayOf } from '../../reports/invented-squad.ts';

// 2026-08-31 is a Monday. All expected numbers were worked out by hand from the loads given here.
const MONDAY = dayNumber('2026-08-31');

/** A day with this domain load (all minutes moderate, weight 1) and twice as much rating load; null: not known. */
function loadDay(index: number, load: number | null, changes: Partial<DayRecord> = {}): DayRecord {
  const state = load === null ? 'unknown' : 'known';
  return dayOf(isoDay(MONDAY + index), load, {
    domain: { state, value: load ?? NaN },
    rating: { state, value: load === null ? NaN : 2 * load },
    ...changes,
  });
}

const log = (loads: readonly (number | null)[]) => loads.map((load, index) => loadDay(index, load));
const constant = (days: number, load: number): number[] => Array.from({ length: days }, () => load);
const last = (records: DayRecord[], settings = defaultSettings) => {
  const series = buildSeries('a', records, settings);
  return { series, row: series.rows.at(-1)! };
};

describe('windows and floors', () => {
  test('acute, chronic and ratio of 21 days at 100 and 7 at 200: 200, (2100 + 1400) ÷ 28 = 125, 1.6', () => {
    const { row } = last(log([...constant(21, 100), ...constant(7, 200)]));
    expect(row).toMatchObject({ acute: 200, chronic: 125 });
    expect(row.ratio).toMatchObject({
      form: 'rolling-coupled',
      value: 1.6,
      knownDays: { acute: 7, acuteOf: 7, chronic: 28, chronicOf: 28 },
    });
    expect(row.ratio.withheld).toBeUndefined();
  });

  test('one unknown day of 7 divides by the six known ones; two withhold, and say so', () => {
    const one = last(log([...constant(21, 100), 200, 200, null, 200, 200, 200, 200])).row;
    expect(one.acute).toBe(200);
    expect(one.chronic).toBeCloseTo((2100 + 1200) / 27, 12);
    expect(one.monotony).toBeNull();
    expect(one.withheld).toEqual({
      monotony: '6 of 7 days known',
      strain: '6 of 7 days known',
      longLoad: '27 of 56 days in',
      shortLoad: '27 of 56 days in',
    });
    const two = last(log([...constant(21, 100), 200, 200, null, null, 200, 200, 200])).row;
    expect(two.acute).toBeNull();
    expect(two.ratio).toMatchObject({ value: null, withheld: '5 of 7 days known' });
    expect(two.chronic).toBeCloseTo((2100 + 1000) / 26, 12);
  });

  test('24 of 28 known days carry a chronic load, 23 do not', () => {
    const gaps = (n: number) => log([...Array.from({ length: n }, () => null), ...constant(28 - n, 100)]);
    // The log begins with known days so that the gap lies inside it.
    expect(last([...gaps(4)]).row.chronic).toBe(100);
    expect(last([...gaps(5)]).row).toMatchObject({ chronic: null, ratio: { withheld: '23 of 28 days known' } });
  });

  test('a partial day counts as unknown for the floor and is shown as a lower bound', () => {
    const records = log(constant(28, 100));
    records[27] = loadDay(27, 40, { domain: { state: 'partial', value: 40 }, completeness: 'partial' });
    const { row } = last(records);
    expect(row.domain).toEqual({ state: 'partial', value: 40 });
    expect(row.acute).toBe(100);
    expect(row.ratio.knownDays).toMatchObject({ acute: 6, chronic: 27 });
    expect(row.withheld.monotony).toBe('6 of 7 days known');
  });

  test('an unknown day is never 0: it has no value at all', () => {
    const { row } = last(log([...constant(27, 100), null]));
    expect(row.domain).toEqual({ state: 'unknown', value: null });
  });

  test('rest for four weeks: no ratio, because there is nothing to divide by', () => {
    const { row } = last(log(constant(28, 0)));
    expect(row).toMatchObject({ acute: 0, chronic: 0, ratio: { value: null, withheld: 'no load in 28 days' } });
    expect(row.withheld.monotony).toBe('seven days of rest');
  });

  test('a log of 27 known days has no chronic window yet', () => {
    expect(last(log(constant(27, 100))).row.ratio.withheld).toBe('27 of 28 days in');
  });
});

describe('forms and standard deviations of the policy', () => {
  test('uncoupled: 200 ÷ mean of the 21 days before = 2, floor 18 of 21', () => {
    const settings = { ...defaultSettings, ratio: { form: 'rolling-uncoupled' as const, upper: 1.8 } };
    const { row } = last(log([...constant(21, 100), ...constant(7, 200)]), settings);
    expect(row.ratio).toMatchObject({ value: 2, knownDays: { chronic: 21, chronicOf: 21 } });
    const thin = log([...constant(21, 100), ...constant(7, 200)]);
    for (const index of [3, 4, 5, 6]) thin[index] = loadDay(index, null);
    expect(last(thin, settings).row.ratio.withheld).toBe('17 of 21 days known');
  });

  test.each([1, 4])(
    'exponential: starts from the first known load, %d unknown days before it change nothing',
    (gap) => {
      const settings = { ...defaultSettings, ratio: { form: 'exponential' as const, upper: 1.5 } };
      const unknown = Array.from({ length: gap }, () => null);
      const { ratio } = last(log([...unknown, ...constant(34, 100)]), settings).row;
      expect([ratio.value, ratio.low, ratio.high].map((value) => value?.toFixed(9))).toEqual([
        '1.000000000',
        '1.000000000',
        '1.000000000',
      ]);
    },
  );

  test('exponential: bounds open at an unknown day, equal without one', () => {
    const settings = { ...defaultSettings, ratio: { form: 'exponential' as const, upper: 1.5 } };
    const whole = last(log(constant(35, 100)), settings).row.ratio;
    expect(whole).toMatchObject({ value: 1, low: 1, high: 1 });
    const records = log(constant(35, 100));
    records[33] = loadDay(33, null);
    const open = last(records, settings).row.ratio;
    expect(open.value).toBeCloseTo(1, 12);
    // Rest on that day: 100·(1 − λ₇·(1−λ₇)) ÷ 100·(1 − λ₂₈·(1−λ₂₈)), λ₇ = 2/8, λ₂₈ = 2/29.
    expect(open.low).toBeCloseTo((1 - 0.25 * 0.75) / (1 - (2 / 29) * (27 / 29)), 12);
    expect(open.high).toBeCloseTo(1, 12);
  });

  test('monotony of 0, 100, …, 600: 300 ÷ 200 = 1.5 by population, 1.3887301 by sample', () => {
    const week = log([...constant(21, 100), 0, 100, 200, 300, 400, 500, 600]);
    const population = last(week).row;
    expect(population.monotony).toBeCloseTo(1.5, 12);
    expect(population.strain).toBeCloseTo(2100 * 1.5, 9);
    const sample = last(week, { ...defaultSettings, monotony: { sd: 'sample', upper: 2 } }).row;
    expect(sample.monotony).toBeCloseTo(1.3887301, 7);
  });

  test('seven equal days have no monotony', () => {
    expect(last(log(constant(28, 100))).row.withheld.monotony).toBe('all seven days alike');
  });
});

describe('primary measure', () => {
  test('domain load from 24 known days of the 28 up to the last Sunday; its loads drive the figures', () => {
    const { series, row } = last(log(constant(28, 100)));
    expect(series.measure).toBe('domain-load');
    expect(row.acute).toBe(100);
  });

  test('a log that is four days short of a fifth Sunday: rating load, twice as large here, with the reason', () => {
    const { series, row } = last(log(constant(27, 100)));
    expect(series).toMatchObject({ measure: 'rating-load', measureReason: 'domain load is known on 21 of 28 days' });
    expect(row.acute).toBe(200);
  });

  test('decided on the last Sunday: what the days after it lack changes nothing until the next one', () => {
    const records = log(constant(34, 100));
    for (const index of [28, 29, 30, 31, 32, 33]) {
      records[index] = loadDay(index, 100, { domain: { state: 'partial', value: 0 }, coveredMin: 0 });
    }
    expect(buildSeries('a', records, defaultSettings).measure).toBe('domain-load');
    const sunday = [...records, loadDay(34, 100, { domain: { state: 'partial', value: 0 }, coveredMin: 0 })];
    expect(buildSeries('a', sunday, defaultSettings).measure).toBe('rating-load');
  });

  test('79 % of the minutes in domain are too few, 80 % are enough', () => {
    const share = (covered: number) =>
      constant(28, 100).map((load, index) => loadDay(index, load, { coveredMin: covered }));
    expect(buildSeries('a', share(79), defaultSettings).measure).toBe('rating-load');
    expect(buildSeries('a', share(80), defaultSettings).measure).toBe('domain-load');
  });

  test('the policy can choose rating load for good', () => {
    const settings = { ...defaultSettings, primaryMeasure: 'rating-load' as const };
    const { series } = last(log(constant(28, 100)), settings);
    expect(series).toMatchObject({ measure: 'rating-load', measureReason: "the squad's policy says so" });
  });
});

describe('one series, one basis', () => {
  test('a week counted from heart rate after three weeks of intervals: 75 points apart, ratio withheld', () => {
    const records = constant(28, 100).map((load, index) =>
      loadDay(index, load, { basisMinutes: index < 21 ? { interval: 60 } : { 'heart-rate': 60 } }),
    );
    const { ratio } = last(records).row;
    expect(ratio.value).toBeNull();
    expect(ratio.withheld).toBe('minutes counted another way (75 points)');
    expect(ratio.basisMix).toEqual({ acute: { 'heart-rate': 100 }, chronic: { interval: 75, 'heart-rate': 25 } });
  });

  test('25 points are still shown', () => {
    // Acute 7 × 60 min, one third of them from heart rate; chronic 28 × 60 min, one twelfth: 25 points exactly.
    const records = constant(28, 100).map((load, index) =>
      loadDay(index, load, { basisMinutes: index < 21 ? { interval: 60 } : { interval: 40, 'heart-rate': 20 } }),
    );
    expect(last(records).row.ratio).toMatchObject({ value: 1 });
  });
});

describe('long and short load, read in the morning', () => {
  test('they start at 0 in a short log; the row of a day does not hold its load, the morning after does', () => {
    const { series } = last(log([100]));
    expect(series.rows[0]!.longLoad).toMatchObject({ units: null, withheld: 'first day of the log' });
    expect(series.after.day).toBe('2026-09-01');
    expect(series.after.longLoad.units).toBeCloseTo(200 * Math.exp(-1 / 45), 12);
    expect(series.after.shortLoad.units).toBeCloseTo(200 * Math.exp(-1 / 15), 12);
    expect(series.after.longLoad).toMatchObject({ share: null, withheld: '1 of 56 days in' });
  });

  test('56 days at one load read 100 % of the own median, with equal bounds', () => {
    const { after } = last(log(constant(56, 100))).series;
    for (const reading of [after.longLoad, after.shortLoad]) {
      for (const value of [reading.share, reading.shareLow, reading.shareHigh]) expect(value).toBeCloseTo(100, 9);
      expect(reading.withheld).toBeUndefined();
    }
  });
});

describe('return after time out', () => {
  test('the ratio is withheld with the day of return; load is compared with before', () => {
    const records = [
      ...log(constant(28, 100)),
      ...[28, 29, 30, 31, 32, 33].map((index) => loadDay(index, 0, { availability: 'none' })),
      ...[34, 35].map((index) => loadDay(index, 10)),
    ];
    const { row } = last(records);
    expect(row.ratio).toMatchObject({ value: null, withheld: 'day 2 of return' });
    // Chronic: 20 days at 100, six at 0, two at 10 = 2020 ÷ 28, against 100 before.
    expect(row.returning).toEqual({ dayN: 2, share: expect.closeTo(2020 / 28, 9) });
  });

  test('back at 80 % of before it ends; merely away is no time out', () => {
    const spell = (changes: Partial<DayRecord>) => [
      ...log(constant(28, 100)),
      ...[28, 29, 30].map((index) => loadDay(index, 0, changes)),
      loadDay(31, 100),
    ];
    expect(last(spell({ availability: 'none' })).row.returning).toBeNull();
    expect(last(spell({ availability: 'none', away: true })).row.returning).toBeNull();
  });
});
