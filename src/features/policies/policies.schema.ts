import { z } from 'zod';
import { daySchema, idSchema, lineSchema } from '../../platform/schemas.ts';

const weight = z.number().min(0).max(20);
const weights = z.strictObject({ moderate: weight, heavy: weight, severe: weight, extreme: weight });
const form = z.enum(['rolling-coupled', 'rolling-uncoupled', 'exponential']);
const sd = z.enum(['population', 'sample']);
const boundShape = {
  quantity: z.enum(['critical', 'lt2']),
  fallbackLt2Method: lineSchema(80).nullable(),
};
const modality = z.enum(['rowing', 'cycling', 'running', 'swimming', 'skiing', 'strength', 'games', 'other']);
const byModality = z.partialRecord(modality, z.strictObject(boundShape));
const upper = z.number().gt(0).max(20);
const primaryMeasure = z.enum(['domain-load', 'rating-load']);
const chronicLowShare = z.number().gt(0).lt(1);
const thresholdMaxAgeWeeks = z.int().min(1).max(104);
const filterTimeConstantS = z.number().min(0).max(300);

/** What a change of policy may name; the rest stays as it was the day before. */
export const policyChangeSchema = z.strictObject({
  primaryMeasure: primaryMeasure.optional(),
  weights: weights.optional(),
  bound: z
    .strictObject({
      quantity: boundShape.quantity.optional(),
      fallbackLt2Method: boundShape.fallbackLt2Method.optional(),
      byModality: byModality.optional(),
    })
    .optional(),
  ratio: z.strictObject({ form: form.optional(), upper: upper.optional() }).optional(),
  monotony: z.strictObject({ sd: sd.optional(), upper: upper.optional() }).optional(),
  chronicLowShare: chronicLowShare.optional(),
  thresholdMaxAgeWeeks: thresholdMaxAgeWeeks.optional(),
  filterTimeConstantS: filterTimeConstantS.optional(),
});
export type PolicyChange = z.output<typeof policyChangeSchema>;

export const policyInputSchema = z.strictObject({ validFrom: daySchema, settings: policyChangeSchema });
export type PolicyInput = z.output<typeof policyInputSchema>;

/** The whole of a policy: what is stored, read back and answered. */
export const policySettingsSchema = z.object({
  primaryMeasure,
  weights,
  weightsSource: z.enum(['published three-phase weights', 'own convention of the squad']),
  bound: z.object({ ...boundShape, byModality: byModality.optional() }),
  ratio: z.object({ form, upper }),
  monotony: z.object({ sd, upper }),
  chronicLowShare,
  thresholdMaxAgeWeeks,
  filterTimeConstantS,
});

export const policySchema = z.object({
  id: z.uuid(),
  squadId: z.uuid(),
  validFrom: z.string(),
  validTo: z.string().nullable(),
  settings: policySettingsSchema,
});
export const policyListSchema = z.object({ items: z.array(policySchema) });
export const policyAddedSchema = policySchema.extend({
  reweighed: z
    .object({
      sessionIds: z.array(z.uuid()),
      task: z.object({ id: z.uuid(), total: z.number() }).nullable(),
    })
    .optional(),
});
export const policyParamsSchema = z.strictObject({ squadId: idSchema });
