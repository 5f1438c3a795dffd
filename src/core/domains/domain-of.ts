import type { Bounds, Domain } from '../types.ts';
import { NumericInputError } from '../numeric-input-error.ts';
import { above, within } from '../guard.ts';

export type { Bounds } from '../types.ts';

/**
 * Intensity domain of a power, speed or heart rate.
 *
 * Names what a minute at this intensity asks of the body, by the athlete's own bounds.
 *
 * @param intensity [W, m/s or beats per minute, as the bounds], 0 or more
 * @param bounds lt1 < heavySevere < extreme [same unit]; extreme null: severe and extreme together
 * @returns the domain; an intensity exactly on a bound belongs to the domain below it
 * @throws NumericInputError on a negative or unknown intensity or on bounds out of order
 * @remarks Equation: moderate ≤ LT1 < heavy ≤ bound < severe ≤ extreme bound < extreme.
 * Limits: the bounds are bands, not lines; just above the heavy/severe bound the maximal oxygen uptake need not be reached.
 * @see Burnley M, Jones AM 2018, Eur J Sport Sci 18(1):1–12, doi 10.1080/17461391.2016.1249524; Hill DW, Poole DC, Smith JC 2002, Med Sci Sports Exerc 34(4):709–714
 * @example
 * domainOf(250, { lt1: 180, heavySevere: 240, extreme: 380 }); // => 'severe'
 */
export function domainOf(intensity: number, bounds: Bounds): Domain {
  within('domainOf', 'intensity', intensity, 0, Infinity);
  checkBounds('domainOf', bounds);
  if (intensity <= bounds.lt1) return 'moderate';
  if (intensity <= bounds.heavySevere) return 'heavy';
  return bounds.extreme === null || intensity <= bounds.extreme ? 'severe' : 'extreme';
}

/** Throws unless 0 < lt1 < heavySevere < extreme. */
export function checkBounds(fn: string, bounds: Bounds): void {
  above(fn, 'bounds.lt1', bounds.lt1, 0);
  above(fn, 'bounds.heavySevere', bounds.heavySevere, bounds.lt1);
  if (bounds.extreme === null) return;
  if (!(Number.isFinite(bounds.extreme) && bounds.extreme > bounds.heavySevere)) {
    const range = `a number above ${bounds.heavySevere} (the heavy/severe bound), or null`;
    throw new NumericInputError(fn, 'bounds.extreme', bounds.extreme, range);
  }
}
