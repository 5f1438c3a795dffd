import { NumericInputError } from '../numeric-input-error.ts';
import { within } from '../guard.ts';

/**
 * Three-phase load of Lucía: minutes below, between and above the two ventilatory thresholds, weighted 1, 2, 3.
 *
 * Weighs endurance work by the athlete's own two thresholds.
 *
 * @param minutes minutes in phases I, II, III [min], each 0 or more
 * @returns load [weighted min]
 * @throws NumericInputError on negative minutes or another number of phases
 * @remarks Equation: load = 1·I + 2·II + 3·III.
 * Limits: a minute just above the second threshold counts like an all-out one; 1-2-3 is a convention; heart rate lags behind short hard work.
 * @see Lucía A et al. 2003, Tour de France versus Vuelta a España, Med Sci Sports Exerc 35(5):872–878, doi 10.1249/01.MSS.0000064999.82036.B4
 * @example
 * heartRateLoadThreePhase([4581, 1354, 487]); // => 8750
 */
export function heartRateLoadThreePhase(minutes: readonly [number, number, number]): number {
  const { length }: readonly number[] = minutes;
  if (length !== 3)
    throw new NumericInputError('heartRateLoadThreePhase', 'minutes', minutes, 'minutes of exactly 3 phases');
  checkMinutes('heartRateLoadThreePhase', minutes);
  return minutes[0] + 2 * minutes[1] + 3 * minutes[2];
}

/**
 * Share of the time in each phase.
 *
 * @param minutes minutes in each phase [min], each 0 or more
 * @returns shares [fraction], same length; all NaN if there is no time at all
 * @throws NumericInputError on negative minutes
 * @remarks Equation: share = minutes ÷ sum. Limits: shares by heart rate, speed, lactate and rating differ; never mix them.
 * @see Lucía A et al. 1999, Int J Sports Med 20(3):167–172, doi 10.1055/s-1999-970284
 * @example
 * phaseShares([60, 30, 10]); // => [0.6, 0.3, 0.1]
 */
export function phaseShares(minutes: readonly number[]): number[] {
  checkMinutes('phaseShares', minutes);
  const total = minutes.reduce((sum, min) => sum + min, 0);
  return minutes.map((min) => (total > 0 ? min / total : NaN));
}

function checkMinutes(fn: string, minutes: readonly number[]): void {
  minutes.forEach((min, index) => within(fn, `minutes[${index}]`, min, 0, Infinity, 'min'));
}
