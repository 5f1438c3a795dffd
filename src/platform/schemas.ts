import { z } from 'zod';
import { isZone } from './zoned-time.ts';

/** Shapes every room uses at its edge. The words of `error` are what a client reads as "allowed". */
export const idSchema = z.uuid({ error: 'a UUID' });

/** A calendar date that exists, between 2000 and 2199: a log begins no earlier, and the first policy with it. */
export const daySchema = z.iso
  .date({ error: 'a calendar date like 2026-03-02' })
  .refine((day) => day >= '2000-01-01' && day <= '2199-12-31', { error: 'a date from 2000-01-01 to 2199-12-31' });

/** An instant with Z or an offset; without one it would mean another moment in every zone. */
export const instantSchema = z.iso.datetime({
  offset: true,
  error: 'an instant with offset or Z, like 2026-03-02T07:30:00+01:00',
});

export const zoneSchema = z
  .string({ error: 'an IANA time zone like Europe/Prague' })
  .max(64)
  .refine(isZone, { error: 'an IANA time zone like Europe/Prague' });

/** One line of text, trimmed, without control characters and halves of characters, 1 to `max` characters. */
export const lineSchema = (max: number) =>
  z
    .string({ error: `text of 1 to ${max} characters` })
    .trim()
    .min(1, { error: `text of 1 to ${max} characters` })
    .max(max, { error: `text of 1 to ${max} characters` })
    .regex(/^[^\p{Cc}\p{Cs}]*$/u, { error: 'text without control characters' });

export const isoWeekSchema = z
  .string()
  .regex(/^2[01]\d{2}-W(0[1-9]|[1-4]\d|5[0-3])$/, { error: 'an ISO 8601 week like 2026-W10, from 2000 to 2199' });

/** A whole number given as text, as query parameters are. */
export const queryNumberSchema = (min: number, max: number) =>
  z
    .string()
    .regex(/^\d{1,9}$/, { error: `a whole number from ${min} to ${max}` })
    .transform(Number)
    .pipe(z.number().min(min).max(max));

/** Refinement of an input with two days: it does not end before it begins. */
export function endsAfterStart({ from, to }: { from: string; to: string }, context: z.RefinementCtx): void {
  if (to >= from) return;
  context.addIssue({ code: 'custom', path: ['to'], input: to, message: `a date not before ${from}` });
}

/** From and to of a path or query; both ends included. */
export const dayRangeShape = { from: daySchema, to: daySchema };

export const emailSchema = z
  .string({ error: 'a mail address' })
  .trim()
  .toLowerCase()
  .max(254, { error: 'a mail address of at most 254 characters' })
  .pipe(z.email({ error: 'a mail address' }));
