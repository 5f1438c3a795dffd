import { within } from '../guard.ts';

/** Scores of the six scales of the Profile of Mood States [points], 0 or more. */
export interface MoodScores {
  readonly tension: number;
  readonly depression: number;
  readonly anger: number;
  readonly fatigue: number;
  readonly confusion: number;
  readonly vigour: number;
}

/**
 * Total mood disturbance of the Profile of Mood States.
 *
 * @param scores scale scores [points], 0 or more; NaN = not answered
 * @param offset added so that the total stays positive [points]: 0, or 100 in some scorings
 * @returns total [points], higher is worse; NaN if a scale is missing
 * @throws NumericInputError on a negative or infinite score or offset
 * @remarks Equation: tension + depression + anger + fatigue + confusion − vigour + offset. Limits: scorings with and without the offset must not be mixed.
 * @see McNair DM et al. 1971, Profile of Mood States manual; scoring: value from memory
 * @example
 * totalMoodDisturbance({ tension: 12, depression: 8, anger: 9, fatigue: 15, confusion: 7, vigour: 18 }); // => 33
 */
export function totalMoodDisturbance(scores: MoodScores, offset = 0): number {
  for (const [name, value] of Object.entries(scores)) {
    if (!Number.isNaN(value)) within('totalMoodDisturbance', `scores.${name}`, value as number, 0, Infinity);
  }
  within('totalMoodDisturbance', 'offset', offset, 0, Infinity);
  const { tension, depression, anger, fatigue, confusion, vigour } = scores;
  return tension + depression + anger + fatigue + confusion - vigour + offset;
}
