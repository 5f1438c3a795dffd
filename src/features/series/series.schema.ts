import { z } from 'zod';
import { daySchema, idSchema } from '../../platform/schemas.ts';

const LONGEST_DAYS = 800;

export const seriesParamsSchema = z.strictObject({ athleteId: idSchema });
export const overviewParamsSchema = z.strictObject({ squadId: idSchema });
export const overviewQuerySchema = z.strictObject({ day: daySchema.optional() });

export const seriesQuerySchema = z
  .strictObject({
    from: daySchema.optional(),
    to: daySchema.optional(),
    measure: z.enum(['domain-load', 'rating-load'], { error: 'domain-load or rating-load' }).optional(),
  })
  .refine(({ from, to }) => from === undefined || to === undefined || from <= to, {
    error: 'a day not before from',
    path: ['to'],
  })
  .refine(({ from, to }) => from === undefined || to === undefined || days(from, to) <= LONGEST_DAYS, {
    error: `at most ${LONGEST_DAYS} days after from`,
    path: ['to'],
  });
export type SeriesQuery = z.output<typeof seriesQuerySchema>;

const minutes = z.number();
const value = z.number().nullable();
const reading = z.object({ state: z.enum(['known', 'partial', 'unknown']), value });
const mix = z.record(z.string(), z.number());
const component = z.object({
  units: value,
  low: value,
  high: value,
  share: value,
  shareLow: value,
  shareHigh: value,
  withheld: z.string().optional(),
});

export const seriesRowSchema = z.object({
  day: z.string(),
  training: z.enum(['trained', 'rest', 'unknown']),
  availability: z.enum(['full', 'modified', 'none']),
  away: z.boolean(),
  completeness: z.enum(['complete', 'partial', 'unknown']),
  sessions: z.number(),
  minutes,
  domain: reading,
  rating: reading,
  domainMinutes: z.object({ moderate: minutes, heavy: minutes, severe: minutes, extreme: minutes }),
  acute: value,
  chronic: value,
  ratio: z.object({
    form: z.enum(['rolling-coupled', 'rolling-uncoupled', 'exponential']),
    value,
    low: value,
    high: value,
    knownDays: z.object({ acute: z.number(), acuteOf: z.number(), chronic: z.number(), chronicOf: z.number() }),
    basisMix: z.object({ acute: mix, chronic: mix }).nullable(),
    withheld: z.string().optional(),
  }),
  monotony: value,
  strain: value,
  longLoad: component,
  shortLoad: component,
  returning: z.object({ dayN: z.number(), share: value }).nullable(),
  withheld: z.record(z.string(), z.string()),
});

/** The morning after the last closed day: only what is read in the morning. */
export const morningSchema = z.object({ day: z.string(), longLoad: component, shortLoad: component });

export const seriesSchema = z.object({
  athleteId: z.uuid(),
  asOf: z.string().nullable(),
  firstDay: z.string().nullable(),
  measure: z.enum(['domain-load', 'rating-load']).nullable(),
  measureReason: z.string().nullable(),
  ratioForm: z.string().nullable(),
  standardDeviation: z.enum(['population', 'sample']).nullable(),
  items: z.array(z.union([seriesRowSchema, morningSchema])),
});

export const overviewSchema = z.object({
  squadId: z.uuid(),
  day: z.string(),
  asOf: z.string().nullable(),
  readOn: z.string().nullable(),
  items: z.array(
    z.object({
      athleteId: z.uuid(),
      name: z.string(),
      measure: z.enum(['domain-load', 'rating-load']).nullable(),
      measureReason: z.string().nullable(),
      row: seriesRowSchema.nullable(),
      after: morningSchema.nullable(),
    }),
  ),
});

function days(from: string, to: string): number {
  return (Date.parse(to) - Date.parse(from)) / 86_400_000;
}
