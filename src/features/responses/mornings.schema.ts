import { z } from 'zod';
import { dayRangeShape, daySchema, endsAfterStart, idSchema, lineSchema } from '../../platform/schemas.ts';
import { qualities } from './mornings.types.ts';

const number = (min: number, max: number, unit: string) => {
  const error = `a number from ${min} to ${max} ${unit}`;
  return z.number({ error }).min(min, { error }).max(max, { error });
};
const rating = z.int({ error: 'a whole number from 1 to 7, 7 worse' }).min(1).max(7);
const shortestRecording = 'between 20 and 2000 intervals, each from 300 to 2000 ms';

const values = {
  sleepHours: number(0, 24, 'hours').optional(),
  sleep: rating.optional(),
  fatigue: rating.optional(),
  stress: rating.optional(),
  soreness: rating.optional(),
  mood: rating.optional(),
  restingHeartRateBpm: number(25, 120, 'bpm').optional(),
  rmssdMs: number(1, 500, 'ms').optional(),
  rrIntervalsMs: z
    .array(number(300, 2000, 'ms'), { error: shortestRecording })
    .min(20, { error: shortestRecording })
    .max(2000, { error: shortestRecording })
    .optional(),
};

type Given = { [Name in keyof typeof values]?: unknown };

function somethingOnce(given: Given, context: z.RefinementCtx): void {
  const names = Object.keys(values) as (keyof Given)[];
  if (names.every((name) => given[name] === undefined)) {
    context.addIssue({ code: 'custom', path: [], input: undefined, message: `at least one of ${names.join(', ')}` });
  }
  if (given.rmssdMs !== undefined && given.rrIntervalsMs !== undefined) {
    const message = 'nothing beside rrIntervalsMs, from which it is computed';
    context.addIssue({ code: 'custom', path: ['rmssdMs'], input: given.rmssdMs, message });
  }
}

export const morningInputSchema = z.strictObject({ day: daySchema, ...values }).superRefine(somethingOnce);
export type MorningInput = z.output<typeof morningInputSchema>;

export const morningAdditionSchema = z
  .strictObject({ ...values, changeReason: lineSchema(500).optional() })
  .superRefine(somethingOnce);
export type MorningAddition = z.output<typeof morningAdditionSchema>;

export const morningWithdrawalSchema = z.strictObject({ reason: lineSchema(500) });
export const morningsParamsSchema = z.strictObject({ athleteId: idSchema });
export const morningParamsSchema = z.strictObject({ athleteId: idSchema, day: daySchema });
export const morningsQuerySchema = z.strictObject(dayRangeShape).superRefine(endsAfterStart);
export type MorningsQuery = z.output<typeof morningsQuerySchema>;

const shown = z.number().nullable();
export const morningSchema = z.object({
  id: z.uuid(),
  athleteId: z.uuid(),
  day: z.string(),
  version: z.int(),
  sleepHours: shown,
  sleep: shown,
  fatigue: shown,
  stress: shown,
  soreness: shown,
  /** Sum of the four ratings, 4 to 28; null where one is missing. */
  sum: shown,
  mood: shown,
  restingHeartRateBpm: shown,
  rmssdMs: shown,
  rrIntervals: z.int(),
  rrRemoved: z.int().nullable(),
  quality: z.enum(qualities),
  qualityNotes: z.array(z.string()),
  enteredBy: z.uuid().nullable(),
  enteredAt: z.string(),
  updatedAt: z.string(),
  withdrawnAt: z.string().nullable(),
  withdrawReason: z.string().nullable(),
});
export type MorningView = z.output<typeof morningSchema>;

/** What somebody gets who may enter mornings, but not read them. */
export const morningReceiptSchema = z.object({ id: z.uuid(), athleteId: z.uuid(), day: z.string(), version: z.int() });
export type MorningReceipt = z.output<typeof morningReceiptSchema>;

export const morningAnswerSchema = z.union([morningSchema, morningReceiptSchema]);
export const morningListSchema = z.object({ items: z.array(morningSchema) });
export const morningHistorySchema = z.object({
  items: z.array(
    z.object({
      version: z.int(),
      snapshot: z.unknown(),
      reason: z.string().nullable(),
      changedBy: z.uuid().nullable(),
      changedAt: z.string(),
    }),
  ),
});
