import { z } from 'zod';
import { lineSchema } from '../../platform/schemas.ts';
import { numberIn, wholeIn } from './number-in.ts';

const powerW = numberIn(0, 3000, 'W').optional();
const speedMps = numberIn(0, 15, 'm/s').optional();
const heartRateBpm = numberIn(25, 240, 'bpm').optional();
const minutes = numberIn(0, 1440, 'min');

const lineShape = {
  repetitions: wholeIn(1, 200),
  durationS: numberIn(1, 86_400, 's'),
  powerW,
  speedMps,
  heartRateBpm,
  recoveryS: numberIn(0, 7200, 's').optional(),
  recoveryPowerW: powerW,
  recoverySpeedMps: speedMps,
  recoveryHeartRateBpm: heartRateBpm,
};

const intervalLineSchema = z.strictObject(lineShape).superRefine((line, context) => {
  const given = (...values: (number | undefined)[]) => values.filter((value) => value !== undefined).length;
  const wrong = (field: string, message: string) =>
    context.addIssue({ code: 'custom', path: [field], input: undefined, message });
  if (given(line.powerW, line.speedMps, line.heartRateBpm) !== 1) {
    wrong('powerW', 'exactly one of powerW, speedMps, heartRateBpm');
  }
  const recoveries = given(line.recoveryPowerW, line.recoverySpeedMps, line.recoveryHeartRateBpm);
  if (recoveries > 1) wrong('recoveryPowerW', 'at most one of recoveryPowerW, recoverySpeedMps, recoveryHeartRateBpm');
  if (recoveries > 0 && (line.recoveryS ?? 0) === 0) wrong('recoveryS', 'above 0 where a recovery has an intensity');
});

const domainMinutesSchema = z.strictObject({
  kind: z.literal('domain-minutes'),
  moderate: minutes,
  heavy: minutes,
  severe: minutes,
  extreme: minutes,
});

const strengthSetSchema = z.strictObject({
  exercise: lineSchema(80),
  sets: wholeIn(1, 50),
  repetitions: wholeIn(1, 500),
  loadKg: z
    .number({ error: 'a number above 0, at most 1000 kg' })
    .gt(0, { error: 'a number above 0, at most 1000 kg' })
    .max(1000, { error: 'a number above 0, at most 1000 kg' }),
});

const lines = <T extends z.ZodType>(schema: T) =>
  z.array(schema).min(1, { error: '1 to 60 lines' }).max(60, { error: '1 to 60 lines' });

/** What a session was made of, as it is entered. */
export const sessionContentInputSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('intervals'), lines: lines(intervalLineSchema) }),
  domainMinutesSchema,
  z.strictObject({ kind: z.literal('strength'), sets: lines(strengthSetSchema) }),
]);

/** The same as it is stored and answered. */
export const storedContentSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('none') }),
  z.object({ kind: z.literal('intervals'), lines: z.array(z.object(lineShape)) }),
  z.object({
    kind: z.literal('domain-minutes'),
    moderate: z.number(),
    heavy: z.number(),
    severe: z.number(),
    extreme: z.number(),
  }),
  z.object({ kind: z.literal('strength'), sets: z.array(strengthSetSchema) }),
]);
