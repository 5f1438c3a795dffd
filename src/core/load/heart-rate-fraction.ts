import { NumericInputError } from '../numeric-input-error.ts';
import { above, within } from '../guard.ts';

/**
 * Heart rate, checked for a believable range.
 *
 * Keeps a slip of the pen or of a sensor out of everything that follows.
 *
 * @param heartRateBpm mean, resting or maximal heart rate [beats per minute], 25 to 240
 * @returns the same [beats per minute]
 * @throws NumericInputError outside 25 to 240
 * @remarks Range: 25 to 240, an engineering choice; single beats at rest can be slower (19.6 per minute were recorded in athletes).
 * @see Scand J Med Sci Sports 1997;7:274–278 for the lowest rates of athletes at night; the range itself is an own convention
 * @example
 * checkHeartRate(150); // => 150
 */
export function checkHeartRate(heartRateBpm: number): number {
  return within('checkHeartRate', 'heartRateBpm', heartRateBpm, 25, 240, 'beats per minute');
}

/**
 * Fraction of the heart-rate reserve.
 *
 * Where a heart rate lies between the athlete's own rest and own maximum.
 *
 * @param reading heartRateBpm, restingBpm, maxBpm [beats per minute], 25 to 240, resting < maximum, resting ≤ heart rate ≤ maximum
 * @returns fraction [no unit], 0 to 1
 * @throws NumericInputError on wrong anchors or a heart rate outside them: they are asked for again, never bent to fit
 * @remarks Equation: x = (HR − HRrest) ÷ (HRmax − HRrest). Limits: needs measured anchors; age formulas err by 7 to 11 beats.
 * @see Banister EW, Calvert TW 1980, Can J Appl Sport Sci 5(3):170–176; Robergs RA, Landwehr R 2002, JEPonline 5(2):1–10
 * @example
 * heartRateFraction({ heartRateBpm: 150, restingBpm: 50, maxBpm: 200 }); // => 0.6666667
 */
export function heartRateFraction(reading: { heartRateBpm: number; restingBpm: number; maxBpm: number }): number {
  const { heartRateBpm, restingBpm, maxBpm } = reading;
  [heartRateBpm, restingBpm, maxBpm].forEach(checkHeartRate);
  above('heartRateFraction', 'maxBpm', maxBpm, restingBpm, 240, 'beats per minute (above the resting heart rate)');
  if (heartRateBpm > maxBpm || heartRateBpm < restingBpm) {
    const range = `${restingBpm} to ${maxBpm} beats per minute (resting to maximum; the stored maximum may be old)`;
    throw new NumericInputError('heartRateFraction', 'heartRateBpm', heartRateBpm, range);
  }
  return (heartRateBpm - restingBpm) / (maxBpm - restingBpm);
}
