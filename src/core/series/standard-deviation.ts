import { mean } from './mean.ts';

/**
 * Population standard deviation (divided by n).
 *
 * The spread of all seven days of a week, taken as the whole of that week.
 *
 * @param values values [any unit]
 * @returns standard deviation [unit of the values]; NaN if a value is NaN or there is none; exactly 0 for equal values
 * @remarks Equation: s = √(Σ(x − mean)² ÷ n). Limits: smaller than the sample form by the factor √((n−1)/n).
 * @see textbook definition
 * @example
 * standardDeviationPopulation([0, 100, 200, 300, 400, 500, 600]); // => 200
 */
export function standardDeviationPopulation(values: readonly number[]): number {
  return Math.sqrt(squaredDeviations(values) / values.length);
}

/**
 * Sample standard deviation (divided by n − 1).
 *
 * The spread of a larger whole, estimated from a few values of it.
 *
 * @param values values [any unit], at least two
 * @returns standard deviation [unit of the values]; NaN if a value is NaN or there are fewer than two; exactly 0 for equal values
 * @remarks Equation: s = √(Σ(x − mean)² ÷ (n−1)). Limits: undefined for a single value.
 * @see textbook definition
 * @example
 * standardDeviationSample([2, 4, 6]); // => 2
 */
export function standardDeviationSample(values: readonly number[]): number {
  return values.length < 2 ? NaN : Math.sqrt(squaredDeviations(values) / (values.length - 1));
}

function squaredDeviations(values: readonly number[]): number {
  const first = values[0];
  if (first === undefined) return NaN;
  // Equal values have no spread; rounding in their mean must not invent one.
  if (values.every((value) => value === first)) return 0;
  const centre = mean(values);
  return values.reduce((sum, value) => sum + (value - centre) ** 2, 0);
}
