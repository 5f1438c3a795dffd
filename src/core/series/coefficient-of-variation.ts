import { mean } from './mean.ts';
import { standardDeviationSample } from './standard-deviation.ts';

/**
 * Coefficient of variation.
 *
 * @param values values [any unit] on a scale with a true zero, at least two
 * @returns coefficient of variation [%]; NaN if a value is NaN, there are fewer than two, or their mean is 0
 * @remarks Equation: 100 × SD (n − 1) ÷ mean. Limits: of logarithms it depends on the unit the logarithm was taken in.
 * @see textbook definition; for ln RMSSD Plews DJ et al. 2012, Eur J Appl Physiol 112(11):3729–3741
 * @example
 * coefficientOfVariation([4.1, 4.25, 3.95, 4.3, 4.05, 4.2, 4.15]); // => 2.9089771
 */
export function coefficientOfVariation(values: readonly number[]): number {
  const centre = mean(values);
  return centre === 0 ? NaN : (100 * standardDeviationSample(values)) / centre;
}
