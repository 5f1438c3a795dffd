import { expect, test } from '@jest/globals';
import fc from 'fast-check';
import type { DayValue } from '../../src/core/types.ts';
import { fillUnknown } from '../../src/core/series/fill-unknown.ts';
import { median } from '../../src/core/series/median.ts';
import { quantile } from '../../src/core/series/quantile.ts';

/** A number is a known day, null an unknown one, a string a lower bound. */
function log(...days: (number | null | string)[]): DayValue[] {
  return days.map((one, day) => {
    if (typeof one === 'number') return { day, state: 'known', value: one };
    if (one === null) return { day, state: 'unknown', value: NaN };
    return { day, state: 'partial', value: Number(one) };
  });
}

const weeks = (count: number, ...week: number[]): number[] => Array<number[]>(count).fill(week).flat();

test('an unknown day takes the median of that weekday, not of its neighbours', () => {
  const filled = fillUnknown(log(...weeks(4, 10, 20, 30, 40, 50, 60, 0), 10, 20, null));
  expect(filled.value[30]).toBe(30);
  expect(filled.low[30]).toBe(0);
  expect(filled.high[30]).toBe(quantile([...weeks(4, 10, 20, 30, 40, 50, 60, 0), 10, 20], 0.9));
});

test('two such weekdays are too few: the median of all earlier known days is taken', () => {
  const earlier = weeks(2, 10, 20, 30, 40, 50, 60, 0);
  expect(fillUnknown(log(...earlier, null)).value[14]).toBe(median(earlier));
  expect(fillUnknown(log(...earlier, ...weeks(1, 10, 20, 30, 40, 50, 60, 0), null)).value[21]).toBe(10);
});

test('weekdays more than 56 days back do not count', () => {
  const old = weeks(4, 500, 20, 30, 40, 50, 60, 0);
  const gap = Array<null>(56).fill(null);
  const at = old.length + gap.length;
  // All 28 known days lie further back than 56 days: the fallback looks at all of them.
  expect(fillUnknown(log(...old, ...gap, null)).value[at]).toBe(median(old));
});

test('a partial day is a floor under all three, and no filled value enters a median', () => {
  const filled = fillUnknown(log(...weeks(3, 10, 20, 30, 40, 50, 60, 0), '35', null));
  expect([filled.value[21], filled.low[21], filled.high[21]]).toEqual([35, 35, 60]);
  expect(filled.value[22]).toBe(20);
  expect(fillUnknown(log(...weeks(3, 10, 20, 30, 40, 50, 60, 0), '90')).high[21]).toBe(90);
});

test('before the first known day all is 0 or the partial sum', () => {
  expect(fillUnknown(log(null, '25', 40))).toEqual({ value: [0, 25, 40], low: [0, 25, 40], high: [0, 25, 40] });
});

test('known days pass unchanged, nothing is NaN, bounds hold the value, later days change nothing', () => {
  const one = fc.oneof(
    { weight: 5, arbitrary: fc.integer({ min: 0, max: 900 }) },
    { weight: 1, arbitrary: fc.constant(null) },
    { weight: 1, arbitrary: fc.integer({ min: 0, max: 900 }).map(String) },
  );
  fc.assert(
    fc.property(fc.array(one, { maxLength: 90 }), fc.array(one, { maxLength: 10 }), (before, after) => {
      const days = log(...before);
      const filled = fillUnknown(days);
      days.forEach(({ state, value }, index) => {
        const [low, middle, high] = [filled.low[index]!, filled.value[index]!, filled.high[index]!];
        expect(low <= middle && middle <= high).toBe(true);
        if (state === 'known') expect([low, high]).toEqual([value, value]);
        if (state === 'partial') expect(low).toBe(value);
      });
      expect(fillUnknown(log(...before, ...after)).value.slice(0, before.length)).toEqual(filled.value);
    }),
  );
});
