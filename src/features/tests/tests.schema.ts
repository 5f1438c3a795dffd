import { z } from 'zod';
import { daySchema, idSchema, lineSchema } from '../../platform/schemas.ts';
import { modalities, settings } from '../thresholds/thresholds.types.ts';
import { directions, resultQualities, testKinds } from './tests.types.ts';

const number = (min: number, max: number, unit: string) => {
  const error = `a number from ${min} to ${max} ${unit}`.trim();
  return z.number({ error }).min(min, { error }).max(max, { error });
};
const aboveZero = z
  .number({ error: 'a number above 0, at most 1000000' })
  .gt(0, { error: 'a number above 0, at most 1000000' })
  .max(1_000_000, { error: 'a number above 0, at most 1000000' });

/** Typical error of a session rating at the same work, where none is given: own convention. */
const RATING_TYPICAL_ERROR = 0.5;
/** Typical error of the heart rate at the same work [bpm], where none is given: own convention. */
const HEART_RATE_TYPICAL_ERROR = 3;

const common = {
  name: lineSchema(100),
  protocol: lineSchema(1000),
  modality: z.enum(modalities),
  setting: z.enum(settings).default('any'),
};
export const definitionInputSchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('criterion'),
    ...common,
    unit: lineSchema(20),
    direction: z.enum(directions),
    typicalError: aboveZero,
  }),
  z.strictObject({
    kind: z.literal('standard-bout'),
    ...common,
    ratingTypicalError: number(0.1, 3, 'CR-10 units').default(RATING_TYPICAL_ERROR),
    heartRateTypicalError: number(0.5, 20, 'bpm').default(HEART_RATE_TYPICAL_ERROR),
  }),
]);
export type DefinitionInput = z.output<typeof definitionInputSchema>;

export const definitionsParamsSchema = z.strictObject({ squadId: idSchema });
export const definitionWithdrawalSchema = z.strictObject({ reason: lineSchema(500) });
export const definitionParamsSchema = z.strictObject({ squadId: idSchema, definitionId: idSchema });

const shown = z.number().nullable();
export const definitionSchema = z.object({
  id: z.uuid(),
  squadId: z.uuid(),
  kind: z.enum(testKinds),
  name: z.string(),
  protocol: z.string(),
  modality: z.enum(modalities),
  setting: z.enum(settings),
  unit: z.string().nullable(),
  direction: z.enum(directions).nullable(),
  typicalError: shown,
  ratingTypicalError: shown,
  heartRateTypicalError: shown,
  createdBy: z.uuid().nullable(),
  createdAt: z.string(),
  withdrawnAt: z.string().nullable(),
  withdrawReason: z.string().nullable(),
});
export type DefinitionView = z.output<typeof definitionSchema>;
export const definitionListSchema = z.object({ items: z.array(definitionSchema) });

const readings = {
  value: aboveZero.optional(),
  workW: number(20, 2000, 'W').optional(),
  workMps: number(0.2, 12, 'm/s').optional(),
  heartRateBpm: number(60, 240, 'bpm').optional(),
  heartRateRecoveryBpm: number(0, 120, 'bpm').optional(),
  rating: number(0, 10, 'on the CR-10 scale').optional(),
  lactateMmolL: number(0.1, 35, 'mmol/L').optional(),
  note: lineSchema(500).optional(),
  /** Said of a result that is right although it is far from the own last ones. */
  confirmed: z.literal(true, { error: 'true, or left out' }).optional(),
};
export const resultInputSchema = z.strictObject({ definitionId: idSchema, day: daySchema, ...readings });
export type ResultInput = z.output<typeof resultInputSchema>;
export type ResultReadings = Omit<ResultInput, 'definitionId' | 'day'>;
export const resultCorrectionSchema = z.strictObject({ ...readings, reason: lineSchema(500) });
export type ResultCorrection = z.output<typeof resultCorrectionSchema>;
export const resultWithdrawalSchema = z.strictObject({ reason: lineSchema(500) });

export const resultsParamsSchema = z.strictObject({ athleteId: idSchema });
export const resultParamsSchema = z.strictObject({ athleteId: idSchema, resultId: idSchema });
export const resultsQuerySchema = z.strictObject({ definitionId: idSchema.optional() });

export const resultSchema = z.object({
  id: z.uuid(),
  definitionId: z.uuid(),
  athleteId: z.uuid(),
  day: z.string(),
  value: shown,
  workW: shown,
  workMps: shown,
  heartRateBpm: shown,
  heartRateRecoveryBpm: shown,
  rating: shown,
  lactateMmolL: shown,
  /** Of a criterion test: mean of the last 3 to 6 own results at least 15 days older; null with fewer than 3. */
  expected: shown,
  /** Deviation from it in typical errors; negative is worse. */
  deviation: shown,
  quality: z.enum(resultQualities),
  qualityNotes: z.array(z.string()),
  note: z.string().nullable(),
  enteredBy: z.uuid().nullable(),
  enteredAt: z.string(),
  supersedes: z.uuid().nullable(),
  withdrawnAt: z.string().nullable(),
  withdrawReason: z.string().nullable(),
});
export type ResultView = z.output<typeof resultSchema>;
export const resultListSchema = z.object({ items: z.array(resultSchema) });
