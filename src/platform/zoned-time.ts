import { Temporal } from 'temporal-polyfill';

/** The calendar date of an instant in an IANA zone, 'YYYY-MM-DD'. */
export function localDay(instant: Date, zone: string): string {
  return Temporal.Instant.fromEpochMilliseconds(instant.getTime()).toZonedDateTimeISO(zone).toPlainDate().toString();
}

/** The instant at which a calendar date begins in a zone (not always 00:00: some zones skip midnight). */
export function localMidnight(day: string, zone: string): Date {
  return new Date(Temporal.PlainDate.from(day).toZonedDateTime(zone).epochMilliseconds);
}

/** The instant of a local wall time; a time skipped by a clock change moves on by the gap, a doubled one is the earlier. */
export function localDateTime(day: string, time: string, zone: string): Date {
  const wall = Temporal.PlainDate.from(day).toZonedDateTime({
    timeZone: zone,
    plainTime: Temporal.PlainTime.from(time),
  });
  return new Date(wall.epochMilliseconds);
}

/** Length of a local day in minutes: 1440, or 1380 and 1500 when the clocks change by an hour. */
export function dayLengthMin(day: string, zone: string): number {
  const next = Temporal.PlainDate.from(day).add({ days: 1 }).toString();
  return (localMidnight(next, zone).getTime() - localMidnight(day, zone).getTime()) / 60_000;
}

/** Whether the runtime knows this IANA zone name. Offsets such as '+02:00' are not zones: they know no clock change. */
export function isZone(zone: string): boolean {
  if (!/^[A-Za-z]/.test(zone)) return false;
  try {
    new Intl.DateTimeFormat('en', { timeZone: zone });
    return true;
  } catch {
    return false;
  }
}
