import { above, within } from '../guard.ts';
import { NumericInputError } from '../numeric-input-error.ts';
import { standardDeviationSample } from '../series/standard-deviation.ts';

/**
 * Typical error of a measurement from two trials of several athletes.
 *
 * By how much one athlete's result varies from trial to trial without anything having changed.
 *
 * @param first results of the first trial [any unit], one an athlete
 * @param second results of the same athletes in the second trial [same unit]
 * @returns typical error [unit of the results]; NaN with fewer than two athletes or an unknown result
 * @throws NumericInputError if the trials hold different numbers of athletes
 * @remarks Equation: SD of the differences (n − 1) ÷ √2. Limits: about 50 athletes and 3 trials are wanted for a precise value.
 * @see Hopkins WG 2000, Sports Med 30(1):1–15
 * @example
 * typicalError([250, 262, 241], [253, 259, 246]); // => 2.9439203
 */
export function typicalError(first: readonly number[], second: readonly number[]): number {
  return standardDeviationSample(differences('typicalError', first, second)) / Math.SQRT2;
}

/**
 * Typical error as a coefficient of variation.
 *
 * @param first results of the first trial [any unit], above 0, one an athlete
 * @param second results of the same athletes in the second trial [same unit], above 0
 * @returns typical error [%]; NaN with fewer than two athletes or an unknown result
 * @throws NumericInputError on a result that is not above 0, or trials of different numbers of athletes
 * @remarks Equation: 100·(e^s − 1), s = SD of the differences of ln results (n − 1) ÷ √2. Limits: as for the typical error.
 * @see Hopkins WG 2000, Sports Med 30(1):1–15
 * @example
 * typicalErrorPercent([250, 262, 241], [253, 259, 246]); // => 1.179866
 */
export function typicalErrorPercent(first: readonly number[], second: readonly number[]): number {
  const log = (name: string, values: readonly number[]) =>
    values.map((value, index) =>
      Number.isNaN(value) ? NaN : Math.log(above('typicalErrorPercent', `${name}[${index}]`, value, 0)),
    );
  const of = differences('typicalErrorPercent', log('first', first), log('second', second));
  return 100 * Math.expm1(standardDeviationSample(of) / Math.SQRT2);
}

/**
 * Half-width of the limits of agreement of two trials.
 *
 * @param typicalErrorOfOne typical error of one trial [any unit], 0 or more
 * @returns half-width [unit of the typical error]
 * @throws NumericInputError on a negative or infinite typical error
 * @remarks Equation: 1.96·√2·TE = 2.77186·TE. Limits: too wide a limit for deciding on one athlete, by the paper's own argument.
 * @see Hopkins WG 2000, Sports Med 30(1):1–15
 * @example
 * limitsOfAgreement(1); // => 2.7718586
 */
export function limitsOfAgreement(typicalErrorOfOne: number): number {
  return 1.96 * Math.SQRT2 * within('limitsOfAgreement', 'typicalErrorOfOne', typicalErrorOfOne, 0, Infinity);
}

/**
 * Smallest worthwhile change of a fitness measure.
 *
 * @param results results of different athletes [any unit]
 * @returns smallest worthwhile change [unit of the results]; NaN with fewer than two athletes or an unknown result
 * @remarks Equation: 0.2 × between-athlete SD (n − 1). Limits: depends on who was measured; a competition measure takes 0.3 × the own variation instead.
 * @see Hopkins WG 2000, Sports Med 30(1):1–15
 * @example
 * smallestWorthwhileChange([250, 262, 241, 275, 258, 269]); // => 2.4832773
 */
export function smallestWorthwhileChange(results: readonly number[]): number {
  return 0.2 * standardDeviationSample(results);
}

function differences(fn: string, first: readonly number[], second: readonly number[]): number[] {
  if (first.length !== second.length) {
    throw new NumericInputError(
      fn,
      'second',
      second.length,
      `${first.length} results, one an athlete of the first trial`,
    );
  }
  return first.map((value, index) => second[index]! - value);
}
