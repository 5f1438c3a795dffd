import { describe, expect, test } from '@jest/globals';
import fc from 'fast-check';
import { NumericInputError } from '../../../src/core/numeric-input-error.ts';
import { columnsOfRows, weightedLeastSquares } from '../../../src/core/numeric/weighted-least-squares.ts';
import { medianInPlace } from '../../../src/core/numeric/median-in-place.ts';
import { normalDensity } from '../../../src/core/numeric/normal.ts';
import { censoredMean } from '../../../src/core/response-signs/censored-mean.ts';
import { huberRegression } from '../../../src/core/response-signs/huber-regression.ts';
import { median } from '../../../src/core/series/median.ts';
import { seededNormal } from '../../verify/seeded.ts';

// Stack loss of a plant: Brownlee KA 1965, Statistical Theory and Methodology in Science and Engineering, p. 454.
const AIR = [80, 80, 75, 62, 62, 62, 62, 62, 58, 58, 58, 58, 58, 58, 50, 50, 50, 50, 50, 56, 70];
const WATER = [27, 27, 25, 24, 22, 23, 24, 24, 23, 18, 18, 17, 18, 19, 18, 18, 19, 19, 20, 20, 20];
const ACID = [89, 88, 90, 87, 87, 87, 93, 93, 87, 80, 89, 88, 82, 93, 89, 86, 72, 79, 80, 82, 91];
const LOSS = [42, 37, 37, 28, 18, 18, 19, 20, 15, 14, 14, 13, 11, 12, 8, 7, 8, 8, 9, 15, 15];
const PLANT = AIR.map((air, index) => [1, air, WATER[index]!, ACID[index]!]);

function leastSquares(rows: readonly number[][], values: readonly number[]): readonly number[] {
  const ones = new Float64Array(values.length).fill(1);
  return weightedLeastSquares(columnsOfRows(rows), Float64Array.from(values), ones).coefficients;
}

test('agrees with the documented result of a general statistics library on the stack loss data', () => {
  // statsmodels 0.10 documentation, robust linear models: Huber's T, spread from the median absolute deviation.
  const documented = [-41.02649835, 0.82938433, 0.92606597, -0.12784672];
  const { coefficients, status } = huberRegression(PLANT, LOSS);
  expect(status).toBe('converged');
  coefficients.forEach((one, index) => expect(one).toBeCloseTo(documented[index]!, 5));
});

test('a location by hand: the odd value counts as 1.345 spreads, no more', () => {
  // 1 + 2 + 3 + 4 − 4m + 1.345·2 = 0.
  const { coefficients, weights } = huberRegression([1, 1, 1, 1, 1].map((one) => [one]), [1, 2, 3, 4, 100], { leastScale: 2 }); // prettier-ignore
  expect(coefficients[0]).toBeCloseTo(12.69 / 4, 6);
  expect(weights.slice(0, 4)).toEqual([1, 1, 1, 1]);
  expect(weights[4]).toBeCloseTo(2.69 / (100 - 12.69 / 4), 5);
});

test('without odd values it is least squares: the weights are all 1', () => {
  const rows = Array.from({ length: 30 }, (_, index) => [1, index]);
  const values = rows.map(([, x]) => 2 + 0.5 * x! + (x! % 2 === 0 ? 1 : -1));
  const { weights, coefficients } = huberRegression(rows, values);
  expect(new Set(weights)).toEqual(new Set([1]));
  const plain = leastSquares(rows, values);
  coefficients.forEach((one, index) => expect(one).toBeCloseTo(plain[index]!, 9));
});

test('a tenth of gross errors moves it little, and least squares much', () => {
  const normal = seededNormal(5);
  const rows = Array.from({ length: 60 }, (_, index) => [1, index / 10]);
  const values = rows.map(([, x], index) => 2 + 3 * x! + 0.5 * normal() + (index % 10 === 9 ? 40 : 0));
  const plain = leastSquares(rows, values);
  const robust = huberRegression(rows, values);
  expect(Math.abs(plain[0]! + 3 * plain[1]! - 11)).toBeGreaterThan(3);
  expect(Math.abs(robust.coefficients[0]! + 3 * robust.coefficients[1]! - 11)).toBeLessThan(0.4);
  expect(robust.scale).toBeGreaterThan(0.3);
  expect(robust.scale).toBeLessThan(0.9);
});

test('scaling and shifting the values scales and shifts the relation', () => {
  fc.assert(
    fc.property(fc.double({ min: 0.1, max: 50, noNaN: true }), fc.integer({ min: -50, max: 50 }), (factor, shift) => {
      const before = huberRegression(PLANT, LOSS);
      const after = huberRegression(PLANT, LOSS.map((one) => factor * one + shift)); // prettier-ignore
      expect(after.scale / factor).toBeCloseTo(before.scale, 3);
      after.fitted.forEach((one, index) => expect((one - shift) / factor).toBeCloseTo(before.fitted[index]!, 3));
    }),
  );
});

test('a column that depends on others changes nothing and gets no coefficient', () => {
  const doubled = PLANT.map((row) => [...row, 2 * row[1]! - row[2]!, 0]);
  const [plain, more] = [huberRegression(PLANT, LOSS), huberRegression(doubled, LOSS)];
  expect(more.coefficients.slice(4)).toEqual([0, 0]);
  expect(more.factor.kept).toEqual([0, 1, 2, 3]);
  more.fitted.forEach((one, index) => expect(one).toBeCloseTo(plain.fitted[index]!, 6));
});

test('says when it has not settled, or cannot', () => {
  expect(huberRegression(PLANT, LOSS, { maxIterations: 2 }).status).toBe('max-iterations');
  expect(huberRegression([[1, 0], [1, 1]], [1, 2]).status).toBe('degenerate'); // prettier-ignore
  expect(huberRegression([], [])).toMatchObject({ status: 'degenerate', coefficients: [] });
  const constant = huberRegression([[1], [1], [1]], [4, 4, 4]); // prettier-ignore
  expect(constant.status).toBe('converged');
  expect(constant.coefficients[0]).toBeCloseTo(4, 12);
  expect(constant.scale).toBeCloseTo(0, 12);
});

test('refuses lists that do not fit each other', () => {
  expect(() => huberRegression([[1]], [])).toThrow(NumericInputError);
  expect(() => huberRegression([[1], [1, 2]], [1, 2])).toThrow(/rows\[1\]/);
  expect(() => huberRegression([[1], [NaN]], [1, 2])).toThrow(/rows\[1\]\[0\]/);
  expect(() => huberRegression([[1]], [Infinity])).toThrow(/values\[0\]/);
  expect(() => huberRegression([[1]], [1], { atLeast: [] })).toThrow(/atLeast/);
  expect(() => huberRegression([[1]], [1], { tuning: 0 })).toThrow(/tuning/);
});

describe('lower bounds', () => {
  test('the expected size above a bound is the mean of the tail', () => {
    for (const [bound, centre, sd] of [
      [9, 7.5, 0.8],
      [9, 10, 1],
      [0, 5, 2],
    ] as const) {
      let [mass, moment] = [0, 0];
      for (let x = bound; x < Math.max(bound, centre) + 12 * sd; x += 1e-4) {
        const density = normalDensity((x + 5e-5 - centre) / sd);
        mass += density;
        moment += density * (x + 5e-5);
      }
      expect(censoredMean(bound, centre, sd)).toBeCloseTo(moment / mass, 4);
    }
  });

  test('a bound far below says nothing, one far above is all there is', () => {
    expect(censoredMean(-50, 3, 1)).toBeCloseTo(3, 12);
    expect(censoredMean(53, 3, 1)).toBeCloseTo(53.02, 2);
    // Across the place where the tail is taken from its expansion.
    expect(censoredMean(6.0001, 0, 1) - censoredMean(5.9999, 0, 1)).toBeLessThan(0.02);
    expect(() => censoredMean(9, 7, 0)).toThrow(/sd/);
  });

  test('ratings cut off at 9 pull the slope down; taken as "at least 9" they do not', () => {
    const normal = seededNormal(12);
    const rows = Array.from({ length: 400 }, (_, index) => [1, (index % 40) / 4]);
    const felt = rows.map(([, x]) => 1 + x! + 0.8 * normal());
    const said = felt.map((one) => Math.min(9, one));
    const atLeast = felt.map((one) => one >= 9);
    const [cut, bounded] = [huberRegression(rows, said), huberRegression(rows, said, { atLeast })];
    expect(cut.coefficients[1]!).toBeLessThan(0.97);
    expect(Math.abs(bounded.coefficients[1]! - 1)).toBeLessThan(0.02);
    expect(Math.abs(bounded.coefficients[0]! - 1)).toBeLessThan(0.15);
  });
});

test('the median by selection is the median', () => {
  fc.assert(
    fc.property(fc.array(fc.integer({ min: -20, max: 20 }), { minLength: 1, maxLength: 60 }), (values) => {
      expect(medianInPlace(Float64Array.from(values))).toBeCloseTo(median(values), 12);
    }),
  );
  expect(medianInPlace(new Float64Array(0))).toBeNaN();
});
