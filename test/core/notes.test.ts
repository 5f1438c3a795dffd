import { expect, test } from '@jest/globals';
import fc from 'fast-check';
import type { DayState } from '../../src/core/types.ts';
import { basisMixShift } from '../../src/core/flags/basis-mix-shift.ts';
import { logGap } from '../../src/core/flags/log-gap.ts';
import { plannedOverloadPhase } from '../../src/core/flags/planned-overload-phase.ts';
import { primaryMeasure } from '../../src/core/flags/primary-measure.ts';
import { returnPhase } from '../../src/core/flags/return-phase.ts';
import { sessionSpikePercent, spikeClass } from '../../src/core/flags/session-spike.ts';
import { thresholdsOutOfDate } from '../../src/core/flags/thresholds-out-of-date.ts';
import { NumericInputError } from '../../src/core/numeric-input-error.ts';

/** k known, p partial, u unknown, one letter a day. */
const states = (letters: string): { day: number; state: DayState }[] =>
  [...letters].map((letter, day) => ({
    day,
    state: letter === 'k' ? 'known' : letter === 'p' ? 'partial' : 'unknown',
  }));
const gaps = (letters: string): (number | null)[][] =>
  logGap(states(letters)).map(({ since, until }) => [since, until]);

test('log gap: fewer than 6 of 7 from the seventh day on, partial days not counted', () => {
  expect(gaps('kkkkkku')).toEqual([]);
  expect(gaps('kkkkkuu')).toEqual([[6, null]]);
  expect(gaps('kkkkkup')).toEqual([[6, null]]);
  expect(gaps('uuuuuu')).toEqual([]);
});

test('log gap: clears on the third day in a row with 6 of 7', () => {
  expect(gaps('kkkkkuukkkkkkk')).toEqual([[6, null]]);
  expect(logGap(states('kkkkkuukkkkkkkk'))).toEqual([{ since: 6, until: 14, evidence: { known: 7, of: 7, day: 13 } }]);
});

test('log gap: a day sees only data up to it', () => {
  fc.assert(
    fc.property(fc.array(fc.constantFrom('k', 'k', 'k', 'p', 'u'), { maxLength: 60 }), fc.nat(60), (letters, cut) => {
      const whole = logGap(states(letters.join('')));
      const part = logGap(states(letters.slice(0, cut).join('')));
      expect(part.map(({ since }) => since)).toEqual(whole.map(({ since }) => since).filter((since) => since < cut));
      part.forEach((stretch, index) => {
        if (stretch.until !== null) expect(stretch).toEqual(whole[index]);
      });
    }),
  );
});

test('thresholds out of date: above 56 days, cleared at once, nothing where nothing is used', () => {
  const ages = (...values: number[]): unknown[] =>
    thresholdsOutOfDate(values.map((ageDays, day) => ({ day, ageDays }))).map(({ since, until }) => [since, until]);
  expect(ages(55, 56)).toEqual([]);
  expect(ages(56, 57, 58, 2, 57)).toEqual([
    [1, 3],
    [4, null],
  ]);
  expect(ages(NaN, 60, NaN)).toEqual([[1, 2]]);
  expect(thresholdsOutOfDate([{ day: 0, ageDays: 30 }], { maxAgeDays: 28 })).toEqual([
    { since: 0, until: null, evidence: { ageDays: 30, limit: 28, day: 0 } },
  ]);
});

/** Chronic loads by day; an x marks a day unavailable. */
const back = (...days: (number | [number, 'x'])[]): unknown[] =>
  returnPhase(
    days.map((one, day) => ({
      day,
      unavailable: typeof one !== 'number',
      chronic: typeof one === 'number' ? one : one[0],
    })),
  ).map((phase) => (phase === null ? null : [phase.dayN, phase.share]));

test('return: from the first day back until 80 % of the load before', () => {
  expect(back(100, [90, 'x'], [80, 'x'], [70, 'x'], 60, 70, 79, 80, 60)).toEqual([
    ...[null, null, null, null],
    ...[
      [1, 60],
      [2, 70],
      [3, 79],
    ],
    ...[null, null],
  ]);
});

test('return: two days away are none; still at 80 % is none', () => {
  expect(back(100, [50, 'x'], [50, 'x'], 50)).toEqual([null, null, null, null]);
  expect(back(100, [90, 'x'], [90, 'x'], [90, 'x'], 85)).toEqual([null, null, null, null, null]);
});

test('return: a further spell keeps the first comparison, a short one keeps the count', () => {
  const spell: [number, 'x'][] = [
    [70, 'x'],
    [60, 'x'],
    [50, 'x'],
  ];
  expect(back(100, ...spell, 50, ...spell, 50).at(-1)).toEqual([1, 50]);
  expect(back(100, ...spell, 50, [50, 'x'], 50).at(-1)).toEqual([3, 50]);
});

test('return: without a known load before, 28 days', () => {
  const away: [number, 'x'][] = [
    [NaN, 'x'],
    [NaN, 'x'],
    [NaN, 'x'],
  ];
  const result = back(NaN, ...away, ...Array<number>(30).fill(70));
  expect(result.slice(4, 6)).toEqual([
    [1, NaN],
    [2, NaN],
  ]);
  expect(result.slice(30)).toEqual([[27, NaN], [28, NaN], null, null]);
  expect(back(...away, 10)[3]).toEqual([1, NaN]);
});

test('planned overload: within, then fourteen days of recovery, then nothing', () => {
  const periods = [{ from: 10, to: 19 }];
  const at = (day: number): unknown => plannedOverloadPhase(day, periods);
  expect([at(9), at(34)]).toEqual([null, null]);
  expect(at(10)).toEqual({ phase: 'within', dayN: 1, ofM: 10 });
  expect(at(19)).toEqual({ phase: 'within', dayN: 10, ofM: 10 });
  expect(at(20)).toEqual({ phase: 'recovering', dayN: 1, of: 14 });
  expect(at(33)).toEqual({ phase: 'recovering', dayN: 14, of: 14 });
  expect(plannedOverloadPhase(25, [...periods, { from: 25, to: 30 }])).toMatchObject({ phase: 'within', dayN: 1 });
});

test('planned overload: 21 days are the most, and a period ends after it begins', () => {
  expect(plannedOverloadPhase(1, [{ from: 1, to: 21 }])).toMatchObject({ ofM: 21 });
  expect(() => plannedOverloadPhase(1, [{ from: 1, to: 22 }])).toThrow(NumericInputError);
  expect(() => plannedOverloadPhase(1, [{ from: 2, to: 1 }])).toThrow(NumericInputError);
});

const month = (known: number, domainMinutes: number): { domain: DayState; minutes: number; domainMinutes: number }[] =>
  Array.from({ length: 28 }, (_, day) => ({ domain: day < known ? 'known' : 'partial', minutes: 100, domainMinutes }));

test('primary measure: 24 known days and 80 % of the minutes carry domain load, one less does not', () => {
  expect(primaryMeasure(month(24, 80)).measure).toBe('domain-load');
  expect(primaryMeasure(month(23, 100))).toEqual({
    measure: 'rating-load',
    reason: 'domain load is known on 23 of 28 days',
  });
  expect(primaryMeasure(month(28, 79))).toMatchObject({
    measure: 'rating-load',
    reason: '79 % of the minutes, strength and games left out, have minutes in domain',
  });
  const strengthOnly = month(28, 0).map((day) => ({ ...day, minutes: 0 }));
  expect(primaryMeasure(strengthOnly).measure).toBe('domain-load');
  expect(() => primaryMeasure(month(28, 101))).toThrow(NumericInputError);
});

test('basis mix: shares of minutes, not minutes; unknown without minutes', () => {
  expect(basisMixShift({ power: 60 }, { power: 600 })).toBe(0);
  expect(basisMixShift({ power: 75, 'heart-rate': 25 }, { power: 1000 })).toBe(25);
  expect(basisMixShift({ power: 74, 'heart-rate': 26 }, { power: 1000 })).toBe(26);
  expect(basisMixShift({ power: 60 }, { speed: 60 })).toBe(100);
  expect(basisMixShift({}, { power: 60 })).toBeNaN();
  expect(() => basisMixShift({ power: -1 }, {})).toThrow(NumericInputError);
});

// Frandsen JSB et al. 2025, Br J Sports Med 59(17):1203–1210: each class holds its upper end.
test('spike classes', () => {
  expect([10, 10.1, 30, 30.1, 100, 100.1].map(spikeClass)).toEqual([
    'reference',
    'small',
    'small',
    'moderate',
    'moderate',
    'large',
  ]);
  expect(sessionSpikePercent(22, 20)).toBeCloseTo(10, 12);
  expect(sessionSpikePercent(10, 20)).toBe(-50);
  expect(() => sessionSpikePercent(10, 0)).toThrow(NumericInputError);
});
