import { z } from 'zod';
import { daySchema, idSchema, lineSchema } from '../../platform/schemas.ts';
import { modalities } from '../thresholds/thresholds.types.ts';
import { causes } from './availability.types.ts';

const states = z.enum(['full', 'modified', 'none']);
const modalityList = z.array(z.enum(modalities)).min(1, { error: 'at least one modality' }).max(modalities.length);

export const availabilityInputSchema = z
  .strictObject({
    state: states,
    cause: z.enum(causes),
    reason: lineSchema(1000).optional(),
    allowedModalities: modalityList.optional(),
    from: daySchema,
    to: daySchema.optional(),
  })
  .superRefine(({ state, allowedModalities, from, to }, context) => {
    const wrong = (field: string, input: unknown, message: string) =>
      context.addIssue({ code: 'custom', path: [field], input, message });
    if (to !== undefined && to < from) wrong('to', to, `a date not before ${from}`);
    if (allowedModalities === undefined) return;
    if (state !== 'modified') wrong('allowedModalities', undefined, 'nothing unless the state is modified');
    if (new Set(allowedModalities).size < allowedModalities.length) {
      wrong('allowedModalities', undefined, 'each modality once');
    }
  });
export type AvailabilityInput = z.output<typeof availabilityInputSchema>;

export const availabilityEndSchema = z.strictObject({ to: daySchema });
export const availabilityParamsSchema = z.strictObject({ athleteId: idSchema });
export const availabilityEntryParamsSchema = z.strictObject({ athleteId: idSchema, availabilityId: idSchema });

export const availabilitySchema = z.object({
  id: z.uuid(),
  athleteId: z.uuid(),
  state: states,
  /** Null where the one asking may not know it. */
  cause: z.enum(causes).nullable(),
  reason: z.string().nullable(),
  allowedModalities: z.array(z.enum(modalities)),
  from: z.string(),
  to: z.string().nullable(),
  enteredAt: z.string(),
});
export type AvailabilityView = z.output<typeof availabilitySchema>;
export const availabilityListSchema = z.object({ items: z.array(availabilitySchema) });
