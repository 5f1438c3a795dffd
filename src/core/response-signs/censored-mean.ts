import { above, within } from '../guard.ts';
import { normalDensity, normalDistribution } from '../numeric/normal.ts';

/** From here on the tail is (z + 1 ÷ z) to better than 1e-2, and the distribution itself loses its digits. */
const FAR = 6;

/**
 * Expected size of a value of which only a lower bound is known.
 *
 * A rating at the top of a scale says "at least this"; this is what it stands for.
 *
 * @param bound the value is at least this [any unit]
 * @param centre expected value without the bound [same unit]
 * @param sd standard deviation about the centre [same unit], above 0
 * @returns mean of the normal values above the bound [same unit]
 * @throws NumericInputError on an input that is not finite, or an SD not above 0
 * @remarks Equation: μ + σ·φ(z) ÷ (1 − Φ(z)), z = (bound − μ) ÷ σ; from z = 6 on φ ÷ (1 − Φ) is taken as z + 1 ÷ z.
 * Limits: supposes normal values about the centre.
 * @see Schmee J, Hahn GJ 1979, A simple method for regression analysis with censored data, Technometrics 21(4):417–432; value from memory
 * @example
 * censoredMean(0, 0, 1); // => 0.7978846
 */
export function censoredMean(bound: number, centre: number, sd: number): number {
  within('censoredMean', 'bound', bound, -Infinity, Infinity);
  within('censoredMean', 'centre', centre, -Infinity, Infinity);
  above('censoredMean', 'sd', sd, 0);
  const z = (bound - centre) / sd;
  const tail = z > FAR ? z + 1 / z : normalDensity(z) / (1 - normalDistribution(z));
  return centre + sd * tail;
}
