import { NumericInputError } from './numeric-input-error.ts';

/** Returns the value if it is finite and min ≤ value ≤ max, else throws with the allowed range. */
export function within(fn: string, parameter: string, value: number, min: number, max: number, unit = ''): number {
  if (Number.isFinite(value) && value >= min && value <= max) return value;
  const from = min === -Infinity ? 'a finite number' : `a number from ${min} on`;
  const range = max === Infinity ? from : `a number from ${min} to ${max}`;
  throw new NumericInputError(fn, parameter, value, unit === '' ? range : `${range} ${unit}`);
}

/** Returns the value if it is finite and min < value ≤ max, else throws with the allowed range. */
export function above(fn: string, parameter: string, value: number, min: number, max = Infinity, unit = ''): number {
  if (Number.isFinite(value) && value > min && value <= max) return value;
  const range = max === Infinity ? `a number above ${min}` : `a number above ${min}, at most ${max}`;
  throw new NumericInputError(fn, parameter, value, unit === '' ? range : `${range} ${unit}`);
}

/** Returns the value if it is a whole number of at least min, else throws. */
export function whole(fn: string, parameter: string, value: number, min: number, max = Infinity): number {
  if (Number.isInteger(value) && value >= min && value <= max) return value;
  const top = max === Infinity ? 'on' : `to ${max}`;
  throw new NumericInputError(fn, parameter, value, `a whole number from ${min} ${top}`);
}

/** A series in which NaN is an unknown day: every other value must be finite and not negative. */
export function loadSeries(fn: string, parameter: string, values: readonly number[]): readonly number[] {
  values.forEach((value, index) => {
    if (Number.isNaN(value)) return;
    within(fn, `${parameter}[${index}]`, value, 0, Infinity);
  });
  return values;
}
