/** Factor of a symmetric matrix; columns that depend on those before them are left out. */
export interface Factor {
  /** Columns kept, in order. */
  readonly kept: readonly number[];
  /** Lower triangle of the kept columns: lower·lowerᵀ = matrix. */
  readonly lower: readonly (readonly number[])[];
}

/**
 * Cholesky factor of a symmetric, non-negative matrix, passing over dependent columns.
 *
 * @param matrix n × n
 * @param tolerance a column is dependent if what is left of its diagonal is at most this share of it
 * @returns the kept columns and their factor
 */
export function cholesky(matrix: readonly (readonly number[])[], tolerance: number): Factor {
  const kept: number[] = [];
  const lower: number[][] = [];
  for (let column = 0; column < matrix.length; column += 1) {
    const row: number[] = [];
    let rest = matrix[column]![column]!;
    for (let k = 0; k < kept.length; k += 1) {
      const other = lower[k]!;
      let sum = matrix[column]![kept[k]!]!;
      for (let j = 0; j < k; j += 1) sum -= row[j]! * other[j]!;
      row.push(sum / other[k]!);
      rest -= row[k]! * row[k]!;
    }
    if (!(rest > tolerance * matrix[column]![column]!)) continue;
    row.push(Math.sqrt(rest));
    kept.push(column);
    lower.push(row);
  }
  return { kept, lower };
}

/** Solves lower·x = right. */
export function forward({ lower }: Factor, right: readonly number[]): number[] {
  const solution: number[] = [];
  lower.forEach((row, k) => {
    let sum = right[k]!;
    for (let j = 0; j < k; j += 1) sum -= row[j]! * solution[j]!;
    solution.push(sum / row[k]!);
  });
  return solution;
}

/** Solves lower·lowerᵀ·x = right. */
export function solve(factor: Factor, right: readonly number[]): number[] {
  const { lower } = factor;
  const solution = forward(factor, right);
  for (let k = lower.length - 1; k >= 0; k -= 1) {
    let sum = solution[k]!;
    for (let j = k + 1; j < lower.length; j += 1) sum -= lower[j]![k]! * solution[j]!;
    solution[k] = sum / lower[k]![k]!;
  }
  return solution;
}
