import { expect, test } from '@jest/globals';
import type { Episode, LoadConcernDay } from '../../src/core/types.ts';
import { loadConcern } from '../../src/core/flags/load-concern.ts';
import { NumericInputError } from '../../src/core/numeric-input-error.ts';
import { FIRST, mute, quietDays, ratioDays, repeat } from './flag-days.ts';

const concern = (days: LoadConcernDay[], firstDay = FIRST): Episode[] => loadConcern({ days, firstDay });
const spans = (days: LoadConcernDay[], firstDay = FIRST): (number | null)[][] =>
  concern(days, firstDay).map(({ since, until }) => [since - FIRST, until === null ? null : until - FIRST]);
/** A log that began half a year before the first of the days. */
const OLD_LOG = FIRST - 182;

test('a constant load is no concern, however long and however large', () => {
  expect(concern(quietDays(400))).toEqual([]);
  expect(concern(quietDays(400, () => ({ chronic: 5000, strain: 90_000 })))).toEqual([]);
});

test('ratio: above 1.5 raises, 1.5 itself does not', () => {
  expect(spans(ratioDays(1, 1.5, 1))).toEqual([]);
  expect(spans(ratioDays(1, 1.501))).toEqual([[1, null]]);
});

test('ratio: clears on the third judged day in a row at or under 95 % of the limit', () => {
  expect(spans(ratioDays(1.6, 1.4249, 1.4249, 1.4249, 1))).toEqual([[0, 3]]);
  expect(spans(ratioDays(1.6, 1.4, 1.4, 1.43, 1.4, 1.4))).toEqual([[0, null]]);
  expect(spans(ratioDays(1.6, 1.4, 1.4, 1.43, 1.4, 1.4, 1.4))).toEqual([[0, 6]]);
});

test('ratio: days without a value neither raise, clear nor reset', () => {
  expect(spans(ratioDays(NaN, NaN))).toEqual([]);
  expect(spans(ratioDays(1.6, NaN, NaN, NaN, NaN))).toEqual([[0, null]]);
  expect(spans(ratioDays(1.6, 1.4, NaN, 1.4, NaN, 1.4))).toEqual([[0, 5]]);
  const [episode] = concern(ratioDays(1.6, 1.55, NaN, NaN));
  expect(episode!.evidence[0]).toMatchObject({ value: 1.55, day: FIRST + 1, since: FIRST });
});

test('ratio: a short history leaves 1.5 alone and says so; 56 days of log bring the own upper end', () => {
  const [short] = concern(ratioDays(...repeat(54, 1), 1.6));
  expect(short!.evidence).toEqual([
    { measure: 'ratio', value: 1.6, limit: 1.5, day: FIRST + 54, since: FIRST + 54, until: null, shortHistory: true },
  ]);
  const [long] = concern(ratioDays(...repeat(55, 1), 1.6));
  expect(long!.evidence[0]).toEqual({
    measure: 'ratio',
    value: 1.6,
    limit: 1.5,
    day: FIRST + 55,
    since: FIRST + 55,
    until: null,
  });
});

test('ratio: an athlete whose own upper end is higher is measured by it', () => {
  const ups = Array.from({ length: 100 }, (_, index) => (index % 10 === 0 ? 1.9 : 1));
  const days = ratioDays(...ups, 1.85).map((one, index) => (index < 100 ? { ...one, muted: 'return' as const } : one));
  expect(concern(days, OLD_LOG)).toEqual([]);
  const [episode] = concern([...days.slice(0, 100), { ...days[100]!, ratio: 1.95 }], OLD_LOG);
  expect(episode!.evidence[0]!.limit).toBeCloseTo(1.9, 9);
});

test('ratio: the days of the acute window do not raise the bar they are measured by', () => {
  const calm = repeat(60, 1);
  expect(spans(ratioDays(...calm, 1.6, 1.7, 1.8, 1.9, 1.9, 1.9, 1.9), OLD_LOG)).toEqual([[60, null]]);
  const [episode] = concern(ratioDays(...calm, 1.6, 1.7, 1.8, 1.9, 1.9, 1.9, 1.9), OLD_LOG);
  expect(episode!.evidence[0]!.limit).toBe(1.5);
});

test('low chronic load: below half of the own median from 56 days of log on', () => {
  const drop = (length: number, chronic: number): LoadConcernDay[] =>
    quietDays(length + 1, (index) => (index === length ? { chronic } : {}));
  expect(spans(drop(55, 49))).toEqual([[55, null]]);
  expect(spans(drop(54, 49))).toEqual([]);
  expect(spans(drop(55, 50))).toEqual([]);
  const [episode] = concern(drop(60, 40));
  expect(episode).toMatchObject({ strongest: 'chronic-low', evidence: [{ value: 40, limit: 50 }] });
});

test('low chronic load: clears on the third day at or above the limit ÷ 0.95', () => {
  const after = (...values: number[]): LoadConcernDay[] =>
    quietDays(100 + values.length, (index) => (index >= 100 ? { chronic: values[index - 100]! } : {}));
  expect(spans(after(40, 53, 53, 53))).toEqual([[100, 103]]);
  expect(spans(after(40, 52, 52, 52))).toEqual([[100, null]]);
});

test.each(['unload', 'taper', 'return', 'planned-overload'] as const)(
  'low chronic load says nothing in %s, and closes on its first day',
  (muted) => {
    const days = quietDays(110, (index) => (index >= 100 ? { chronic: 30 } : {}));
    expect(spans(days)).toEqual([[100, null]]);
    expect(spans(mute(days, 100, 109, muted))).toEqual([]);
    expect(spans(mute(days, 104, 109, muted))).toEqual([[100, 104]]);
  },
);

test('without training because unavailable nothing is raised; what is open ends on the third day of it', () => {
  const ratios = ratioDays(...repeat(12, 1.8));
  expect(spans(mute(ratios, 0, 11, 'unavailable'))).toEqual([]);
  expect(spans(mute(ratios, 4, 5, 'unavailable'))).toEqual([[0, null]]);
  expect(spans(mute(ratios, 4, 6, 'unavailable'))).toEqual([
    [0, 6],
    [7, null],
  ]);
  expect(spans(mute(mute(ratios, 3, 4, 'unavailable'), 6, 7, 'unavailable'))).toEqual([[0, null]]);
  const low = quietDays(110, (index) => (index >= 100 ? { chronic: 30 } : {}));
  expect(spans(mute(low, 104, 105, 'unavailable'))).toEqual([[100, null]]);
  expect(spans(mute(low, 104, 109, 'unavailable'))).toEqual([[100, 106]]);
});

test.each(['planned-overload', 'return'] as const)('the ratio says nothing in %s', (muted) => {
  const days = ratioDays(...repeat(10, 1.8));
  expect(spans(mute(days, 0, 9, muted))).toEqual([]);
  expect(spans(mute(days, 4, 6, muted))).toEqual([
    [0, 4],
    [7, null],
  ]);
});

test.each(['taper', 'unload'] as const)('the ratio speaks in %s', (muted) => {
  expect(spans(mute(ratioDays(...repeat(10, 1.8)), 0, 9, muted))).toEqual([[0, null]]);
});

/** Weeks with this monotony and strain on every day of them. */
function weeks(...figures: [monotony: number, strain: number][]): LoadConcernDay[] {
  return quietDays(7 * figures.length, (index) => {
    const [monotony, strain] = figures[Math.floor(index / 7)]!;
    return { monotony, strain };
  });
}

const sixWeeks: [number, number][] = [700, 900, 800, 850, 750, 820].map((strain) => [1.5, strain]);

test('monotony and strain: judged on Sundays only, with six blocks before, both above', () => {
  expect(spans(weeks(...sixWeeks, [2.1, 901]))).toEqual([[48, null]]);
  expect(spans(weeks(...sixWeeks, [2.1, 900]))).toEqual([]);
  expect(spans(weeks(...sixWeeks, [2, 2000]))).toEqual([]);
  expect(spans(weeks(...sixWeeks.slice(1), [2.1, 901]))).toEqual([]);
  expect(spans(weeks(...sixWeeks, [2.1, 901]).slice(0, 48))).toEqual([]);
  const [episode] = concern(weeks(...sixWeeks, [2.1, 1000]));
  expect(episode!.evidence).toEqual([
    {
      measure: 'monotony-strain',
      value: 2.1,
      limit: 2,
      day: FIRST + 48,
      since: FIRST + 48,
      until: null,
      strain: 1000,
      strainLimit: 900,
    },
  ]);
});

test('monotony and strain: cleared on the next judged Sunday with one of them at 95 % of its limit', () => {
  expect(spans(weeks(...sixWeeks, [2.1, 1000], [2.1, 950]))).toEqual([[48, 55]]);
  expect(spans(weeks(...sixWeeks, [2.1, 1000], [1.9, 2000]))).toEqual([[48, 55]]);
  expect(spans(weeks(...sixWeeks, [2.1, 1000], [2.1, 960]))).toEqual([[48, null]]);
  expect(spans(weeks(...sixWeeks, [2.1, 1000], [NaN, NaN], [1, 500]))).toEqual([[48, 62]]);
});

test('monotony and strain: unknown Sundays are skipped among the six before', () => {
  expect(spans(weeks(...sixWeeks, [NaN, NaN], [2.1, 901]))).toEqual([[55, null]]);
  expect(spans(weeks(...sixWeeks.slice(1), [NaN, NaN], [2.1, 901]))).toEqual([]);
  expect(spans(mute(weeks(...sixWeeks, [2.1, 901]), 48, 48, 'return'))).toEqual([]);
});

const spiked = (percent: number, ...at: number[]): LoadConcernDay[] =>
  quietDays(20, (index) => (at.includes(index) ? { spike: { percent, sessionId: `run-${index}` } } : {}));

// Frandsen JSB et al. 2025, Br J Sports Med 59(17):1203–1210: above 10 %, above 30 %, above 100 %.
test('spike: above 10 %, for seven days from the newest', () => {
  expect(spans(spiked(10, 3))).toEqual([]);
  expect(spans(spiked(10.1, 3))).toEqual([[3, 10]]);
  expect(spans(spiked(40, 3, 8))).toEqual([[3, 15]]);
  expect(spans(spiked(40, 3, 10))).toEqual([[3, 17]]);
  const [episode] = concern(spiked(130, 15));
  expect(episode!.evidence[0]).toMatchObject({ spikeClass: 'large', sessionId: 'run-15', value: 130, limit: 10 });
});

test('spike: only planned overload mutes it', () => {
  expect(spans(mute(spiked(40, 3), 0, 19, 'planned-overload'))).toEqual([]);
  expect(spans(mute(spiked(40, 3), 5, 19, 'planned-overload'))).toEqual([[3, 5]]);
  expect(spans(mute(spiked(40, 3), 0, 19, 'return'))).toEqual([[3, 10]]);
});

test('measures that overlap or meet are one episode; a day between them makes two', () => {
  const both = (from: number): LoadConcernDay[] =>
    spiked(40, 3).map((one, index) => ({ ...one, ratio: index >= from ? 1.6 : 1 }));
  expect(spans(both(8))).toEqual([[3, null]]);
  expect(spans(both(10))).toEqual([[3, null]]);
  expect(spans(both(11))).toEqual([
    [3, 10],
    [11, null],
  ]);
  const [episode] = concern(both(8));
  expect(episode!.evidence.map(({ measure, since, until }) => [measure, since - FIRST, until])).toEqual([
    ['spike', 3, FIRST + 10],
    ['ratio', 8, null],
  ]);
  expect(episode!.strongest).toBe('ratio');
});

test('the strongest of the measures that stand is the one furthest above its limit', () => {
  const days = (ratio: number): LoadConcernDay[] => spiked(40, 18).map((one) => ({ ...one, ratio }));
  // 140 ÷ 110 = 1.27 against ratio ÷ 1.5.
  expect(concern(days(1.6))[0]!.strongest).toBe('spike');
  expect(concern(days(2))[0]!.strongest).toBe('ratio');
});

test('settings move the limits; days out of order and wrong settings are refused', () => {
  expect(loadConcern({ days: ratioDays(1.4), firstDay: FIRST }, { ratioLimit: 1.3 })).toHaveLength(1);
  expect(() => loadConcern({ days: ratioDays(1), firstDay: FIRST }, { ratioLimit: 0 })).toThrow(NumericInputError);
  expect(() => concern([...ratioDays(1), ...ratioDays(1)])).toThrow(NumericInputError);
});
