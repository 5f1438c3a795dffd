/** One attempt at a queued job. */
export interface JobAttempt {
  clubId: string;
  data: unknown;
  /** False when a failure of this attempt is the last word. */
  willBeTriedAgain: boolean;
}

export interface JobWorkOptions {
  /** How many attempts this process works on at a time; 1 where not given. */
  concurrency?: number;
}

/** Takes queued jobs, each by one worker process at a time (port and DI token). */
export abstract class JobWorkers {
  /** From now on attempts at jobs of this name are handed to `handle`; one that throws is tried again later. */
  abstract work(name: string, options: JobWorkOptions, handle: (attempt: JobAttempt) => Promise<void>): Promise<void>;
}
