import { NumericInputError } from '../numeric-input-error.ts';

/** Days must follow each other: a fold over days has no other order. */
export function checkDays(fn: string, days: readonly { readonly day: number }[]): void {
  days.forEach(({ day }, index) => {
    const before = days[index - 1];
    if (before === undefined ? Number.isInteger(day) : day === before.day + 1) return;
    const wanted = before === undefined ? 'a whole number' : String(before.day + 1);
    throw new NumericInputError(fn, `days[${index}].day`, day, `${wanted}: days in order without gaps`);
  });
}
