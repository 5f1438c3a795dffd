import { z } from 'zod';
import { idSchema } from '../../platform/schemas.ts';
import { periodDays } from './job-period.ts';
import { jobIds, jobKinds } from './jobs.types.ts';

const examples = { 'iso-week': 'an ISO 8601 week like 2026-W48', day: 'a date like 2026-11-23' } as const;

export const jobRunInputSchema = z
  .strictObject({ job: z.enum(jobIds), period: z.string().max(10) })
  .superRefine(({ job, period }, context) => {
    const { period: kind } = jobKinds[job];
    if (periodDays(kind, period) === null) {
      context.addIssue({ code: 'custom', path: ['period'], input: period, message: examples[kind] });
    }
  });
export type JobRunInput = z.output<typeof jobRunInputSchema>;

export const jobRunParamsSchema = z.strictObject({ squadId: idSchema });

export const jobRunQueuedSchema = z.object({ queued: z.boolean() });

export const jobRunSchema = z.object({
  job: z.enum(jobIds),
  period: z.string(),
  state: z.enum(['queued', 'running', 'done', 'failed']),
  attempts: z.int(),
  note: z.string().nullable(),
  claimedAt: z.iso.datetime(),
  finishedAt: z.iso.datetime().nullable(),
});
export type JobRunAnswer = z.output<typeof jobRunSchema>;
export const jobRunListSchema = z.object({ items: z.array(jobRunSchema) });
