import { z } from 'zod';
import { daySchema, endsAfterStart, idSchema, lineSchema } from '../../platform/schemas.ts';
import { purposes } from './periods.types.ts';

export const periodInputSchema = z
  .strictObject({
    purpose: z.enum(purposes),
    from: daySchema,
    to: daySchema,
    athleteId: idSchema.optional(),
    note: lineSchema(500).optional(),
  })
  .superRefine(endsAfterStart);
export type PeriodInput = z.output<typeof periodInputSchema>;

export const periodParamsSchema = z.strictObject({ squadId: idSchema });

export const periodSchema = z.object({
  id: z.uuid(),
  squadId: z.uuid(),
  athleteId: z.uuid().nullable(),
  purpose: z.enum(purposes),
  from: z.string(),
  to: z.string(),
  note: z.string().nullable(),
  enteredBy: z.uuid().nullable(),
  enteredAt: z.string(),
});
export type PeriodView = z.output<typeof periodSchema>;
export const periodListSchema = z.object({ items: z.array(periodSchema) });
