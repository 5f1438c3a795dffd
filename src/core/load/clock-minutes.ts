import { NumericInputError } from '../numeric-input-error.ts';

/**
 * Minutes of a time written as hours and minutes.
 *
 * @param clock hours:minutes, such as '90:44'; hours without limit, minutes 00 to 59
 * @returns time [min]
 * @throws NumericInputError on any other form
 * @remarks Equation: minutes = 60 × hours + minutes. Limits: no seconds.
 * @see Lucía A et al. 2003, Br J Sports Med 37(5):457–459, doi 10.1136/bjsm.37.5.457 (race times in this form)
 * @example
 * clockMinutes('90:44'); // => 5444
 */
export function clockMinutes(clock: string): number {
  const match = /^(\d+):([0-5]\d)$/.exec(clock);
  if (match === null) throw new NumericInputError('clockMinutes', 'clock', clock, 'hours:minutes, minutes 00 to 59');
  return 60 * Number(match[1]) + Number(match[2]);
}
