import { expect, test } from '@jest/globals';
import fc from 'fast-check';
import { NumericInputError } from '../../src/core/numeric-input-error.ts';
import { dayNumber, isoDay, isoWeek, mondayOf, weekday, weekRange } from '../../src/core/series/day.ts';

const anyDay = fc.integer({ min: -200_000, max: 200_000 });

test('agrees with the calendar of the language on every day', () => {
  fc.assert(
    fc.property(anyDay, (day) => {
      const date = new Date(day * 86_400_000);
      const iso = date.toISOString().slice(0, 10);
      expect([isoDay(day), dayNumber(iso), weekday(day)]).toEqual([iso, day, date.getUTCDay() || 7]);
    }),
  );
});

// ISO 8601 week dates at the turn of the year: 2020 and 2026 have 53 weeks.
test.each([
  ['2020-12-31', '2020-W53'],
  ['2021-01-03', '2020-W53'],
  ['2021-01-04', '2021-W01'],
  ['2024-12-30', '2025-W01'],
  ['2026-11-23', '2026-W48'],
  ['2026-11-29', '2026-W48'],
  ['2027-01-01', '2026-W53'],
])('%s lies in %s', (iso, week) => {
  expect(isoWeek(dayNumber(iso))).toBe(week);
});

test('a week runs from its Monday to its Sunday', () => {
  fc.assert(
    fc.property(anyDay, (day) => {
      const { from, to } = weekRange(isoWeek(day));
      expect([from, to]).toEqual([mondayOf(day), mondayOf(day) + 6]);
      expect([weekday(from), weekday(to)]).toEqual([1, 7]);
      expect(day >= from && day <= to).toBe(true);
    }),
  );
});

test.each(['2026-02-29', '2026-13-01', '2026-1-1', '20260101', '2026-04-31', ''])('%s is no date', (iso) => {
  expect(() => dayNumber(iso)).toThrow(NumericInputError);
});

test.each(['2026-W54', '2025-W53', '2026-W00', '2026W48', '2026-48'])('%s is no week', (week) => {
  expect(() => weekRange(week)).toThrow(NumericInputError);
});

test('a day that is no whole number has no date', () => {
  expect(() => isoDay(1.5)).toThrow(NumericInputError);
  expect(() => isoDay(NaN)).toThrow(NumericInputError);
});
