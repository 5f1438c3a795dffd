/**
 * Solves a square system of linear equations by elimination with the largest pivot.
 *
 * @param matrix rows of the system, n × n
 * @param right right-hand side, n
 * @returns the n unknowns; null where a pivot is smaller than 1e-12 of the largest entry (no single solution)
 */
export function solveLinear(matrix: readonly (readonly number[])[], right: readonly number[]): number[] | null {
  const n = right.length;
  const rows = matrix.map((row, index) => [...row, right[index]!]);
  const largest = Math.max(...matrix.flat().map(Math.abs));
  for (let column = 0; column < n; column += 1) {
    let pivot = column;
    for (let row = column + 1; row < n; row += 1) {
      if (Math.abs(rows[row]![column]!) > Math.abs(rows[pivot]![column]!)) pivot = row;
    }
    [rows[column], rows[pivot]] = [rows[pivot]!, rows[column]!];
    const lead = rows[column]!;
    if (!(Math.abs(lead[column]!) > 1e-12 * largest)) return null;
    for (let row = column + 1; row < n; row += 1) {
      const factor = rows[row]![column]! / lead[column]!;
      if (factor === 0) continue;
      for (let k = column; k <= n; k += 1) rows[row]![k]! -= factor * lead[k]!;
    }
  }
  const solution = new Array<number>(n).fill(0);
  for (let row = n - 1; row >= 0; row -= 1) {
    const known = solution.reduce((sum, value, k) => (k > row ? sum + rows[row]![k]! * value : sum), 0);
    solution[row] = (rows[row]![n]! - known) / rows[row]![row]!;
  }
  return solution;
}
