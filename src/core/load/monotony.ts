import { loadSeries, within } from '../guard.ts';
import { mean } from '../series/mean.ts';
import { standardDeviationPopulation, standardDeviationSample } from '../series/standard-deviation.ts';

/**
 * Monotony of a week with the population standard deviation.
 *
 * How alike the days were: a week of equal days scores high, a week of hard and easy days scores low.
 *
 * @param days daily loads [load units], usually 7; 0 = rest, NaN = unknown
 * @returns monotony [no unit]; NaN if a day is unknown or all days are equal (also seven days of rest)
 * @throws NumericInputError on a negative or infinite load
 * @remarks Equation: monotony = mean ÷ SD, SD divided by n.
 * Limits: the paper does not settle n or n − 1; for seven days this form is 1.0801 times the sample form, which can turn a limit of 2.
 * It ignores the size of the load: six equal easy days and one of rest exceed 2.
 * @see Foster C 1998, Med Sci Sports Exerc 30(7):1164–1168; Foster C et al. 2001, J Strength Cond Res 15(1):109–115
 * @example
 * monotonyPopulation([0, 100, 200, 300, 400, 500, 600]); // => 1.5
 */
export function monotonyPopulation(days: readonly number[]): number {
  loadSeries('monotonyPopulation', 'days', days);
  return quotient(mean(days), standardDeviationPopulation(days));
}

/**
 * Monotony of a week with the sample standard deviation.
 *
 * The same question; for comparison with reports that divide by n − 1.
 *
 * @param days daily loads [load units], usually 7; 0 = rest, NaN = unknown
 * @returns monotony [no unit]; NaN if a day is unknown or all days are equal
 * @throws NumericInputError on a negative or infinite load
 * @remarks Equation: monotony = mean ÷ SD, SD divided by n − 1. Limits: as for the population form; never mix the two.
 * @see Foster C 1998, Med Sci Sports Exerc 30(7):1164–1168
 * @example
 * monotonySample([0, 100, 200, 300, 400, 500, 600]); // => 1.3887301
 */
export function monotonySample(days: readonly number[]): number {
  loadSeries('monotonySample', 'days', days);
  return quotient(mean(days), standardDeviationSample(days));
}

/**
 * Strain of a week.
 *
 * A week that was both heavy and even.
 *
 * @param weekLoad load of the week [load units], 0 or more; NaN = unknown
 * @param monotony monotony of the same week [no unit], 0 or more; NaN = undefined
 * @returns strain [load units]; NaN if one of the two is
 * @throws NumericInputError on a negative or infinite value
 * @remarks Equation: strain = week's load × monotony. Limits: inherits the choice of standard deviation; thresholds are individual.
 * @see Foster C 1998, Med Sci Sports Exerc 30(7):1164–1168; Foster C et al. 2001, J Strength Cond Res 15(1):109–115
 * @example
 * strain(3400, 1.26); // => 4284
 */
export function strain(weekLoad: number, monotony: number): number {
  if (!Number.isNaN(weekLoad)) within('strain', 'weekLoad', weekLoad, 0, Infinity);
  if (!Number.isNaN(monotony)) within('strain', 'monotony', monotony, 0, Infinity);
  return weekLoad * monotony;
}

function quotient(numerator: number, denominator: number): number {
  return denominator > 0 ? numerator / denominator : NaN;
}
