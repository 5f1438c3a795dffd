import type { FamilyDay, SignFamily } from '../response-signs/types.ts';

/** The families in the order they are relied on; bouts last, so that a bout stays free to confirm a test. */
export const FAMILIES: readonly SignFamily[] = ['morning-answers', 'effort-mismatch', 'variability', 'standard-bout'];

/** A family that stands, with the signs it stands on. */
export interface StandingFamily extends FamilyDay {
  readonly family: SignFamily;
}

/** How each family stands on one day; a family that is not measured is left out. */
export type FamilyStates = Readonly<Partial<Record<SignFamily, FamilyDay>>>;

/** The families that stand, in order; one that shares a measured value with an earlier one is left out. */
export function standing(states: FamilyStates, by: 'raised' | 'open'): StandingFamily[] {
  const found = FAMILIES.flatMap((family) => {
    const state = states[family];
    if (state?.[by] !== true) return [];
    // Only what all families have: a state may carry more, and evidence is kept on record.
    const { day, raised, open, since, firstSign, measured, signs } = state;
    return [{ family, day, raised, open, since, firstSign, measured, signs }];
  });
  return found.reduce<StandingFamily[]>(
    (chosen, one) =>
      sourcesOf(chosen).some((source) => sourcesOf([one]).includes(source)) ? chosen : [...chosen, one],
    [],
  );
}

/** Names of the measured values the families stand on. */
export function sourcesOf(families: readonly FamilyDay[]): string[] {
  return families.flatMap(({ signs }) => signs.flatMap(({ sources }) => sources));
}
