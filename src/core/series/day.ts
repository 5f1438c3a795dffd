import { NumericInputError } from '../numeric-input-error.ts';
import { whole } from '../guard.ts';

// Calendar arithmetic on the proleptic Gregorian calendar; a day is the number of days since 1970-01-01.

/** Day number of an ISO date. @example dayNumber('2026-11-23'); // => 20780 */
export function dayNumber(iso: string): number {
  const match = /^(\d{4})-(\d{2})-(\d{2})$/.exec(iso);
  if (match === null) throw new NumericInputError('dayNumber', 'iso', iso, 'a date YYYY-MM-DD');
  const day = fromCivil(Number(match[1]), Number(match[2]), Number(match[3]));
  if (isoDay(day) !== iso) throw new NumericInputError('dayNumber', 'iso', iso, 'a date of the calendar');
  return day;
}

/** ISO date of a day number. @example isoDay(20780); // => '2026-11-23' */
export function isoDay(day: number): string {
  const { year, month, dayOfMonth } = civil(whole('isoDay', 'day', day, -719_528, 2_932_896));
  return `${pad(year, 4)}-${pad(month, 2)}-${pad(dayOfMonth, 2)}`;
}

/** Day of the week, Monday 1 to Sunday 7. @example weekday(20780); // => 1 */
export function weekday(day: number): number {
  return ((((day + 3) % 7) + 7) % 7) + 1;
}

/** Monday of the day's week. @example mondayOf(20783); // => 20780 */
export function mondayOf(day: number): number {
  return day - weekday(day) + 1;
}

/** ISO 8601 week of a day. @example isoWeek(20780); // => '2026-W48' */
export function isoWeek(day: number): string {
  const thursday = mondayOf(day) + 3;
  const { year } = civil(thursday);
  const week = Math.floor((thursday - fromCivil(year, 1, 1)) / 7) + 1;
  return `${pad(year, 4)}-W${pad(week, 2)}`;
}

/** Monday and Sunday of an ISO 8601 week as day numbers. @example weekRange('2026-W48'); // => { from: 20780, to: 20786 } */
export function weekRange(week: string): { from: number; to: number } {
  const match = /^(\d{4})-W(\d{2})$/.exec(week);
  if (match === null) throw new NumericInputError('weekRange', 'week', week, 'a week YYYY-Www');
  const first = mondayOf(fromCivil(Number(match[1]), 1, 4));
  const from = first + 7 * (Number(match[2]) - 1);
  if (isoWeek(from) !== week) throw new NumericInputError('weekRange', 'week', week, 'a week of that year');
  return { from, to: from + 6 };
}

function pad(value: number, digits: number): string {
  return String(value).padStart(digits, '0');
}

// Years begin in March here, so that the leap day is the last of its year.
function fromCivil(year: number, month: number, dayOfMonth: number): number {
  const y = month <= 2 ? year - 1 : year;
  const era = Math.floor(y / 400);
  const yearOfEra = y - era * 400;
  const dayOfYear = Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + dayOfMonth - 1;
  const dayOfEra = yearOfEra * 365 + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100) + dayOfYear;
  return era * 146_097 + dayOfEra - 719_468;
}

function civil(day: number): { year: number; month: number; dayOfMonth: number } {
  const shifted = day + 719_468;
  const era = Math.floor(shifted / 146_097);
  const dayOfEra = shifted - era * 146_097;
  const yearOfEra = Math.floor(
    (dayOfEra - Math.floor(dayOfEra / 1460) + Math.floor(dayOfEra / 36_524) - Math.floor(dayOfEra / 146_096)) / 365,
  );
  const dayOfYear = dayOfEra - (365 * yearOfEra + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100));
  const shiftedMonth = Math.floor((5 * dayOfYear + 2) / 153);
  const month = shiftedMonth < 10 ? shiftedMonth + 3 : shiftedMonth - 9;
  return {
    year: yearOfEra + era * 400 + (month <= 2 ? 1 : 0),
    month,
    dayOfMonth: dayOfYear - Math.floor((153 * shiftedMonth + 2) / 5) + 1,
  };
}
