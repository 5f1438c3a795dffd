import { expect, test } from '@jest/globals';
import fc from 'fast-check';
import * as reference from 'simple-statistics';
import { dailySum } from '../../src/core/load/daily-sum.ts';
import { domainLoad, THREE_PHASE_WEIGHTS } from '../../src/core/load/domain-load.ts';
import { heartRateLoadBanister } from '../../src/core/load/heart-rate-load-banister.ts';
import { heartRateLoadEdwards } from '../../src/core/load/heart-rate-load-edwards.ts';
import { heartRateLoadThreePhase, phaseShares } from '../../src/core/load/heart-rate-load-three-phase.ts';
import { monotonyPopulation, monotonySample, strain } from '../../src/core/load/monotony.ts';
import { correlation } from '../../src/core/ratio/correlation.ts';
import { mean } from '../../src/core/series/mean.ts';
import { median } from '../../src/core/series/median.ts';
import { quantile } from '../../src/core/series/quantile.ts';
import { standardDeviationPopulation, standardDeviationSample } from '../../src/core/series/standard-deviation.ts';

const load = fc.integer({ min: 0, max: 1500 });
/** Seven days of which at least two differ. */
const week = fc.array(load, { minLength: 7, maxLength: 7 }).filter((days) => new Set(days).size > 1);
const factor = fc.integer({ min: 1, max: 400 }).map((hundredths) => hundredths / 100);
const minutes = fc.integer({ min: 0, max: 300 });

// Foster C 1998, Med Sci Sports Exerc 30(7):1164–1168; the exact case 0, 100 … 600 follows from the formula.
test('the week 0 to 600: mean 300, standard deviation 200', () => {
  const days = [0, 100, 200, 300, 400, 500, 600];
  expect([mean(days), standardDeviationPopulation(days)]).toEqual([300, 200]);
});

// k equal days and 7 − k of rest: √(k ÷ (7 − k)), and √(6k ÷ (7(7 − k))) by the sample form; derived from the formula.
test.each([1, 2, 3, 4, 5, 6])('monotony of %d equal days and the rest off', (k) => {
  const days = [...Array<number>(k).fill(130), ...Array<number>(7 - k).fill(0)];
  expect(monotonyPopulation(days)).toBeCloseTo(Math.sqrt(k / (7 - k)), 10);
  expect(monotonySample(days)).toBeCloseTo(Math.sqrt((6 * k) / (7 * (7 - k))), 10);
});

test('monotony keeps its value and strain its proportion when loads are scaled and shuffled', () => {
  fc.assert(
    fc.property(week, factor, fc.nat(6), (days, c, turn) => {
      const other = [...days.slice(turn), ...days.slice(0, turn)].reverse().map((value) => value * c);
      for (const monotony of [monotonyPopulation, monotonySample]) {
        expect(monotony(other) / monotony(days)).toBeCloseTo(1, 9);
        expect(strain(dailySum(other), monotony(other)) / strain(dailySum(days), monotony(days))).toBeCloseTo(c, 8);
      }
    }),
  );
});

test('a shift upwards makes a week more monotonous, and the two forms differ by one factor', () => {
  fc.assert(
    fc.property(week, fc.integer({ min: 1, max: 500 }), (days, shift) => {
      expect(monotonyPopulation(days.map((value) => value + shift))).toBeGreaterThan(monotonyPopulation(days));
      expect(monotonyPopulation(days)).toBeCloseTo(monotonySample(days) * Math.sqrt(7 / 6), 9);
    }),
  );
});

test('a constant week of any size, also of fractions, has no monotony; an unknown day makes it unknown', () => {
  fc.assert(
    fc.property(fc.double({ min: 0, max: 2000, noNaN: true }), (value) => {
      const days = Array<number>(7).fill(value);
      expect([monotonyPopulation(days), monotonySample(days), strain(7 * value, NaN)]).toEqual([NaN, NaN, NaN]);
    }),
  );
  expect(monotonyPopulation([1, 2, 3, NaN, 4, 5, 6])).toBeNaN();
});

test('heart-rate load of Banister rises with minutes in proportion and with heart rate more than that', () => {
  const inReserve = fc.integer({ min: 61, max: 189 });
  fc.assert(
    fc.property(inReserve, fc.constantFrom('female' as const, 'male' as const), factor, (heartRateBpm, sex, c) => {
      const of = (durationMin: number, bpm: number): number =>
        heartRateLoadBanister({ durationMin, heartRateBpm: bpm, restingBpm: 60, maxBpm: 190, sex });
      expect(of(60 * c, heartRateBpm)).toBeCloseTo(c * of(60, heartRateBpm), 6);
      // Bending upwards: the load of the mean lies below the mean of the loads.
      expect(of(60, heartRateBpm - 1) + of(60, heartRateBpm + 1)).toBeGreaterThan(2 * of(60, heartRateBpm));
    }),
  );
});

test('weighted minutes add up, scale, and agree where schemes coincide', () => {
  fc.assert(
    fc.property(minutes, minutes, minutes, factor, (a, b, c, k) => {
      const domains = { moderate: a, heavy: b, severe: c, extreme: 0 };
      expect(domainLoad(domains)).toBe(heartRateLoadThreePhase([a, b, c]));
      expect(domainLoad({ ...domains, severe: 0, extreme: c })).toBe(domainLoad(domains));
      expect(heartRateLoadEdwards([a, b, c, 0, 0])).toBe(domainLoad(domains, THREE_PHASE_WEIGHTS));
      expect(domainLoad({ moderate: a * k, heavy: b * k, severe: c * k, extreme: 0 })).toBeCloseTo(
        k * domainLoad(domains),
        6,
      );
      if (a + b + c > 0) expect(dailySum(phaseShares([a, b, c]))).toBeCloseTo(1, 12);
    }),
  );
  expect(phaseShares([0, 0, 0])).toEqual([NaN, NaN, NaN]);
});

test('mean, spread, median and correlation agree with a statistics library', () => {
  const values = fc.array(fc.double({ min: 0, max: 1000, noNaN: true }), { minLength: 3, maxLength: 40 });
  fc.assert(
    fc.property(values, fc.integer(), (x, seed) => {
      const y = x.map((value, index) => value * 0.5 + Math.abs(Math.sin(seed + index)) * 300);
      fc.pre(reference.standardDeviation(x) > 1e-3 && reference.standardDeviation(y) > 1e-3);
      expect(mean(x)).toBeCloseTo(reference.mean(x), 8);
      expect(standardDeviationPopulation(x)).toBeCloseTo(reference.standardDeviation(x), 7);
      expect(standardDeviationSample(x)).toBeCloseTo(reference.sampleStandardDeviation(x), 7);
      expect(median(x)).toBeCloseTo(reference.median(x), 9);
      expect(correlation(x, y)).toBeCloseTo(reference.sampleCorrelation(x, y), 6);
    }),
  );
});

test('the quantile agrees with the library and skips what is unknown', () => {
  const share = fc.double({ min: 0, max: 1, noNaN: true });
  fc.assert(
    fc.property(fc.array(load, { minLength: 1, maxLength: 30 }), share, (values, q) => {
      expect(quantile(values, q)).toBeCloseTo(reference.quantile(values, q), 6);
      expect(quantile([NaN, ...values, NaN], q)).toBe(quantile(values, q));
    }),
  );
  expect(quantile([NaN], 0.5)).toBeNaN();
});
