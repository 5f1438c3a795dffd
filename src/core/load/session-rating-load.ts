import { above, within } from '../guard.ts';

/**
 * Load of a session from the athlete's own rating and its length.
 *
 * One number for any kind of training, without a device: how hard it felt, times how long it took.
 *
 * @param rating session rating on the modified CR-10 scale [scale units], 0 to 10, decimals allowed
 * @param durationMin from the start of warm-up to the end of cool-down, rests included [min], above 0, at most 1440
 * @returns rating load [rating × min], 0 to 14,400
 * @throws NumericInputError outside these ranges
 * @remarks Equation: load = rating × minutes.
 * Limits: ratings differ between people, so compare an athlete with themself; a rating of 6 to 10 from a 6–20 scale cannot be told apart;
 * the upper ends of the ranges are engineering choices.
 * @see Foster C et al. 2001, A new approach to monitoring exercise training, J Strength Cond Res 15(1):109–115
 * @example
 * sessionRatingLoad(7, 120); // => 840
 */
export function sessionRatingLoad(rating: number, durationMin: number): number {
  within('sessionRatingLoad', 'rating', rating, 0, 10);
  above('sessionRatingLoad', 'durationMin', durationMin, 0, 1440, 'min');
  return rating * durationMin;
}
