import { Injectable, Logger } from '@nestjs/common';
import { JobRecordsService } from '../../src/features/jobs/job-records.service.ts';
import { StaleAttemptError } from '../../src/features/jobs/jobs.errors.ts';
import type { JobKey } from '../../src/features/jobs/jobs.types.ts';
import { AppError } from '../../src/platform/errors.ts';
import { UnitOfWork } from '../../src/platform/unit-of-work.ts';
import type { JobHandler } from './job-handler.ts';

export type JobOutcome = { state: 'done'; note: string } | { state: 'done-before' };

/** Runs one attempt at a run. What an attempt writes is fenced: the record is held in each of its transactions. */
@Injectable()
export class JobRunner {
  private readonly logger = new Logger(JobRunner.name);

  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly records: JobRecordsService,
  ) {}

  async run(handler: JobHandler, clubId: string, key: JobKey, willBeTriedAgain: boolean): Promise<JobOutcome> {
    const inClub = <T>(work: () => Promise<T>) => this.unitOfWork.run({ clubId, personId: null }, work);
    const begun = await inClub(() => this.records.begin(key));
    if (begun === null) return { state: 'done-before' };
    const attempt = begun.attempts;
    const step = <T>(work: () => Promise<T>) =>
      inClub(async () => {
        await this.records.holdFor(key, attempt);
        return work();
      });
    const stepOnce = (mark: string, work: () => Promise<void>) =>
      inClub(async () => {
        const record = await this.records.holdFor(key, attempt);
        if (record.progress.steps.includes(mark)) return false;
        await work();
        await this.records.stepDone(record, mark);
        return true;
      });
    try {
      const note = await handler.run({ ...key, clubId, step, stepOnce });
      await inClub(() => this.records.done(key, attempt, note));
      this.logger.log({ ...key, attempt, note }, 'run done');
      return { state: 'done', note };
    } catch (error) {
      if (!(error instanceof StaleAttemptError)) {
        await inClub(() => this.records.failed(key, attempt, reason(error), willBeTriedAgain)).catch(
          (failure: unknown) => this.logger.error({ err: failure, ...key }, 'the failure could not be recorded'),
        );
      }
      throw error;
    }
  }
}

/** Messages of the project's own errors carry no personal data; others may, and only their kind is kept. */
function reason(error: unknown): string {
  if (error instanceof AppError) return error.message;
  return error instanceof Error ? error.name : 'unknown failure';
}
