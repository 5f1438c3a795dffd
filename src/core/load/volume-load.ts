import { above, whole } from '../guard.ts';

/**
 * Volume load of strength training.
 *
 * How much was moved in all.
 *
 * @param sets rows of sets [count, 1 or more], repetitions per set [count, 1 or more] and loadKg [kg, above 0]
 * @returns volume load [kg × repetitions]
 * @throws NumericInputError outside these ranges
 * @remarks Equation: Σ sets × repetitions × kg.
 * Limits: equal volume load is not equal effort; it leaves out rest, tempo and the body's own mass. Never add it to loads made of minutes.
 * @see Kraft JA et al. 2014, J Strength Cond Res 28(7):2042–2046; McGuigan MR, Foster C 2004, Strength Cond J 26(6):42–47
 * @example
 * volumeLoad([{ sets: 3, repetitions: 10, loadKg: 60 }]); // => 1800
 */
export function volumeLoad(sets: readonly { sets: number; repetitions: number; loadKg: number }[]): number {
  return sets.reduce((sum, row, index) => {
    whole('volumeLoad', `sets[${index}].sets`, row.sets, 1);
    whole('volumeLoad', `sets[${index}].repetitions`, row.repetitions, 1);
    above('volumeLoad', `sets[${index}].loadKg`, row.loadKg, 0, Infinity, 'kg');
    return sum + row.sets * row.repetitions * row.loadKg;
  }, 0);
}
