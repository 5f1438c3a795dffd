import { z } from 'zod';
import { daySchema, endsAfterStart, idSchema, lineSchema } from '../../platform/schemas.ts';
import { circumstanceKinds } from './circumstances.types.ts';

export const circumstanceInputSchema = z
  .strictObject({
    kind: z.enum(circumstanceKinds),
    from: daySchema,
    to: daySchema,
    athleteId: idSchema.optional(),
    note: lineSchema(500).optional(),
  })
  .superRefine(endsAfterStart);
export type CircumstanceInput = z.output<typeof circumstanceInputSchema>;

export const circumstancesParamsSchema = z.strictObject({ squadId: idSchema });
export const circumstanceParamsSchema = z.strictObject({ squadId: idSchema, circumstanceId: idSchema });
export const circumstanceWithdrawalSchema = z.strictObject({ reason: lineSchema(500) });

export const circumstanceSchema = z.object({
  id: z.uuid(),
  squadId: z.uuid(),
  athleteId: z.uuid().nullable(),
  kind: z.enum(circumstanceKinds),
  from: z.string(),
  to: z.string(),
  note: z.string().nullable(),
  enteredBy: z.uuid().nullable(),
  enteredAt: z.string(),
  withdrawnAt: z.string().nullable(),
  withdrawReason: z.string().nullable(),
});
export type CircumstanceView = z.output<typeof circumstanceSchema>;
export const circumstanceListSchema = z.object({ items: z.array(circumstanceSchema) });
