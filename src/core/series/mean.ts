/**
 * Arithmetic mean; one unknown value makes it unknown.
 *
 * @param values values [any unit]
 * @returns mean [unit of the values]; NaN if a value is NaN or there is none
 * @remarks Equation: m = Σx ÷ n. Limits: unlike a windowed mean it never skips an unknown value.
 * @see textbook definition
 * @example
 * mean([0, 100, 200]); // => 100
 */
export function mean(values: readonly number[]): number {
  return values.length === 0 ? NaN : values.reduce((sum, value) => sum + value, 0) / values.length;
}
