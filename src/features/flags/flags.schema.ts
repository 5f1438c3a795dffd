import { z } from 'zod';
import { daySchema, idSchema } from '../../platform/schemas.ts';
import { flagKinds } from './flags.types.ts';
import type { FlagEvidence } from './flags.types.ts';

const day = z.iso.date();
const loadMeasure = z.enum(['ratio', 'chronic-low', 'monotony-strain', 'spike']);

const loadPart = z.object({
  measure: loadMeasure,
  value: z.number(),
  limit: z.number(),
  day,
  since: day,
  until: day.nullable(),
  shortHistory: z.boolean().exactOptional(),
  usual: z.number().exactOptional(),
  strain: z.number().exactOptional(),
  strainLimit: z.number().exactOptional(),
  spikeClass: z.enum(['reference', 'small', 'moderate', 'large']).exactOptional(),
  sessionId: z.string().exactOptional(),
});

/** What a flag rests on, as it is kept and answered. */
export const flagEvidence: z.ZodType<FlagEvidence> = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('load-concern'),
    day,
    strongest: loadMeasure,
    parts: z.array(loadPart),
    ratioLimit: z.number(),
    loadMeasure: z.string(),
    form: z.string(),
  }),
  z.object({ kind: z.literal('return'), day, dayN: z.number(), share: z.number().nullable() }),
  z.object({ kind: z.literal('recovering'), day, dayN: z.number(), of: z.number() }),
  z.object({
    kind: z.literal('planned-overload'),
    day,
    dayN: z.number(),
    of: z.number(),
    ratio: z.number().nullable(),
  }),
  z.object({ kind: z.literal('log-gap'), day, known: z.number(), of: z.number() }),
  z.object({ kind: z.literal('data-suspect'), day, sessions: z.number(), lastSeen: day }),
  z.object({
    kind: z.literal('thresholds-out-of-date'),
    day,
    modality: z.string(),
    newest: day,
    ageDays: z.number(),
    limitDays: z.number(),
  }),
]);

/** One flag as the service answers it. */
export const flagAnswer = z.object({
  id: z.string().optional(),
  athleteId: z.string(),
  squadId: z.string(),
  kind: z.enum(flagKinds),
  level: z.enum(['note', 'watch', 'act']),
  since: day,
  until: day.nullable(),
  claim: z.string(),
  ask: z.string(),
  sentence: z.string(),
  clears: z.string(),
  evidence: flagEvidence,
  asOf: day.optional(),
});

export const athleteFlagsParamsSchema = z.strictObject({ athleteId: idSchema });
export const squadFlagsParamsSchema = z.strictObject({ squadId: idSchema });
export const squadFlagsQuerySchema = z.strictObject({ day: daySchema.optional() });

/** Every answer with flags says how they are meant. */
export const athleteFlagsSchema = z.object({ cautions: z.array(z.string()), items: z.array(flagAnswer) });
export const squadFlagsSchema = athleteFlagsSchema.extend({ asOf: z.string().nullable() });
