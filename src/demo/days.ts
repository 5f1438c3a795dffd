const dayMs = 86_400_000;

/** A calendar date so many days later. */
export function addDays(day: string, days: number): string {
  return new Date(Date.parse(`${day}T00:00:00Z`) + days * dayMs).toISOString().slice(0, 10);
}

/** Days from one date to another. */
export function daysBetween(from: string, to: string): number {
  return Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / dayMs);
}

/** Monday 1 to Sunday 7. */
export function weekday(day: string): number {
  return new Date(`${day}T00:00:00Z`).getUTCDay() || 7;
}

/** The Sunday that ends the last complete ISO week before a date: a Sunday's own week is not complete yet. */
export function lastCompleteSunday(today: string): string {
  return addDays(today, -weekday(today));
}

/** ISO 8601 week of a date: 2026-W48. */
export function isoWeek(day: string): string {
  const thursday = addDays(day, 4 - weekday(day));
  const year = thursday.slice(0, 4);
  const week = Math.floor(daysBetween(`${year}-01-01`, thursday) / 7) + 1;
  return `${year}-W${String(week).padStart(2, '0')}`;
}

/** The date and wall clock of an instant in a zone. */
export function localDay(instant: Date, zone: string): string {
  return wallClock(instant, zone).slice(0, 10);
}

/** The instant of a wall-clock time in a zone, written with that day's offset: 2026-10-25T07:00:00+01:00. */
export function startOf(day: string, time: string, zone: string): string {
  const wall = Date.parse(`${day}T${time}:00Z`);
  // Twice: the first guess can lie on the other side of a clock change.
  let offset = offsetMin(new Date(wall), zone);
  offset = offsetMin(new Date(wall - offset * 60_000), zone);
  const sign = offset < 0 ? '-' : '+';
  const hours = String(Math.floor(Math.abs(offset) / 60)).padStart(2, '0');
  const minutes = String(Math.abs(offset) % 60).padStart(2, '0');
  return `${day}T${time}:00${sign}${hours}:${minutes}`;
}

function offsetMin(instant: Date, zone: string): number {
  return Math.round((Date.parse(`${wallClock(instant, zone)}Z`) - instant.getTime()) / 60_000);
}

const formats = new Map<string, Intl.DateTimeFormat>();

function wallClock(instant: Date, zone: string): string {
  let format = formats.get(zone);
  if (format === undefined) {
    format = new Intl.DateTimeFormat('sv-SE', { timeZone: zone, dateStyle: 'short', timeStyle: 'medium' });
    formats.set(zone, format);
  }
  return format.format(instant).replace(' ', 'T');
}
