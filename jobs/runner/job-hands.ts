import { Inject, Injectable, Logger } from '@nestjs/common';
import type { OnModuleInit } from '@nestjs/common';
import { z } from 'zod';
import { StaleAttemptError } from '../../src/features/jobs/jobs.errors.ts';
import { JobWorkers } from '../../src/platform/job-workers.ts';
import type { JobAttempt } from '../../src/platform/job-workers.ts';
import { ReweighJob } from '../reweigh.job.ts';
import { JOB_HANDLERS } from './job-handler.ts';
import type { JobHandler } from './job-handler.ts';
import { JobRunner } from './job-runner.ts';

const runData = z.object({ squadId: z.uuid(), period: z.string() });

/** Takes attempts from the queue, one at a time of each job, and hands them to the job they belong to. */
@Injectable()
export class JobHands implements OnModuleInit {
  private readonly logger = new Logger(JobHands.name);

  constructor(
    private readonly workers: JobWorkers,
    private readonly runner: JobRunner,
    private readonly reweigh: ReweighJob,
    @Inject(JOB_HANDLERS) private readonly handlers: readonly JobHandler[],
  ) {}

  async onModuleInit(): Promise<void> {
    for (const handler of this.handlers) {
      await this.take(handler.id, async ({ clubId, data, willBeTriedAgain }) => {
        const { squadId, period } = runData.parse(data);
        await this.runner.run(handler, clubId, { job: handler.id, squadId, period }, willBeTriedAgain);
      });
    }
    await this.take(ReweighJob.queue, ({ clubId, data }) => this.reweigh.run(clubId, data));
  }

  private async take(name: string, work: (attempt: JobAttempt) => Promise<void>): Promise<void> {
    await this.workers.work(name, {}, async (attempt) => {
      const failure = await work(attempt).then(
        () => null,
        (error: unknown) => error,
      );
      if (failure === null) return;
      const level = failure instanceof StaleAttemptError ? 'warn' : 'error';
      this.logger[level]({ err: failure, job: name, willBeTriedAgain: attempt.willBeTriedAgain }, 'attempt failed');
      // The queue keeps what is thrown: only the kind of failure, never a message with data in it.
      throw new Error(failure instanceof Error ? failure.name : 'unknown failure');
    });
  }
}
