/** A calendar date as Prisma writes a `date` column: midnight UTC of that day. */
export function dateOf(day: string): Date {
  return new Date(`${day}T00:00:00.000Z`);
}

/** The calendar date of a `date` column as Prisma reads it. */
export function dayOf(date: Date): string {
  return date.toISOString().slice(0, 10);
}

/** As `dayOf`, for an end that may be open. */
export function openDayOf(date: Date | null): string | null {
  return date === null ? null : dayOf(date);
}
