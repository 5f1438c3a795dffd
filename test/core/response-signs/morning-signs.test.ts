import { describe, expect, test } from '@jest/globals';
import fc from 'fast-check';
import { dayMarks } from '../../../src/core/response-signs/day-marks.ts';
import { morningSigns } from '../../../src/core/response-signs/morning-signs.ts';
import { ownBaseline } from '../../../src/core/response-signs/own-baseline.ts';
import type { MeasuredDay } from '../../../src/core/response-signs/types.ts';
import { FIRST, inTurn, measured, normalValues, raisedShare, times } from './support.ts';

describe('which days count', () => {
  const ordinary = { ill: false, returning: false, away: false, suspect: false, disputed: false };

  test('an illness leaves itself and the seven days after out', () => {
    const days = Array.from({ length: 12 }, (_, index) => ({ ...ordinary, ill: index === 2 || index === 3 }));
    const marks = dayMarks(days);
    expect(marks.flatMap(({ judged }, index) => (judged ? [index] : []))).toEqual([0, 1, 11]);
    expect(marks.map(({ inBaseline }) => inBaseline)).toEqual(marks.map(({ judged }) => judged));
    expect(marks.map(({ explained }) => explained)).toEqual(marks.map(({ judged }) => !judged));
  });

  test.each([
    ['returning', { inBaseline: false, judged: false, explained: true }],
    ['away', { inBaseline: false, judged: false, explained: true }],
    ['suspect', { inBaseline: false, judged: false, explained: false }],
    ['disputed', { inBaseline: false, judged: true, explained: false }],
  ])('%s', (mark, expected) => {
    expect(dayMarks([{ ...ordinary, [mark]: true }, ordinary])).toEqual([
      expected,
      { inBaseline: true, judged: true, explained: false },
    ]);
  });
});

describe('own baseline', () => {
  test('28 stable days that end 14 days before, by hand', () => {
    // Days 0 to 49; for day 49 the window is 8 … 35: fourteen times 10 and fourteen times 12.
    const days = measured([...times(8, 99), ...inTurn(28, 10, 12), ...times(14, 99)]);
    const baseline = ownBaseline(days, 49)!;
    expect(baseline).toMatchObject({ mean: 11, count: 28, from: FIRST + 8, to: FIRST + 35 });
    // Σ(x − 11)² = 28, ÷ 27.
    expect(baseline.sd).toBeCloseTo(Math.sqrt(28 / 27), 12);
  });

  test('needs 14 values', () => {
    expect(ownBaseline(measured(times(27, 10)), 26)).toBeNull();
    expect(ownBaseline(measured(times(28, 10)), 27)).toMatchObject({ count: 14, mean: 10, sd: 0 });
    const gappy = measured(times(42, 10).map((one, index) => (index % 2 === 0 ? one : NaN)));
    expect(ownBaseline(gappy, 41)).toMatchObject({ count: 14, from: FIRST, to: FIRST + 27 });
    expect(
      ownBaseline([...gappy.slice(0, 27).map((one) => ({ ...one, value: NaN })), ...gappy.slice(27)], 41),
    ).toBeNull();
  });

  test('days left out are passed over: the window reaches further back, seventy days at most', () => {
    const ill = (index: number) => ({ inBaseline: index < 20 || index >= 30 });
    const passed = ownBaseline(measured(times(80, 10), ill), 60);
    expect(passed).toMatchObject({ from: FIRST + 9, to: FIRST + 46, count: 28 });
    const long = (index: number) => ({ inBaseline: index < 20 });
    expect(ownBaseline(measured(times(120, 10), long), 76)).toMatchObject({ from: FIRST + 6, count: 14 });
    expect(ownBaseline(measured(times(120, 10), long), 77)).toBeNull();
    expect(() => ownBaseline(measured([1]), 1)).toThrow(/index/);
  });
});

/** Forty quiet mornings of 10 and 12 (mean 11, SD about 1.02, limit about 12.53), then these. */
const after = (...values: number[]) => morningSigns(measured([...inTurn(42, 10, 12), ...values]));

describe('morning signs', () => {
  test('above mean + 1.5 SD; at the limit it is none', () => {
    const [day] = after(13).slice(-1);
    expect(day!.limit).toBeCloseTo(11 + 1.5 * Math.sqrt(28 / 27), 12);
    expect(day!.sign).toBe(true);
    expect(after(12).at(-1)!.sign).toBe(false);
    const flat = morningSigns(measured([...times(42, 10), 11.5, 11.6]));
    // No spread at all counts as one point.
    expect(flat.slice(-2).map(({ limit, sign }) => [limit, sign])).toEqual([[11.5, false], [11.5, true]]); // prettier-ignore
  });

  test('raised by the third of the last seven measured mornings, cleared at one', () => {
    const days = after(13, 10, 14, 11, 13, 10, 10, 10, 10, 10);
    expect(days.slice(42).map(({ raised }) => raised)).toEqual([false, false, false, false, true, true, true, false, false, false]); // prettier-ignore
    expect(days.slice(42).map(({ open }) => open)).toEqual([false, false, false, false, true, true, true, true, true, false]); // prettier-ignore
    expect(days[46]).toMatchObject({ since: FIRST + 46, firstSign: FIRST + 42, measured: 7 });
    expect(days[46]!.signs.map(({ day, value }) => [day - FIRST, value])).toEqual([[42, 13], [44, 14], [46, 13]]); // prettier-ignore
    expect(days[46]!.signs[0]).toMatchObject({ expected: 11, sources: [`morning:${FIRST + 42}`] });
    expect(days[51]).toMatchObject({ since: null, firstSign: null });
  });

  test('mornings not measured are passed over, but nothing older than 14 days counts', () => {
    const gap = (count: number) => after(13, 14, ...times(count, NaN), 13).at(-1)!;
    expect(gap(11)).toMatchObject({ raised: true, measured: 3 });
    expect(gap(12)).toMatchObject({ raised: false });
    expect(gap(12).signs).toHaveLength(2);
  });

  test('better mornings are no sign, however much better', () => {
    expect(after(4, 4, 4, 4, 4, 4, 4).some(({ sign }) => sign)).toBe(false);
  });

  test('a morning that may not be judged neither raises nor counts as measured', () => {
    const values = [...inTurn(42, 10, 12), 20, 20, 20, 20];
    const days = morningSigns(measured(values, (index) => ({ judged: index < 42 })));
    expect(days.at(-1)).toMatchObject({ sign: null, raised: false, frozenSince: null });
  });

  test('the baseline is held from the first sign until it clears, so that it does not follow a lasting change', () => {
    const values = [...normalValues(4, 60, 11, 1), ...normalValues(5, 80, 14, 1)];
    const days = morningSigns(measured(values));
    const last = days.at(-1)!;
    expect(last.raised).toBe(true);
    expect(last.baseline!.mean).toBeLessThan(11.5);
    expect(last.frozenSince! - FIRST).toBeLessThan(64);
    // One that moved would have taken the new level for usual.
    expect(ownBaseline(measured(values), values.length - 1)!.mean).toBeGreaterThan(13.5);
    const back = morningSigns(measured([...values, ...normalValues(6, 12, 11, 0.5)]));
    expect(back.at(-1)).toMatchObject({ open: false, frozenSince: null });
  });

  test('a slow drift does not become its own baseline', () => {
    const found = Array.from({ length: 40 }, (_, seed) => {
      const values = normalValues(seed, 112, 11, 1).map((one, index) => one + Math.max(0, index - 42) * 0.05);
      return morningSigns(measured(values)).at(-1)!;
    });
    expect(found.filter(({ raised }) => raised).length).toBeGreaterThanOrEqual(38);
    // The drift has come to 3.5; a moving baseline would stand 27.5 days, 1.4, behind it.
    const means = found.map(({ baseline }) => baseline!.mean).sort((a, b) => a - b);
    expect(means[20]!).toBeLessThan(12);
  });

  test('normal mornings raise it on 2 of 100 Mondays (2.3 with all, 2.9 with three in four measured)', () => {
    const share = (missing: number) =>
      raisedShare(
        Array.from({ length: 400 }, (_, seed) => morningSigns(measured(normalValues(seed, 182, 11, 2, missing)))),
        41,
      );
    expect(share(0)).toBeCloseTo(0.023, 3);
    expect(share(0.25)).toBeCloseTo(0.029, 3);
  });

  test('a limit of 1 SD would raise it on more than 10 of 100 Mondays', () => {
    const runs = Array.from({ length: 200 }, (_, seed) =>
      morningSigns(measured(normalValues(seed, 182, 11, 2)), { spreads: 1 }),
    );
    expect(raisedShare(runs, 41)).toBeGreaterThan(0.1);
  });

  test('a day sees only what is dated up to it', () => {
    // Blocks of eight mornings, some of them high throughout, with a gap or a mark here and there.
    const morning = fc.record({
      above: fc.constantFrom(0, 1, 2, 3, NaN),
      inBaseline: fc.nat(9).map((one) => one > 0),
      judged: fc.nat(9).map((one) => one > 0),
    });
    const block = fc.tuple(fc.constantFrom(9, 9, 14), fc.array(morning, { minLength: 8, maxLength: 8 }));
    const log = fc
      .array(block, { minLength: 7, maxLength: 14 })
      .map((blocks) =>
        blocks.flatMap(([level, all]) => all.map(({ above, ...one }) => ({ ...one, value: level + above }))),
      );
    let open = 0;
    fc.assert(
      fc.property(log, fc.nat(110), (given, cut) => {
        const days: MeasuredDay[] = given.map((day, index) => ({ ...day, day: FIRST + index }));
        const whole = morningSigns(days);
        const part = morningSigns(days.slice(0, cut));
        expect(part).toEqual(whole.slice(0, cut));
        open += part.filter((day) => day.open).length;
      }),
    );
    expect(open).toBeGreaterThan(50);
  });

  test('refuses days with gaps and settings that mean nothing', () => {
    const [one] = measured([10]);
    expect(() => morningSigns([one!, { ...one!, day: FIRST + 2 }])).toThrow(/days\[1\]\.day/);
    expect(() => morningSigns([{ ...one!, day: 0.5 }])).toThrow(/days\[0\]\.day/);
    expect(() => morningSigns(measured([Infinity]))).toThrow(/days\[0\]\.value/);
    expect(() => morningSigns([], { spreads: 0 })).toThrow(/spreads/);
    expect(() => morningSigns([], { leastSpread: 0 })).toThrow(/leastSpread/);
  });
});
