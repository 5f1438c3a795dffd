import { expect, test } from '@jest/globals';
import fc from 'fast-check';
import { acuteChronicCoupled } from '../../src/core/ratio/acute-chronic-coupled.ts';
import { acuteChronicExponential } from '../../src/core/ratio/acute-chronic-exponential.ts';
import { acuteChronicUncoupled } from '../../src/core/ratio/acute-chronic-uncoupled.ts';
import { coupledFromUncoupled, uncoupledFromCoupled } from '../../src/core/ratio/coupled-from-uncoupled.ts';
import { exponentialMean } from '../../src/core/series/exponential-mean.ts';
import { knownDays } from '../../src/core/series/known-days.ts';
import { quantile } from '../../src/core/series/quantile.ts';
import { rollingMean } from '../../src/core/series/rolling-mean.ts';
import { rollingQuantile } from '../../src/core/series/rolling-quantile.ts';

const load = fc.oneof(fc.constant(0), fc.integer({ min: 1, max: 1500 }));
const log = fc.array(load, { minLength: 28, maxLength: 60 });
const gappy = fc.array(fc.oneof({ weight: 6, arbitrary: load }, { weight: 1, arbitrary: fc.constant(NaN) }), {
  minLength: 1,
  maxLength: 60,
});
const forms = { acuteChronicCoupled, acuteChronicUncoupled, acuteChronicExponential };

test('the coupled ratio stays within 28 ÷ 7 and the two rolling forms are one identity apart', () => {
  fc.assert(
    fc.property(log, (days) => {
      const coupled = acuteChronicCoupled(days).ratio;
      const uncoupled = acuteChronicUncoupled(days).ratio;
      coupled.forEach((value, index) => {
        if (Number.isNaN(value)) return;
        expect(value).toBeLessThanOrEqual(4 + 1e-12);
        if (Number.isNaN(uncoupled[index]!)) expect(value).toBeCloseTo(4, 9);
        else expect(coupledFromUncoupled(uncoupled[index]!)).toBeCloseTo(value, 9);
      });
    }),
  );
});

test('the conversions undo each other, and 4 has no uncoupled counterpart', () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 5000 }), (thousandths) => {
      const u = thousandths / 1000;
      expect(uncoupledFromCoupled(coupledFromUncoupled(u))).toBeCloseTo(u, 9);
    }),
  );
  expect(uncoupledFromCoupled(4)).toBeNaN();
});

test.each(Object.entries(forms))('%s: scaling keeps the ratio, a constant log gives 1, rest gives none', (_, form) => {
  fc.assert(
    fc.property(log, fc.integer({ min: 1, max: 50 }), (days, tenths) => {
      const scaled = form(days.map((value) => (value * tenths) / 10));
      form(days).ratio.forEach((value, index) => {
        if (Number.isNaN(value)) expect(scaled.ratio[index]).toBeNaN();
        else expect(scaled.ratio[index]).toBeCloseTo(value, 9);
      });
    }),
  );
  expect(form(Array<number>(40).fill(70)).ratio.at(-1)).toBeCloseTo(1, 12);
  expect(form(Array<number>(40).fill(0)).ratio.at(-1)).toBeNaN();
});

test.each(Object.entries(forms))('%s: what comes later changes nothing before it', (_, form) => {
  fc.assert(
    fc.property(gappy, gappy, (before, after) => {
      const whole = form([...before, ...after]);
      const part = form(before);
      expect(whole.ratio.slice(0, before.length)).toEqual(part.ratio);
      expect(whole.chronic.slice(0, before.length)).toEqual(part.chronic);
    }),
  );
});

test('the order of days inside the last week moves only the exponential form', () => {
  const before = Array<number>(28).fill(50);
  const rising = [...before, 10, 20, 30, 40, 50, 60, 70];
  const falling = [...before, 70, 60, 50, 40, 30, 20, 10];
  const last = (form: typeof acuteChronicCoupled, days: number[]): number => form(days).ratio.at(-1)!;
  expect(last(acuteChronicCoupled, rising)).toBeCloseTo(last(acuteChronicCoupled, falling), 12);
  expect(last(acuteChronicUncoupled, rising)).toBeCloseTo(last(acuteChronicUncoupled, falling), 12);
  expect(last(acuteChronicExponential, rising)).toBeGreaterThan(last(acuteChronicExponential, falling) + 0.1);
});

test('floors: 6 of 7 and 24 of 28 known days are enough, one fewer is not; 18 of 21 for the uncoupled form', () => {
  const with4Gaps = Array.from({ length: 28 }, (_, i) => (i < 4 ? NaN : 60));
  expect(acuteChronicCoupled(with4Gaps).ratio[27]).toBeCloseTo(1, 12);
  expect(acuteChronicCoupled(with4Gaps.with(4, NaN)).ratio[27]).toBeNaN();
  expect(acuteChronicCoupled(Array<number>(28).fill(60).with(27, NaN)).acute[27]).toBe(60);
  expect(acuteChronicCoupled(Array<number>(28).fill(60).with(27, NaN).with(26, NaN)).acute[27]).toBeNaN();
  expect(acuteChronicUncoupled(with4Gaps.with(3, 60)).chronic[27]).toBe(60);
  expect(acuteChronicUncoupled(with4Gaps).chronic[27]).toBeNaN();
  expect(acuteChronicCoupled(Array<number>(27).fill(60)).ratio.every(Number.isNaN)).toBe(true);
});

test('an unknown day is not a day of rest', () => {
  const days = Array<number>(28).fill(60);
  expect(acuteChronicCoupled(days.with(27, NaN)).ratio[27]).toBeCloseTo(1, 12);
  expect(acuteChronicCoupled(days.with(27, 0)).ratio[27]).toBeLessThan(0.9);
});

test('a rolling mean of known days is the mean of what is known, and counts agree', () => {
  fc.assert(
    fc.property(gappy, fc.integer({ min: 1, max: 10 }), (days, windowDays) => {
      const means = rollingMean(days, windowDays, 1);
      const counts = knownDays(days, windowDays);
      days.forEach((_, index) => {
        const known = days.slice(Math.max(0, index - windowDays + 1), index + 1).filter((one) => !Number.isNaN(one));
        expect(counts[index]).toBe(known.length);
        if (index < windowDays - 1 || known.length === 0) expect(means[index]).toBeNaN();
        else expect(means[index]).toBeCloseTo(known.reduce((sum, one) => sum + one, 0) / known.length, 9);
      });
    }),
  );
});

test('a rolling quantile is the quantile of each window', () => {
  fc.assert(
    fc.property(gappy, fc.integer({ min: 1, max: 12 }), fc.constantFrom(0, 0.25, 0.5, 0.95, 1), (days, length, q) => {
      const slow = days.map((_, index) => quantile(days.slice(Math.max(0, index - length + 1), index + 1), q));
      expect(rollingQuantile(days, length, q)).toEqual(slow);
    }),
  );
});

test('the exponential mean starts with the first known load, forgets any start, and stops at a gap', () => {
  fc.assert(
    fc.property(fc.array(load, { minLength: 1, maxLength: 40 }), fc.integer({ min: 1, max: 28 }), (days, length) => {
      const late = exponentialMean([NaN, NaN, ...days], length);
      expect(late.slice(0, 2)).toEqual([NaN, NaN]);
      expect(late.slice(2)).toEqual(exponentialMean(days, length));
      const low = exponentialMean(days, length, 0);
      const high = exponentialMean(days, length, 1000);
      const kept = (1 - 2 / (length + 1)) ** days.length;
      expect(high.at(-1)! - low.at(-1)!).toBeCloseTo(1000 * kept, 6);
      expect(exponentialMean([...days, NaN, 5], length).slice(-2)).toEqual([NaN, NaN]);
    }),
  );
});
