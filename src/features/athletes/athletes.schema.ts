import { z } from 'zod';
import { daySchema, idSchema, lineSchema, zoneSchema } from '../../platform/schemas.ts';

const sex = z.enum(['female', 'male']);
const birthYear = z.int().min(1900).max(2100);
const ordered = {
  path: ['to'],
  error: 'a date not before the first day',
};

export const athleteInputSchema = z.strictObject({
  name: lineSchema(200),
  sex: sex.optional(),
  birthYear: birthYear.optional(),
  personId: idSchema.optional(),
  squadId: idSchema,
  memberFrom: daySchema,
});
export type AthleteInput = z.output<typeof athleteInputSchema>;

export const membershipInputSchema = z
  .strictObject({ squadId: idSchema, from: daySchema, to: daySchema.optional() })
  .refine(({ from, to }) => to === undefined || to >= from, ordered);
export type MembershipInput = z.output<typeof membershipInputSchema>;

export const membershipEndSchema = z.strictObject({ to: daySchema });

export const zonePeriodInputSchema = z
  .strictObject({ zone: zoneSchema, from: daySchema, to: daySchema })
  .refine(({ from, to }) => to >= from, ordered);
export type ZonePeriodInput = z.output<typeof zonePeriodInputSchema>;

export const athleteParamsSchema = z.strictObject({ athleteId: idSchema });
export const membershipParamsSchema = z.strictObject({ athleteId: idSchema, membershipId: idSchema });
export const athleteQuerySchema = z.strictObject({ squadId: idSchema.optional() });

export const athleteSchema = z.object({
  id: z.uuid(),
  name: z.string(),
  sex: sex.nullable(),
  birthYear: z.number().nullable(),
  personId: z.uuid().nullable(),
});
export const athleteListSchema = z.object({ items: z.array(athleteSchema) });

export const membershipSchema = z.object({
  id: z.uuid(),
  athleteId: z.uuid(),
  squadId: z.uuid(),
  from: z.string(),
  to: z.string().nullable(),
});
export const membershipListSchema = z.object({ items: z.array(membershipSchema) });

export const zonePeriodSchema = z.object({
  id: z.uuid(),
  athleteId: z.uuid(),
  zone: z.string(),
  from: z.string(),
  to: z.string(),
});
export const zonePeriodListSchema = z.object({ items: z.array(zonePeriodSchema) });
