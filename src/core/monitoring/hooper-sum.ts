import { whole } from '../guard.ts';

/**
 * Sum of the four morning ratings of Hooper and Mackinnon.
 *
 * @param sleep quality of sleep, 1 very, very good to 7 very, very bad; NaN = not answered
 * @param fatigue fatigue, 1 very, very low to 7 very, very high; NaN = not answered
 * @param stress stress, same scale; NaN = not answered
 * @param soreness muscle soreness, same scale; NaN = not answered
 * @returns sum [4 to 28, higher is worse]; NaN if one answer is missing
 * @throws NumericInputError on an answer that is no whole number from 1 to 7
 * @remarks Equation: sleep + fatigue + stress + soreness. Limits: no population limit was found; compare with the own mean only.
 * @see Hooper SL et al. 1995, Med Sci Sports Exerc 27(1):106–112; scale: value from memory
 * @example
 * hooperSum(3, 4, 2, 5); // => 14
 */
export function hooperSum(sleep: number, fatigue: number, stress: number, soreness: number): number {
  for (const [name, value] of Object.entries({ sleep, fatigue, stress, soreness })) {
    if (!Number.isNaN(value)) whole('hooperSum', name, value, 1, 7);
  }
  return sleep + fatigue + stress + soreness;
}
