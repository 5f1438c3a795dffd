import { z } from 'zod';

/** A number of a closed range whose error names the whole range. */
export function numberIn(min: number, max: number, unit = '') {
  const error = `a number from ${min} to ${max}${unit === '' ? '' : ` ${unit}`}`;
  return z.number({ error }).min(min, { error }).max(max, { error });
}

/** The same for whole numbers. */
export function wholeIn(min: number, max: number) {
  const error = `a whole number from ${min} to ${max}`;
  return z.int({ error }).min(min, { error }).max(max, { error });
}
