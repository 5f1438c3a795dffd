import type { Factor } from './cholesky.ts';
import { cholesky, solve } from './cholesky.ts';

/** Coefficients, 0 for columns that depend on earlier ones, the fitted values, and the factor of the normal equations. */
export interface LeastSquares {
  readonly coefficients: readonly number[];
  readonly fitted: Float64Array;
  readonly factor: Factor;
}

/** A column is dependent if this share of its square sum is all that the earlier ones leave. */
const DEPENDENT = 1e-9;

/** Weighted least squares by the normal equations, column by column; plain loops, because a squad asks for thousands of fits. */
export function weightedLeastSquares(
  columns: readonly Float64Array[],
  values: Float64Array,
  weights: Float64Array,
): LeastSquares {
  const weighted = new Float64Array(values.length);
  const right: number[] = [];
  const gram = columns.map((column, j) => {
    for (let i = 0; i < weighted.length; i += 1) weighted[i] = weights[i]! * column[i]!;
    right.push(dot(weighted, values));
    return columns.map((other, k) => (k <= j ? dot(weighted, other) : 0));
  });
  const factor = cholesky(gram, DEPENDENT);
  const solution = solve(
    factor,
    factor.kept.map((column) => right[column]!),
  );
  const coefficients = columns.map(() => 0);
  const fitted = new Float64Array(values.length);
  factor.kept.forEach((kept, k) => {
    const [column, coefficient] = [columns[kept]!, solution[k]!];
    coefficients[kept] = coefficient;
    for (let i = 0; i < fitted.length; i += 1) fitted[i]! += coefficient * column[i]!;
  });
  return { coefficients, fitted, factor };
}

/** The columns of rows of one length. */
export function columnsOfRows(rows: readonly (readonly number[])[]): Float64Array[] {
  return (rows[0] ?? []).map((_, column) => Float64Array.from(rows, (row) => row[column]!));
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i += 1) sum += a[i]! * b[i]!;
  return sum;
}
