import { above, whole, within } from '../guard.ts';
import { NumericInputError } from '../numeric-input-error.ts';
import { medianInPlace } from '../numeric/median-in-place.ts';
import type { Factor } from '../numeric/cholesky.ts';
import { columnsOfRows, weightedLeastSquares } from '../numeric/weighted-least-squares.ts';
import { censoredMean } from './censored-mean.ts';

/** A fitted relation; the factor of its normal equations names the columns kept. */
export interface HuberFit {
  readonly status: 'converged' | 'max-iterations' | 'degenerate';
  readonly iterations: number;
  readonly coefficients: readonly number[];
  readonly fitted: readonly number[];
  readonly factor: Factor;
  /** Robust spread of the residuals. */
  readonly scale: number;
  readonly weights: readonly number[];
}

const MAD_TO_SD = 1.4826;

/**
 * Robust regression after Huber by iteratively reweighted least squares.
 *
 * A line through the bulk of the values, to which a few odd ones do not matter much.
 *
 * @param rows explanatory values [any units], one row a value, all of one length; a constant needs its own column
 * @param values values to explain [any unit], one a row
 * @param options tuning 1.345 [SD], maxIterations 100, tolerance 1e-6 [SD], leastScale 0 [unit of the values]: a smaller spread counts
 *   as this; atLeast: per value true where it is only a lower bound
 * @returns coefficients [unit of the values per unit of the column], 0 for a column that depends on earlier ones; fitted values and scale
 *   [unit of the values]; weights [0 to 1]; factor; status, degenerate with NaN coefficients if there are not more values than columns kept
 * @throws NumericInputError on lists of different lengths, a value that is not finite or an option out of range
 * @remarks Equation: weights min(1, k·s ÷ |r|), s = 1.4826·median |r|, weighted least squares until no fitted value moves by more than the tolerance.
 * A lower bound is replaced in each step by its expected size under the present fit, and left out of the median.
 * Limits: an odd value of an explanatory column keeps its pull; with more than a few lower bounds the normal tail matters.
 * @see Huber PJ 1973, Ann Stat 1(5):799–821; Holland PW, Welsch RE 1977, Commun Stat A 6(9):813–827 for weights and 1.345; Schmee J, Hahn GJ 1979, Technometrics 21(4):417–432 for lower bounds; values from memory
 * @example
 * huberRegression([[1], [1], [1], [1], [1]], [1, 2, 3, 4, 100], { leastScale: 2 }).coefficients; // => [3.1725]
 */
export function huberRegression(
  rows: readonly (readonly number[])[],
  values: readonly number[],
  options: {
    tuning?: number;
    maxIterations?: number;
    tolerance?: number;
    leastScale?: number;
    atLeast?: readonly boolean[];
  } = {},
): HuberFit {
  const { tuning = 1.345, maxIterations = 100, tolerance = 1e-6, leastScale = 0 } = options;
  const { atLeast = values.map(() => false) } = options;
  above('huberRegression', 'tuning', tuning, 0);
  whole('huberRegression', 'maxIterations', maxIterations, 1);
  above('huberRegression', 'tolerance', tolerance, 0, 1);
  within('huberRegression', 'leastScale', leastScale, 0, Infinity);
  check(rows, values, atLeast);
  const columns = columnsOfRows(rows);
  const shown = Float64Array.from(values);
  const weights = new Float64Array(values.length).fill(1);
  let fit = weightedLeastSquares(columns, shown, weights);
  const outcome = (status: HuberFit['status'], iterations: number, scale: number): HuberFit => ({
    ...{ status, iterations, scale, factor: fit.factor, fitted: [...fit.fitted], weights: [...weights] },
    coefficients: status === 'degenerate' ? columns.map(() => NaN) : fit.coefficients,
  });
  if (fit.factor.kept.length >= values.length) return outcome('degenerate', 0, NaN);
  const negligible = 1e-9 * (1 + Math.max(...values.map(Math.abs)));
  for (let iteration = 1; ; iteration += 1) {
    const { fitted } = fit;
    const scale = Math.max(MAD_TO_SD * medianInPlace(knownSizes(values, fitted, atLeast)), leastScale);
    for (let i = 0; i < values.length; i += 1) {
      if (atLeast[i]! && scale > 0) shown[i] = censoredMean(values[i]!, fitted[i]!, scale);
      const size = Math.abs(shown[i]! - fitted[i]!);
      weights[i] = size <= tuning * scale ? 1 : (tuning * scale) / size;
    }
    fit = weightedLeastSquares(columns, shown, weights);
    let moved = 0;
    for (let i = 0; i < fitted.length; i += 1) moved = Math.max(moved, Math.abs(fit.fitted[i]! - fitted[i]!));
    if (moved <= Math.max(tolerance * scale, negligible)) return outcome('converged', iteration, scale);
    if (iteration === maxIterations) return outcome('max-iterations', iteration, scale);
  }
}

/** Sizes of the residuals, lower bounds left out. */
function knownSizes(values: readonly number[], fitted: Float64Array, atLeast: readonly boolean[]): Float64Array {
  const sizes = new Float64Array(values.length);
  let count = 0;
  for (let i = 0; i < values.length; i += 1) {
    if (atLeast[i]!) continue;
    sizes[count] = Math.abs(values[i]! - fitted[i]!);
    count += 1;
  }
  return sizes.subarray(0, count);
}

function check(rows: readonly (readonly number[])[], values: readonly number[], atLeast: readonly boolean[]): void {
  const fn = 'huberRegression';
  if (rows.length !== values.length) {
    throw new NumericInputError(fn, 'values', values.length, `${rows.length} values, one a row`);
  }
  if (atLeast.length !== values.length) {
    throw new NumericInputError(fn, 'atLeast', atLeast.length, `${values.length} entries, one a value`);
  }
  const width = rows[0]?.length ?? 0;
  rows.forEach((row, index) => {
    if (row.length !== width) throw new NumericInputError(fn, `rows[${index}]`, row.length, `${width} numbers`);
    row.forEach((one, k) => within(fn, `rows[${index}][${k}]`, one, -Infinity, Infinity));
    within(fn, `values[${index}]`, values[index]!, -Infinity, Infinity);
  });
}
