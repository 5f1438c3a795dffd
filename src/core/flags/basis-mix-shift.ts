import type { Basis } from '../types.ts';
import { within } from '../guard.ts';

/** Minutes by basis; a basis left out has none. */
export type BasisMinutes = Readonly<Partial<Record<Basis, number>>>;

/** Largest shift at which a ratio is still shown [percentage points]: own convention. */
export const BASIS_MIX_LIMIT = 25;

/**
 * Largest change of a basis's share of the minutes between two windows.
 *
 * Minutes from power and minutes from heart rate are different measures; a ratio of the one to the other compares instruments.
 *
 * @param acute minutes by basis in the acute window [min], each 0 or more
 * @param chronic minutes by basis in the chronic window [min], each 0 or more
 * @returns largest difference of shares [percentage points], 0 to 100; NaN if a window has no minutes
 * @throws NumericInputError on negative minutes
 * @remarks Equation: max over bases of |share(acute) − share(chronic)|·100. Limits: the limit of 25 points is an own convention.
 * @see own convention
 * @example
 * basisMixShift({ power: 300 }, { power: 600, 'heart-rate': 200 }); // => 25
 */
export function basisMixShift(acute: BasisMinutes, chronic: BasisMinutes): number {
  const acuteTotal = total('acute', acute);
  const chronicTotal = total('chronic', chronic);
  if (acuteTotal === 0 || chronicTotal === 0) return NaN;
  const bases = new Set([...Object.keys(acute), ...Object.keys(chronic)]) as Set<Basis>;
  const shifts = [...bases].map((basis) =>
    Math.abs((100 * (acute[basis] ?? 0)) / acuteTotal - (100 * (chronic[basis] ?? 0)) / chronicTotal),
  );
  return Math.max(...shifts);
}

function total(window: string, minutes: BasisMinutes): number {
  return Object.entries(minutes).reduce(
    (sum, [basis, min]) => sum + within('basisMixShift', `${window}.${basis}`, min, 0, Infinity, 'min'),
    0,
  );
}
