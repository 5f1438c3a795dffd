import { above } from '../guard.ts';

/** What a standard bout says: 'sign' more effort at no more heart rate, 'fitness' less effort at no more heart rate. */
export type BoutVerdict = 'sign' | 'fitness' | 'neither';

/** A rating differs from the expected one beyond this many typical errors. */
export const HIGHER_FROM = 1.5;
const SAME_HEART_RATE = 1;
/** Rounding in a division must not move a figure across its limit. */
const ROUNDING = 1e-9;

/**
 * What heart rate and rating of a standard bout say together.
 *
 * A lower heart rate alone is neither good nor bad: with less effort it is fitness, with more it is a sign.
 *
 * @param bout heart rate [bpm], rating [CR-10] and their typical errors [bpm, points]; NaN = not taken
 * @param expected heart rate [bpm] and rating [CR-10] expected at this work; NaN = not known
 * @returns name of the verdict, or null where one of the four is missing
 * @throws NumericInputError on a typical error that is not above 0
 * @remarks Equation: no more heart rate: at most 1 typical error above the expected; rating higher (sign) or lower (fitness) by more than
 * 1.5 typical errors; else neither. Limits: heat, caffeine and little sleep move both.
 * @see Roete AJ et al. 2021, Int J Sports Physiol Perform 16(8):1065–1073; 1 and 1.5: own convention, after Hopkins WG 2000, Sports Med 30(1):1–15
 * @example
 * boutVerdict({ heartRateBpm: 138, rating: 5, heartRateTypicalError: 3, ratingTypicalError: 0.7 }, { heartRateBpm: 140, rating: 3 }); // => 'sign'
 */
export function boutVerdict(
  bout: {
    readonly heartRateBpm: number;
    readonly rating: number;
    readonly heartRateTypicalError: number;
    readonly ratingTypicalError: number;
  },
  expected: { readonly heartRateBpm: number; readonly rating: number },
): BoutVerdict | null {
  const heartRateError = above('boutVerdict', 'heartRateTypicalError', bout.heartRateTypicalError, 0, Infinity, 'bpm');
  const ratingError = above('boutVerdict', 'ratingTypicalError', bout.ratingTypicalError, 0);
  const heartRate = (bout.heartRateBpm - expected.heartRateBpm) / heartRateError;
  const rating = (bout.rating - expected.rating) / ratingError;
  if (!Number.isFinite(heartRate + rating)) return null;
  if (heartRate > SAME_HEART_RATE + ROUNDING || Math.abs(rating) <= HIGHER_FROM + ROUNDING) return 'neither';
  return rating > 0 ? 'sign' : 'fitness';
}
