import { describe, expect, test } from '@jest/globals';
import fc from 'fast-check';
import type { MeasuredDay } from '../../../src/core/response-signs/types.ts';
import { variabilityBand } from '../../../src/core/response-signs/variability-band.ts';
import { variabilityHalfWidth } from '../../../src/core/response-signs/variability-half-width.ts';
import { FIRST, inTurn, measured, normalValues, raisedShare, times } from './support.ts';

test('the band is as wide as the larger of 0.5 SD and 1.64 standard errors', () => {
  expect(variabilityHalfWidth(0.1, 7)).toBeCloseTo(0.164 / Math.sqrt(7), 12);
  expect(variabilityHalfWidth(0.1, 3)).toBeCloseTo(0.164 / Math.sqrt(3), 12);
  // 1.64 ÷ √7 is 0.62: with a week's days the second is always the larger.
  for (let days = 1; days <= 7; days += 1) expect(variabilityHalfWidth(1, days)).toBeGreaterThan(0.5);
  expect(() => variabilityHalfWidth(0.1, 8)).toThrow(/validDays/);
  expect(() => variabilityHalfWidth(-0.1, 7)).toThrow(/sd/);
});

/** Eight weeks of 4.1 and 4.3 in turn, mean 4.2, SD about 0.102; then weeks of these values. */
const weeks = (...values: (number | readonly number[])[]) => [
  ...inTurn(56, 4.1, 4.3),
  ...values.flatMap((value) => (typeof value === 'number' ? times(7, value) : value)),
];
const band = (...values: (number | readonly number[])[]) => variabilityBand(measured(weeks(...values)));
const sundays = (...values: (number | readonly number[])[]) => band(...values).filter((_, index) => index % 7 === 6).slice(8); // prettier-ignore

describe('the variability band', () => {
  test('a week is the mean of its judged days, on its Sunday only', () => {
    const days = band([4, 4.1, 4.2, NaN, NaN, NaN, NaN]);
    expect(days.filter(({ week }) => week !== null)).toHaveLength(9);
    const { week } = days.at(-1)!;
    const half = (1.64 * Math.sqrt(28 / 27) * 0.1) / Math.sqrt(3);
    expect(week).toMatchObject({ validDays: 3, mean: expect.closeTo(4.1, 12), place: 'below' });
    expect(week!.low).toBeCloseTo(4.2 - half, 12);
    expect(week!.high).toBeCloseTo(4.2 + half, 12);
    expect(band([4, 4.1, NaN, NaN, NaN, NaN, NaN]).at(-1)!.week).toMatchObject({
      validDays: 2,
      mean: NaN,
      place: null,
    });
    const unjudged = variabilityBand(measured(weeks(4), (index) => ({ judged: index < 56 })));
    expect(unjudged.at(-1)!.week).toMatchObject({ validDays: 0, place: null });
  });

  test('raised by two weeks outside in a row, below or above; one is nothing', () => {
    const raised = (...values: (number | readonly number[])[]) => sundays(...values).map((day) => day.raised);
    expect(raised(4.1, 4.2, 4.1)).toEqual([false, false, false]);
    expect(raised(4.1, 4.1)).toEqual([false, true]);
    expect(raised(4.3, 4.3)).toEqual([false, true]);
    expect(raised(4.1, 4.3)).toEqual([false, true]);
    const [, second] = sundays(4.1, 4.12);
    expect(second).toMatchObject({ since: FIRST + 69, firstSign: FIRST + 56, measured: 2 });
    expect(second!.signs.map(({ day, value }) => [day - FIRST, value])).toEqual([[62, expect.closeTo(4.1, 9)], [69, expect.closeTo(4.12, 9)]]); // prettier-ignore
  });

  test('it stands through the week until a week inside, or two without a mean', () => {
    const days = band(4.1, 4.1, 4.1, 4.2);
    expect(days.slice(69, 83).every(({ raised, open }) => raised && open)).toBe(true);
    expect(days[83]).toMatchObject({ open: false, since: null, firstSign: null, signs: [] });
    const blank = times(7, NaN);
    expect(sundays(4.1, 4.1, blank, blank).map(({ open }) => open)).toEqual([false, true, true, false]);
    expect(sundays(4.1, 4.1, blank, 4.1).map(({ raised }) => raised)).toEqual([false, true, false, true]);
    expect(sundays(4.1, blank, 4.1).map(({ open }) => open)).toEqual([false, false, false]);
  });

  test('the band is held from the first week outside, and does not follow a slow drift', () => {
    const last = sundays(...times(10, 4.08)).at(-1)!;
    expect(last.raised).toBe(true);
    expect(last.week!.baseline!.mean).toBeCloseTo(4.2, 9);
    // Ten weeks of two hundredths a week: a band that moved would stand four weeks, 0.08, behind.
    const drifting = Array.from({ length: 10 }, (_, week) => inTurn(7, 4.1, 4.3).map((one) => one - 0.02 * (week + 1)));
    const end = sundays(...drifting).at(-1)!;
    expect(end.raised).toBe(true);
    expect(end.week!.baseline!.mean).toBeGreaterThan(4.15);
  });

  test('without any spread nothing is judged', () => {
    expect(variabilityBand(measured([...times(56, 4.2), ...times(14, 4)])).at(-1)!.week).toMatchObject({ place: null });
  });

  test('normal mornings raise it on 3 of 100 Mondays (3.2 with all, 4.0 with seven in ten measured)', () => {
    const runs = (missing: number) =>
      Array.from({ length: 400 }, (_, seed) => variabilityBand(measured(normalValues(seed, 182, 4.2, 0.12, missing))));
    expect(raisedShare(runs(0), 48)).toBeCloseTo(0.032, 3);
    expect(raisedShare(runs(0.3), 48)).toBeCloseTo(0.04, 3);
  });

  test('a day sees only what is dated up to it', () => {
    const level = fc.constantFrom(4, 4.1, 4.2, 4.3, NaN);
    const log = fc.array(fc.tuple(level, fc.array(fc.integer({ min: -9, max: 9 }), { minLength: 7, maxLength: 7 })), {
      minLength: 8,
      maxLength: 18,
    });
    let open = 0;
    fc.assert(
      fc.property(log, fc.nat(120), fc.nat(6), (given, cut, start) => {
        const days: MeasuredDay[] = given
          .flatMap(([one, parts]) => parts.map((part) => one + part / 100))
          .map((value, index) => ({
            day: FIRST + start + index,
            value,
            inBaseline: index % 11 > 0,
            judged: index % 13 > 0,
          }));
        const part = variabilityBand(days.slice(0, cut));
        expect(part).toEqual(variabilityBand(days).slice(0, cut));
        open += part.filter((day) => day.open).length;
      }),
    );
    expect(open).toBeGreaterThan(50);
  });

  test('refuses days with gaps', () => {
    const [one] = measured([4]);
    expect(() => variabilityBand([one!, one!])).toThrow(/days\[1\]\.day/);
    expect(() => variabilityBand(measured([-Infinity]))).toThrow(/days\[0\]\.value/);
  });
});
