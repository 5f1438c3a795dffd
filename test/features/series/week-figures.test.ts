import { describe, expect, test } from '@jest/globals';
import { dayNumber, isoDay } from '../../../src/core/series/day.ts';
import type { DayRecord } from '../../../src/features/days/days.types.ts';
import { weekFigures } from '../../../src/features/series/week-figures.ts';
import { dayOf } from '../../reports/invented-squad.ts';

const FIRST = dayNumber('2026-08-31');

/** Weeks of daily minutes from Monday on; dayOf makes 1.25 domain load of a minute. */
function log(weeks: readonly (number | null)[][], changes: (index: number) => Partial<DayRecord> = () => ({})) {
  return weeks.flat().map((minutes, index) => dayOf(isoDay(FIRST + index), minutes, changes(index)));
}
const week = (minutes: number): number[] => Array.from({ length: 7 }, () => minutes);
const squadId = dayOf('2026-08-31', 0).squadId!;
const figures = (records: DayRecord[], index: number) =>
  weekFigures(records, isoDay(FIRST + 7 * index), 'domain-load', squadId);

describe('week in % of the own usual', () => {
  test('the median of the own earlier full weeks: 60 min a day against 40, 50, 50, 80 → 120 %', () => {
    const { share } = figures(log([week(40), week(50), week(50), week(80), week(60)]), 4);
    expect(share).toEqual({ value: expect.closeTo(120, 9), atLeast: false, withheld: null, usualWeeks: 4 });
  });

  test('three full weeks are too few', () => {
    expect(figures(log([week(40), week(50), week(50), week(60)]), 3).share.withheld).toBe('3 of 4 full weeks in');
  });

  test('a week with an unknown day is no full week', () => {
    const records = log([week(40), [50, 50, 50, 50, 50, 50, null], week(50), week(50), week(80), week(60)]);
    expect(figures(records, 5).share).toMatchObject({ usualWeeks: 4, value: expect.closeTo(120, 9) });
  });

  test('6 of 7 days make a lower bound, 5 of 7 nothing', () => {
    const before = [week(50), week(50), week(50), week(50)];
    const six = figures(log([...before, [50, 50, 50, null, 50, 50, 50]]), 4).share;
    expect(six).toMatchObject({ value: expect.closeTo((100 * 6) / 7, 9), atLeast: true });
    const five = figures(log([...before, [50, 50, 50, null, 50, null, 50]]), 4).share;
    expect(five).toMatchObject({ value: null, withheld: '5 of 7 days known' });
  });

  test('of more than 26 full weeks the latest 26 count', () => {
    const weeks = [
      ...Array.from({ length: 10 }, () => week(10)),
      ...Array.from({ length: 26 }, () => week(50)),
      week(50),
    ];
    expect(figures(log(weeks), 36).share).toMatchObject({ usualWeeks: 26, value: expect.closeTo(100, 9) });
  });
});

describe('sums', () => {
  test('hold lower bounds of partial days and say how many days are known', () => {
    const records = log([week(60)], (index) =>
      index === 6 ? { domain: { state: 'partial', value: 10 }, rating: { state: 'known', value: 240 } } : {},
    );
    const result = figures(records, 0);
    expect(result.domainLoad).toEqual({ sum: 6 * 75 + 10, knownDays: 6, of: 7 });
    expect(result.ratingLoad).toEqual({ sum: 7 * 240, knownDays: 7, of: 7 });
    expect(result.domainMinutes.moderate).toBeCloseTo(7 * 48, 9);
    expect(result.domainLoad28).toEqual({ sum: 460, knownDays: 6, of: 28 });
  });

  test('days outside the squad and before the log do not count against it', () => {
    const records = log([week(60)]).slice(2);
    expect(figures(records, 0)).toMatchObject({ daysComplete: 5, daysOf: 5, sessions: 5 });
    const left = log([week(60)], (index) => (index > 4 ? { squadId: null } : {}));
    expect(figures(left, 0)).toMatchObject({ daysComplete: 5, daysOf: 5 });
  });

  test('days after the last closed one are not in yet', () => {
    expect(figures(log([week(60)]).slice(0, 4), 0)).toMatchObject({ daysComplete: 4, daysOf: 7, sessions: 4 });
  });
});
