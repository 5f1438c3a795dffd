import { z } from 'zod';
import { daySchema, dayRangeShape, idSchema } from '../../platform/schemas.ts';

export const squadDayParamsSchema = z.strictObject({ squadId: idSchema, day: daySchema });
export const squadDaysParamsSchema = z.strictObject({ squadId: idSchema });

export const closingInputSchema = z.strictObject({
  unknownAthleteIds: z.array(idSchema).max(200, { error: 'at most 200 athletes' }).default([]),
});
export type ClosingInput = z.output<typeof closingInputSchema>;

/** Reopening takes nothing. */
export const reopeningInputSchema = z.strictObject({});

/** The longest stretch of days one answer lists. */
const MAX_DAYS = 731;

export const closingsQuerySchema = z
  .strictObject(dayRangeShape)
  .refine(({ from, to }) => to >= from, { path: ['to'], error: 'a date not before from' })
  .refine(({ from, to }) => (Date.parse(to) - Date.parse(from)) / 86_400_000 < MAX_DAYS, {
    path: ['to'],
    error: `at most ${MAX_DAYS} days together`,
  });
export type ClosingsQuery = z.output<typeof closingsQuerySchema>;

export const closingSchema = z.object({
  squadId: z.uuid(),
  day: z.string(),
  closedAt: z.string(),
  closedBy: z.uuid().nullable(),
  unknownAthleteIds: z.array(z.uuid()),
});
export const closingListSchema = z.object({ items: z.array(closingSchema) });
export const reopeningSchema = z.object({ squadId: z.uuid(), day: z.string(), closed: z.literal(false) });

const dayState = z.enum(['known', 'partial', 'unknown']);
export const squadDaySchema = z.object({
  day: z.string(),
  closed: z.boolean(),
  athletes: z.array(
    z.object({
      athleteId: z.uuid(),
      name: z.string(),
      training: z.enum(['trained', 'rest', 'unknown']),
      availability: z.enum(['full', 'modified', 'none']),
      completeness: z.enum(['complete', 'partial', 'unknown']),
      minutes: z.number(),
      sessions: z.number(),
      ratingLoad: z.number().nullable(),
      ratingState: dayState,
      domainLoad: z.number().nullable(),
      domainState: dayState,
    }),
  ),
});
