import type { Sex } from '../types.ts';
import { NumericInputError } from '../numeric-input-error.ts';
import { above } from '../guard.ts';
import { heartRateFraction } from './heart-rate-fraction.ts';

// Constants: values from memory; 0.64 and 1.92 also printed in Int J Environ Res Public Health 2021;18:3906, Table 2.
const MALE = { factor: 0.64, exponent: 1.92 };
const FEMALE = { factor: 0.86, exponent: 1.67 };

/**
 * Heart-rate load of Banister, from the mean heart rate of a session or of a sample.
 *
 * Weighs minutes by how close the heart ran to its own maximum, more than in proportion.
 *
 * @param session durationMin [min], above 0, at most 1440; heartRateBpm, restingBpm, maxBpm [beats per minute], 25 to 240; sex
 * @returns load [weighted min]
 * @throws NumericInputError if maximum ≤ rest, the heart rate lies outside rest to maximum, or the sex is missing
 * @remarks Equation: minutes × x × 0.64·e^(1.92x) for men, minutes × x × 0.86·e^(1.67x) for women, x = fraction of the reserve.
 * Limits: the curve bends upwards, so a session of changing intensity scores more summed sample by sample than from its mean: the two are
 * different measures. Sex-wide curves from small groups; poor for strength and sprints; drifts with heat; a maximum wrong by 10 beats moves it by about 20 %.
 * @see Banister EW 1991, in Physiological Testing of the High-Performance Athlete, Human Kinetics, 403–424 (constants: value from memory);
 * Morton RH, Fitz-Clarke JR, Banister EW 1990, J Appl Physiol 69(3):1171–1177
 * @example
 * heartRateLoadBanister({ durationMin: 60, heartRateBpm: 150, restingBpm: 60, maxBpm: 190, sex: 'male' }); // => 100.440293
 */
export function heartRateLoadBanister(session: {
  durationMin: number;
  heartRateBpm: number;
  restingBpm: number;
  maxBpm: number;
  sex: Sex;
}): number {
  const { durationMin, sex } = session;
  above('heartRateLoadBanister', 'durationMin', durationMin, 0, 1440, 'min');
  if (sex !== 'female' && sex !== 'male') {
    throw new NumericInputError('heartRateLoadBanister', 'sex', sex, "'female' or 'male'");
  }
  const { factor, exponent } = sex === 'female' ? FEMALE : MALE;
  const x = heartRateFraction(session);
  return durationMin * x * factor * Math.exp(exponent * x);
}
