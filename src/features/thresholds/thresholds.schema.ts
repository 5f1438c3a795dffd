import { z } from 'zod';
import { daySchema, idSchema, lineSchema } from '../../platform/schemas.ts';
import { athleteQuantities, modalities, quantities, quantityRanges, settings } from './thresholds.types.ts';
import type { Quantity } from './thresholds.types.ts';

const quantitySchema = z.enum(quantities);
const modalitySchema = z.enum(modalities);
const settingSchema = z.enum(settings);

/** The allowed range of a quantity in words. */
export function rangeOf(quantity: Quantity): string {
  const { unit, min, max } = quantityRanges[quantity];
  return `a number from ${min} to ${max} ${unit}`;
}

/** True where the value lies in the range of its quantity. */
export function isInRange(quantity: Quantity, value: number): boolean {
  const { min, max } = quantityRanges[quantity];
  return value >= min && value <= max;
}

export const errorAllowed = 'a number from 0 to below the value, in the unit of the value';

const measured = {
  value: z.number({ error: 'a finite number in the unit of the quantity' }),
  standardError: z.number({ error: errorAllowed }).min(0, { error: errorAllowed }).optional(),
};

const entrySchema = z
  .strictObject({
    quantity: quantitySchema,
    modality: modalitySchema.optional(),
    setting: settingSchema.default('any'),
    ...measured,
    method: lineSchema(80),
    validFrom: daySchema,
    /** Said of a value that is right although it is far from the one before. */
    confirmed: z.literal(true, { error: 'true, or left out' }).optional(),
  })
  .superRefine((entry, context) => {
    const wrong = (field: string, input: unknown, message: string) =>
      context.addIssue({ code: 'custom', path: [field], input, message });
    if (!isInRange(entry.quantity, entry.value)) wrong('value', entry.value, rangeOf(entry.quantity));
    if (entry.standardError !== undefined && entry.standardError >= entry.value) {
      wrong('standardError', entry.standardError, errorAllowed);
    }
    if (athleteQuantities.includes(entry.quantity)) {
      const own = `nothing: ${entry.quantity} belongs to the athlete`;
      if (entry.modality !== undefined) wrong('modality', entry.modality, own);
      if (entry.setting !== 'any') wrong('setting', entry.setting, own);
    } else if (entry.modality === undefined) {
      wrong('modality', undefined, `required: one of ${modalities.join(', ')}`);
    }
  });
export type ThresholdEntry = z.output<typeof entrySchema>;

export const thresholdsInputSchema = z.strictObject({
  values: z.array(entrySchema).min(1, { error: '1 to 40 values' }).max(40, { error: '1 to 40 values' }),
});
export type ThresholdsInput = z.output<typeof thresholdsInputSchema>;

export const thresholdCorrectionSchema = z.strictObject({
  ...measured,
  method: lineSchema(80).optional(),
  reason: lineSchema(500),
});
export type ThresholdCorrection = z.output<typeof thresholdCorrectionSchema>;

export const thresholdWithdrawalSchema = z.strictObject({ reason: lineSchema(500) });

export const thresholdQuerySchema = z.strictObject({
  quantity: quantitySchema.optional(),
  modality: modalitySchema.optional(),
});
export type ThresholdQuery = z.output<typeof thresholdQuerySchema>;

export const inForceQuerySchema = z.strictObject({
  date: daySchema,
  modality: modalitySchema,
  setting: settingSchema.default('any'),
});
export type InForceQuery = z.output<typeof inForceQuerySchema>;

export const thresholdParamsSchema = z.strictObject({ athleteId: idSchema });
export const thresholdValueParamsSchema = z.strictObject({ athleteId: idSchema, valueId: idSchema });

export const thresholdValueSchema = z.object({
  id: z.uuid(),
  quantity: quantitySchema,
  unit: z.string(),
  modality: modalitySchema.nullable(),
  setting: settingSchema,
  value: z.number(),
  standardError: z.number().nullable(),
  method: z.string(),
  validFrom: z.string(),
  validTo: z.string().nullable(),
  enteredBy: z.uuid().nullable(),
  enteredAt: z.string(),
  supersedes: z.uuid().nullable(),
  withdrawnAt: z.string().nullable(),
  withdrawnBy: z.uuid().nullable(),
  withdrawReason: z.string().nullable(),
});
export type ThresholdValueView = z.output<typeof thresholdValueSchema>;

export const reweighedSchema = z.object({
  sessionIds: z.array(z.uuid()),
  task: z.object({ id: z.uuid(), total: z.number() }).nullable(),
});
export const thresholdListSchema = z.object({ items: z.array(thresholdValueSchema) });
export const thresholdsAnswerSchema = z.object({ items: z.array(thresholdValueSchema), reweighed: reweighedSchema });
export const thresholdCorrectionAnswerSchema = z.object({ item: thresholdValueSchema, reweighed: reweighedSchema });
export const thresholdWithdrawalAnswerSchema = z.object({ reweighed: reweighedSchema });
export const inForceSchema = z.object({
  date: z.string(),
  modality: modalitySchema,
  setting: settingSchema,
  items: z.array(thresholdValueSchema),
});
