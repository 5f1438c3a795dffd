import { z } from 'zod';
import { dayRangeShape, idSchema, instantSchema, lineSchema, queryNumberSchema } from '../../platform/schemas.ts';
import { modalities, quantities, settings } from '../thresholds/thresholds.types.ts';
import { sessionContentInputSchema, storedContentSchema } from './session-content.schema.ts';
import { numberIn } from './number-in.ts';
import { qualities, sessionKinds } from './sessions.types.ts';

/** Minutes of a session, from the start of warm-up to the end of cool-down. */
export const durationSchema = z
  .number({ error: 'a number above 0, at most 1440 min' })
  .gt(0, { error: 'a number above 0, at most 1440 min' })
  .max(1440, { error: 'a number above 0, at most 1440 min' });
const delayWords = 'a whole number from 0 to 20160 min';
const ratingSchema = numberIn(0, 10);
export const meanHeartRateSchema = numberIn(25, 240, 'bpm');
export const externalIdSchema = lineSchema(100);
const reasonSchema = lineSchema(500);

const ratingShape = {
  rating: ratingSchema.optional(),
  ratingBy: z.enum(['athlete', 'staff']).optional(),
  ratingDelayMin: z
    .int({ error: delayWords })
    .min(0, { error: delayWords })
    .max(20160, { error: delayWords })
    .optional(),
};

const commonShape = {
  startedAt: instantSchema,
  durationMin: durationSchema,
  modality: z.enum(modalities),
  setting: z.enum(settings).default('any'),
  kind: z.enum(sessionKinds).default('training'),
  title: lineSchema(120).optional(),
  distanceM: z
    .number({ error: 'a number above 0, at most 500000 m' })
    .gt(0, { error: 'a number above 0, at most 500000 m' })
    .max(500_000, { error: 'a number above 0, at most 500000 m' })
    .optional(),
  intendedRating: ratingSchema.optional(),
  meanHeartRateBpm: meanHeartRateSchema.optional(),
  peakHeartRateBpm: numberIn(25, 250, 'bpm').optional(),
  content: sessionContentInputSchema.optional(),
  source: lineSchema(40).default('api'),
  externalId: externalIdSchema.optional(),
};

/** Who gave a rating, and when, means nothing without the rating. */
function refuseStrayRating(
  given: { rating?: unknown; ratingBy?: unknown; ratingDelayMin?: unknown },
  context: z.RefinementCtx,
) {
  if (given.rating !== undefined) return;
  for (const field of ['ratingBy', 'ratingDelayMin'] as const) {
    if (given[field] === undefined) continue;
    context.addIssue({
      code: 'custom',
      path: [field],
      input: given[field],
      message: 'nothing where there is no rating',
    });
  }
}

export const sessionInputSchema = z.strictObject({ ...commonShape, ...ratingShape }).superRefine(refuseStrayRating);
export type SessionInput = z.output<typeof sessionInputSchema>;

export const sessionCorrectionSchema = z
  .strictObject({ ...commonShape, ...ratingShape, changeReason: reasonSchema })
  .superRefine(refuseStrayRating);
export type SessionCorrection = z.output<typeof sessionCorrectionSchema>;

export const sessionWithdrawalSchema = z.strictObject({ reason: reasonSchema });

export const groupSessionInputSchema = z.strictObject({
  session: z.strictObject(commonShape),
  athletes: z
    .array(
      z
        .strictObject({
          athleteId: idSchema,
          ...ratingShape,
          durationMin: durationSchema.optional(),
          meanHeartRateBpm: meanHeartRateSchema.optional(),
          content: sessionContentInputSchema.optional(),
          externalId: externalIdSchema.optional(),
        })
        .superRefine(refuseStrayRating),
    )
    .min(1, { error: '1 to 60 athletes' })
    .max(60, { error: '1 to 60 athletes' }),
});
export type GroupSessionInput = z.output<typeof groupSessionInputSchema>;

export const athleteSessionsParamsSchema = z.strictObject({ athleteId: idSchema });
export const squadSessionsParamsSchema = z.strictObject({ squadId: idSchema });
export const sessionParamsSchema = z.strictObject({ sessionId: idSchema });
export const reweighingParamsSchema = z.strictObject({ taskId: idSchema });

export const sessionQuerySchema = z.strictObject({
  from: dayRangeShape.from.optional(),
  to: dayRangeShape.to.optional(),
  cursor: z
    .string()
    .regex(/^[\w-]{1,200}$/, { error: 'the nextCursor of an earlier answer' })
    .optional(),
  limit: queryNumberSchema(1, 200).optional(),
});
export type SessionQuery = z.output<typeof sessionQuerySchema>;

export const importQuerySchema = z.strictObject({
  dryRun: z.enum(['true', 'false']).default('false'),
});

/** The sheet itself, as text. */
export const sheetTextSchema = z.string({ error: 'a sheet as text/csv' });

const minutesSchema = z.object({ moderate: z.number(), heavy: z.number(), severe: z.number(), extreme: z.number() });

/** JSON columns of a weight, checked on reading. */
export const otherMeasuresSchema = z.array(
  z.object({
    measure: z.enum(['banister-of-mean', 'edwards', 'three-phase', 'volume-load']),
    method: z.string(),
    version: z.string(),
    value: z.number().nullable(),
    reason: z.string().nullable(),
  }),
);
export const thresholdsUsedSchema = z.array(
  z.object({
    quantity: z.enum(quantities),
    id: z.uuid(),
    value: z.number(),
    validFrom: z.string(),
    method: z.string(),
  }),
);

export const weightSchema = z.object({
  ratingLoad: z.number().nullable(),
  domain: z.object({
    state: z.enum(['present', 'absent', 'not-applicable']),
    reason: z.string().nullable(),
    load: z.number().nullable(),
    minutes: minutesSchema.nullable(),
    unassignedMin: z.number().nullable(),
  }),
  basis: z.enum(['power', 'speed', 'interval', 'minutes', 'heart-rate', 'rating']),
  measures: otherMeasuresSchema,
  thresholdsUsed: thresholdsUsedSchema,
  policyId: z.uuid().nullable(),
  methodVersion: z.string(),
  weighedAt: z.string(),
});

export const sessionSchema = z.object({
  id: z.uuid(),
  athleteId: z.uuid(),
  groupId: z.uuid().nullable(),
  startedAt: z.string(),
  zone: z.string(),
  trainingDay: z.string(),
  durationMin: z.number(),
  modality: z.enum(modalities),
  setting: z.enum(settings),
  kind: z.enum(sessionKinds),
  title: z.string().nullable(),
  distanceM: z.number().nullable(),
  rating: z.number().nullable(),
  ratingBy: z.enum(['athlete', 'staff']).nullable(),
  ratingDelayMin: z.number().nullable(),
  intendedRating: z.number().nullable(),
  meanHeartRateBpm: z.number().nullable(),
  peakHeartRateBpm: z.number().nullable(),
  content: storedContentSchema.nullable(),
  source: z.string(),
  externalId: z.string().nullable(),
  quality: z.enum(qualities),
  qualityNotes: z.array(z.string()),
  version: z.number(),
  enteredBy: z.uuid().nullable(),
  createdAt: z.string(),
  updatedAt: z.string(),
  withdrawnAt: z.string().nullable(),
  withdrawReason: z.string().nullable(),
  /** Null for a withdrawn session. */
  weight: weightSchema.nullable(),
});
export type SessionView = z.output<typeof sessionSchema>;

export const sessionPageSchema = z.object({ items: z.array(sessionSchema), nextCursor: z.string().nullable() });
export const groupAnswerSchema = z.object({ groupId: z.uuid(), items: z.array(sessionSchema) });
export const sessionHistorySchema = z.object({
  items: z.array(
    z.object({
      version: z.number(),
      snapshot: z.record(z.string(), z.unknown()),
      /** Why this version was replaced; null for the one that stands. */
      reason: z.string().nullable(),
      changedBy: z.uuid().nullable(),
      changedAt: z.string(),
    }),
  ),
});
export const importAnswerSchema = z.object({ rows: z.number(), stored: z.number(), errors: z.array(z.never()) });
export const reweighingSchema = z.object({
  state: z.enum(['waiting', 'running', 'done']),
  total: z.number(),
  done: z.number(),
  sessionIds: z.array(z.uuid()),
});
