import type { JobId, JobKey } from '../../src/features/jobs/jobs.types.ts';

/** What a handler works with: every step is one unit of work of the club, and fails once a later attempt took over. */
export interface JobRun extends JobKey {
  clubId: string;
  readonly step: <T>(work: () => Promise<T>) => Promise<T>;
  /** A step that is done once over all attempts; its mark is kept in the same transaction. False if it was done before. */
  readonly stepOnce: (mark: string, work: () => Promise<void>) => Promise<boolean>;
}

/** A job that runs for a squad and a period. */
export interface JobHandler {
  readonly id: JobId;
  /** Does the work; may be begun again after any step. @returns what it came to, one sentence */
  run(run: JobRun): Promise<string>;
  /** In one unit of work: what `run` would make and send, one line each. Writes nothing. */
  preview(run: JobKey): Promise<string[]>;
}

/** DI token of all handlers. */
export const JOB_HANDLERS = Symbol('loadweir:job-handlers');
