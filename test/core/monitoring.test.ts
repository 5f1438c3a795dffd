import { describe, expect, test } from '@jest/globals';
import fc from 'fast-check';
import { cleanRrIntervals } from '../../src/core/monitoring/clean-rr-intervals.ts';
import { ewmaChart, ewmaLimit } from '../../src/core/monitoring/ewma-chart.ts';
import { deviationInTypicalErrors, expectedResult } from '../../src/core/monitoring/expected-result.ts';
import { hooperSum } from '../../src/core/monitoring/hooper-sum.ts';
import { lnRmssd, rmssd } from '../../src/core/monitoring/rmssd.ts';
import { averageRunLengthCusum, averageRunLengthEwma } from '../../src/core/monitoring/run-length.ts';
import { tabularCusum } from '../../src/core/monitoring/tabular-cusum.ts';
import { totalMoodDisturbance } from '../../src/core/monitoring/total-mood-disturbance.ts';
import { typicalError, typicalErrorPercent } from '../../src/core/monitoring/typical-error.ts';
import { normalDistribution } from '../../src/core/numeric/normal.ts';
import { solveLinear } from '../../src/core/numeric/solve-linear.ts';

const interval = fc.integer({ min: 600, max: 1200 });
const number = fc.double({ min: -1e3, max: 1e3, noNaN: true });
const values = fc.array(number, { minLength: 1, maxLength: 60 });

describe('rmssd', () => {
  test('does not change with the level or the direction of time, and grows with the size of the differences', () => {
    fc.assert(
      fc.property(fc.array(interval, { minLength: 3, maxLength: 80 }), (intervals) => {
        const of = rmssd(intervals);
        expect(rmssd(intervals.map((one) => one + 100))).toBeCloseTo(of, 9);
        expect(rmssd(intervals.toReversed())).toBeCloseTo(of, 9);
        expect(rmssd(intervals.map((one) => 2 * one))).toBeCloseTo(2 * of, 9);
      }),
    );
  });

  test('takes no difference across a removed interval, and none from too few', () => {
    expect(rmssd([800, 810, NaN, 600, 610, 600])).toBe(10);
    expect(rmssd([800, 810, NaN, 900])).toBeNaN();
    expect(rmssd([])).toBeNaN();
  });

  test.each([0, -800, Infinity])('refuses an interval of %d ms', (bad) => {
    expect(() => rmssd([800, bad])).toThrow(/intervalsMs\[1\]/);
    expect(() => cleanRrIntervals([800, bad])).toThrow(/intervalsMs\[1\]/);
    expect(() => lnRmssd(bad)).toThrow(/rmssdMs/);
  });
});

test('the artefact rule removes planted artefacts and nothing of a quiet rhythm', () => {
  const quiet = Array.from({ length: 120 }, (_, beat) => 900 + 60 * Math.sin(beat / 3));
  expect(cleanRrIntervals(quiet)).toEqual(quiet);
  const planted = quiet.map((one, beat) => (beat % 20 === 7 ? 2 * one : beat % 20 === 13 ? one / 2 : one));
  const cleaned = cleanRrIntervals(planted);
  expect(cleaned.flatMap((one, beat) => (Number.isNaN(one) ? [beat % 20] : []))).toEqual(
    Array.from({ length: 12 }, (_, n) => (n % 2 === 0 ? 7 : 13)),
  );
  expect(Math.abs(rmssd(cleaned) - rmssd(quiet))).toBeLessThan(1.5);
  expect(rmssd(planted)).toBeGreaterThan(5 * rmssd(quiet));
});

test('the sum of the morning ratings is there only when all four are', () => {
  expect(hooperSum(1, 1, 1, 1)).toBe(4);
  expect(hooperSum(7, 7, 7, 7)).toBe(28);
  expect(hooperSum(3, NaN, 2, 5)).toBeNaN();
  expect(() => hooperSum(3, 2.5, 2, 5)).toThrow(/fatigue = 2.5/);
  expect(() => hooperSum(3, 4, 2, 8)).toThrow(/soreness = 8, allowed: a whole number from 1 to 7/);
  const scores = { tension: 1, depression: 1, anger: 1, fatigue: 1, confusion: 1, vigour: NaN };
  expect(totalMoodDisturbance(scores)).toBeNaN();
  expect(() => totalMoodDisturbance({ ...scores, anger: -1 })).toThrow(/scores\.anger/);
});

test('the typical error does not see a change that all share; in percent it does not see the unit', () => {
  const trials = fc.array(fc.tuple(fc.integer({ min: 200, max: 300 }), fc.integer({ min: 200, max: 300 })), {
    minLength: 2,
    maxLength: 20,
  });
  fc.assert(
    fc.property(trials, (pairs) => {
      const [first, second] = [pairs.map(([a]) => a), pairs.map(([, b]) => b)];
      const shifted = second.map((one) => one + 7);
      expect(typicalError(first, shifted)).toBeCloseTo(typicalError(first, second), 9);
      const thousand = (list: number[]) => list.map((one) => 1000 * one);
      expect(typicalErrorPercent(thousand(first), thousand(second))).toBeCloseTo(typicalErrorPercent(first, second), 9);
    }),
  );
  expect(() => typicalError([1, 2], [1])).toThrow(/second/);
  expect(() => typicalErrorPercent([1, 0], [1, 1])).toThrow(/first\[1\]/);
  expect(typicalError([1], [2])).toBeNaN();
});

describe('the expected result', () => {
  const fortnightly = [1, 15, 29, 43, 57, 71, 85].map((day, index) => ({ day, value: 300 + index }));

  test('is the mean of the last three to six that are 15 days older, and before the first sign', () => {
    expect(expectedResult(fortnightly, 44)).toBe(301);
    expect(expectedResult(fortnightly, 43)).toBeNaN();
    expect(expectedResult(fortnightly, 200)).toBe((301 + 302 + 303 + 304 + 305 + 306) / 6);
    expect(expectedResult(fortnightly, 200, 57)).toBe((300 + 301 + 302 + 303) / 4);
    expect(expectedResult(fortnightly, 200, 29)).toBeNaN();
    expect(expectedResult([...fortnightly, { day: 90, value: NaN }].toReversed(), 200)).toBe(303.5);
    expect(() => expectedResult(fortnightly, 44.5)).toThrow(/day = 44.5/);
  });

  test('is missed in typical errors, negative where the result is worse', () => {
    expect(deviationInTypicalErrors(406, 400, 2, -1)).toBe(-3);
    expect(deviationInTypicalErrors(406, 400, 2, 1)).toBe(3);
    expect(deviationInTypicalErrors(406, NaN, 2, 1)).toBeNaN();
    expect(() => deviationInTypicalErrors(1, 1, 0, 1)).toThrow(/typicalErrorOfOne/);
    expect(() => deviationInTypicalErrors(1, 1, 1, 0)).toThrow(/higherIsBetter/);
  });
});

describe('control charts', () => {
  test('the cumulative sums mirror each other and never fall below 0', () => {
    fc.assert(
      fc.property(values, number, (given, target) => {
        const { high, low } = tabularCusum(given, target, 0.5, 4);
        const mirrored = tabularCusum(
          given.map((one) => 2 * target - one),
          target,
          0.5,
          4,
        );
        high.forEach((one, index) => expect(mirrored.low[index]).toBeCloseTo(one, 6));
        expect(Math.min(...high, ...low)).toBeGreaterThanOrEqual(0);
      }),
    );
  });

  test('twenty values of a process in control give no signal', () => {
    const concentration = [102, 94.8, 98.3, 98.4, 102, 98.5, 99, 97.7, 100, 98.1, 101.3, 98.7, 101.1, 98.4, 97, 96.7];
    expect(tabularCusum([...concentration, 100.3, 101.4, 97.2, 101], 99, 1, 10).signals).toEqual([]);
  });

  test('the weighted average stays between the values and the target, and where nothing was measured', () => {
    fc.assert(
      fc.property(values, number, fc.double({ min: 0.05, max: 1, noNaN: true }), (given, target, weight) => {
        const [least, most] = [Math.min(target, ...given) - 1e-9, Math.max(target, ...given) + 1e-9];
        for (const one of ewmaChart(given, target, weight)) expect(one >= least && one <= most).toBe(true);
      }),
    );
    expect(ewmaChart([1, NaN, 1], 0, 0.5)).toEqual([0.5, 0.5, 0.75]);
    expect(ewmaLimit(1, 1, 3, 5)).toBe(3);
    expect(ewmaLimit(2, 0.2, 3, 4)).toBeLessThan(ewmaLimit(2, 0.2, 3, Infinity));
    expect(() => ewmaLimit(1, 0, 3, 1)).toThrow(/weight/);
    expect(() => ewmaLimit(1, 0.2, 3, 1.5)).toThrow(/count/);
  });

  test('run lengths agree with runs drawn at random, and shorten with a shift either way', () => {
    expect(averageRunLengthCusum(0.5, 4, -1)).toBeCloseTo(averageRunLengthCusum(0.5, 4, 1), 9);
    expect(averageRunLengthEwma(1, 3, 0)).toBeCloseTo(1 / (2 * (1 - normalDistribution(3))), 3);
    expect(averageRunLengthEwma(0.2, 2.962, 0.5)).toBeCloseTo(41.76, 2);
    expect(averageRunLengthCusum(0.5, 5, 2)).toBeCloseTo(4.01, 2);
    const [runs, draw] = [4000, normal(7)];
    let total = 0;
    for (let run = 0; run < runs; run += 1) {
      let [high, low] = [0, 0];
      for (; high <= 4 && low <= 4; total += 1) {
        const one = draw() + 1;
        [high, low] = [Math.max(0, high + one - 0.5), Math.max(0, low - one - 0.5)];
      }
    }
    expect(total / runs).toBeGreaterThan(8.1);
    expect(total / runs).toBeLessThan(8.7);
  });
});

test('a linear system is solved, or said to have no single solution', () => {
  const entry = fc.integer({ min: -9, max: 9 });
  const rows = fc.array(fc.array(entry, { minLength: 4, maxLength: 4 }), { minLength: 4, maxLength: 4 });
  fc.assert(
    fc.property(rows, fc.array(entry, { minLength: 4, maxLength: 4 }), (matrix, right) => {
      const solution = solveLinear(matrix, right);
      if (solution === null) return;
      matrix.forEach((row, index) => {
        const sum = row.reduce((total, one, column) => total + one * solution[column]!, 0);
        expect(sum).toBeCloseTo(right[index]!, 5);
      });
    }),
  );
  expect(solveLinear([[1, 2], [2, 4]], [1, 2])).toBeNull(); // prettier-ignore
});

/** Normal numbers from a seed, by Box and Muller. */
function normal(seed: number): () => number {
  let state = seed;
  const uniform = () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return (state + 0.5) / 2 ** 32;
  };
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
}
