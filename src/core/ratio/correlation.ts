import { NumericInputError } from '../numeric-input-error.ts';
import { mean } from '../series/mean.ts';

/**
 * Product-moment correlation of two series.
 *
 * How far two measures move together.
 *
 * @param x values [any unit]
 * @param y values [any unit], as many
 * @returns correlation [no unit], −1 to 1; NaN if a value is NaN, there are fewer than two pairs or one series is constant
 * @throws NumericInputError if the lengths differ
 * @remarks Equation: r = Σ(x−x̄)(y−ȳ) ÷ √(Σ(x−x̄)²·Σ(y−ȳ)²). Limits: says nothing of cause; a shared part of two sums correlates them by itself.
 * @see textbook definition (Pearson)
 * @example
 * correlation([1, 2, 3, 4], [2, 4, 6, 8]); // => 1
 */
export function correlation(x: readonly number[], y: readonly number[]): number {
  if (x.length !== y.length) {
    throw new NumericInputError('correlation', 'length of y', y.length, `${x.length}, the length of x`);
  }
  if (x.length < 2) return NaN;
  const meanX = mean(x);
  const meanY = mean(y);
  let xy = 0;
  let xx = 0;
  let yy = 0;
  x.forEach((value, index) => {
    const dx = value - meanX;
    const dy = y[index]! - meanY;
    xy += dx * dy;
    xx += dx * dx;
    yy += dy * dy;
  });
  return xx > 0 && yy > 0 ? xy / Math.sqrt(xx * yy) : NaN;
}
