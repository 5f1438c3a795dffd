import { expect, test } from '@jest/globals';
import fc from 'fast-check';
import type { DayValue } from '../../src/core/types.ts';
import { impulseComponentExclusive, impulseComponentInclusive } from '../../src/core/response/impulse-component.ts';
import { impulseInfluence } from '../../src/core/response/impulse-influence.ts';
import { impulseResponseConvolution } from '../../src/core/response/impulse-response-convolution.ts';
import { impulseResponse, impulseResponseInclusive } from '../../src/core/response/impulse-response.ts';
import { longShortLoad } from '../../src/core/response/long-short-load.ts';
import {
  partialSumInclusive,
  steadyStateSumExclusive,
  steadyStateSumInclusive,
} from '../../src/core/response/steady-state-sum.ts';
import { gainRatioFromRecovery, timeToPeak, timeToRecover } from '../../src/core/response/time-to-recover.ts';

const loads = fc.array(fc.integer({ min: 0, max: 1000 }), { maxLength: 60 });
const gains = fc
  .record({
    k1: fc.integer({ min: 1, max: 100 }),
    k2: fc.integer({ min: 1, max: 200 }),
    tau2: fc.integer({ min: 2, max: 20 }),
    more: fc.integer({ min: 1, max: 40 }),
  })
  .map(({ k1, k2, tau2, more }) => ({ k1: k1 / 100, k2: k2 / 100, tau1: tau2 + more, tau2 }));

test('the recursion is the convolution, and the response is linear in load', () => {
  fc.assert(
    fc.property(loads, gains, (w, constants) => {
      const parameters = { p0: 300, ...constants };
      const recursion = impulseResponse(w, parameters);
      const doubled = impulseResponse(
        w.map((load) => 2 * load),
        parameters,
      );
      impulseResponseConvolution(w, parameters).forEach((value, n) => {
        expect(recursion[n]).toBeCloseTo(value, 6);
        expect(doubled[n]! - 300).toBeCloseTo(2 * (recursion[n]! - 300), 6);
      });
      expect(recursion).toHaveLength(w.length + 1);
    }),
  );
});

test('the two conventions differ by (k1 − k2)·w on the day of the load', () => {
  fc.assert(
    fc.property(loads, gains, (w, constants) => {
      const parameters = { p0: 0, ...constants };
      const before = impulseResponse(w, parameters);
      impulseResponseInclusive(w, parameters).forEach((after, n) => {
        expect(after - before[n]!).toBeCloseTo((constants.k1 - constants.k2) * w[n]!, 6);
      });
    }),
  );
});

test('the days before come first: [0] is the start, the last value the morning after', () => {
  expect(impulseComponentExclusive([], 45, 7)).toEqual([7]);
  expect(impulseComponentExclusive([0, 0], 45, 7)[2]).toBeCloseTo(7 * Math.exp(-2 / 45), 12);
  expect(impulseComponentInclusive([10], 45, 0)).toEqual([10]);
  expect(impulseComponentExclusive([1, NaN, 1], 45).map(Number.isNaN)).toEqual([false, false, true, true]);
});

test('a constant load holds its steady state', () => {
  fc.assert(
    fc.property(fc.integer({ min: 2, max: 60 }), fc.integer({ min: 1, max: 500 }), (tau, load) => {
      const start = steadyStateSumExclusive(tau) * load;
      for (const value of impulseComponentExclusive(Array<number>(30).fill(load), tau, start)) {
        expect(value / start).toBeCloseTo(1, 10);
      }
      expect(steadyStateSumInclusive(tau) - steadyStateSumExclusive(tau)).toBeCloseTo(1, 9);
      const inclusive = impulseComponentInclusive(Array<number>(30).fill(load), tau);
      expect(inclusive[29]! / load).toBeCloseTo(partialSumInclusive(tau, 30), 9);
    }),
  );
});

// Fitz-Clarke JR, Morton RH, Banister EW 1991, J Appl Physiol 71(3):1151–1158: zero at t_n, highest at t_g.
test('influence is 0 at the time to recover and highest at the time to peak', () => {
  fc.assert(
    fc.property(gains, (constants) => {
      const recover = timeToRecover(constants);
      const peak = timeToPeak(constants);
      if (constants.k2 > constants.k1) {
        expect(impulseInfluence(recover, constants)).toBeCloseTo(0, 9);
        const { tau1, tau2 } = constants;
        expect(peak - recover).toBeCloseTo(((tau1 * tau2) / (tau1 - tau2)) * Math.log(tau1 / tau2), 6);
        const ratio = gainRatioFromRecovery({ tau1, tau2, timeToRecoverDays: recover });
        expect(ratio).toBeCloseTo(constants.k2 / constants.k1, 6);
      } else {
        expect(recover).toBe(0);
      }
      for (const day of [peak - 1, peak + 1].filter((one) => one >= 0)) {
        expect(impulseInfluence(day, constants)).toBeLessThanOrEqual(impulseInfluence(peak, constants));
      }
    }),
  );
});

const day = (index: number, value: number): DayValue => ({
  day: index,
  state: Number.isNaN(value) ? 'unknown' : 'known',
  value,
});
const series = (values: number[]): DayValue[] => values.map((value, index) => day(index, value));

test('long and short load of a constant log: in equilibrium from the first day, 100 % from the 56th', () => {
  const result = longShortLoad(series(Array<number>(120).fill(80)));
  result.forEach(({ longUnits, longShare, shortShare }, index) => {
    expect(longUnits.value).toBeCloseTo(80 * steadyStateSumExclusive(45), 6);
    if (index < 55) expect([longShare.value, shortShare.value]).toEqual([NaN, NaN]);
    else expect([longShare.value, shortShare.low]).toEqual([expect.closeTo(100, 6), expect.closeTo(100, 6)]);
  });
});

test('the reading of a day contains that day', () => {
  const calm = Array<number>(60).fill(50);
  const hard = longShortLoad(series(calm.with(59, 500)))[59]!;
  const usual = longShortLoad(series(calm))[59]!;
  expect(hard.shortUnits.value - usual.shortUnits.value).toBeCloseTo(450 * Math.exp(-1 / 15), 6);
});

test('started at 0 where fewer than 24 of the first 28 days are known', () => {
  const values = Array.from({ length: 40 }, (_, index) => (index < 5 ? NaN : 60));
  expect(longShortLoad(series(values))[0]!.longUnits.value).toBe(0);
  expect(longShortLoad(series(values.with(4, 60)))[0]!.longUnits.value).toBeGreaterThan(2000);
});

test('the three ways through a gap part there, come together again, and keep their order', () => {
  const values = Array.from({ length: 200 }, (_, index) => (index >= 80 && index < 90 ? NaN : (index % 7) * 30));
  const result = longShortLoad(series(values));
  expect(result[79]!.longUnits.low).toBe(result[79]!.longUnits.high);
  const spread = (index: number): number => result[index]!.shortUnits.high - result[index]!.shortUnits.low;
  expect(spread(89)).toBeGreaterThan(500);
  expect(spread(199)).toBeLessThan(0.01 * spread(89));
  for (const { longUnits, shortShare } of result.slice(60)) {
    expect(longUnits.low).toBeLessThanOrEqual(longUnits.value);
    expect(longUnits.value).toBeLessThanOrEqual(longUnits.high);
    expect(shortShare.low).toBeLessThanOrEqual(shortShare.value);
  }
});

test('scaling the loads keeps the shares; a log of rest has none', () => {
  fc.assert(
    fc.property(fc.array(fc.integer({ min: 0, max: 200 }), { minLength: 60, maxLength: 90 }), (values) => {
      const once = longShortLoad(series(values)).at(-1)!;
      const thrice = longShortLoad(series(values.map((value) => 3 * value))).at(-1)!;
      if (Number.isNaN(once.longShare.value)) expect(thrice.longShare.value).toBeNaN();
      else expect(thrice.longShare.value).toBeCloseTo(once.longShare.value, 6);
    }),
  );
  expect(longShortLoad(series(Array<number>(60).fill(0)))[59]!.longShare.value).toBeNaN();
});
