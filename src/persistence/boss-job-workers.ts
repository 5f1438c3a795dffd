import type { BeforeApplicationShutdown } from '@nestjs/common';
import { PgBoss } from 'pg-boss';
import { z } from 'zod';
import { JobWorkers } from '../platform/job-workers.ts';
import type { JobAttempt, JobWorkOptions } from '../platform/job-workers.ts';
import { QUEUE_SCHEMA } from './boss-job-queue.ts';

export interface BossJobWorkersOptions {
  /** Connection of the role that owns nothing. */
  url: string;
  onError: (error: Error) => void;
  /** How often an idle worker looks for work; the queue allows no less than half a second. */
  pollingSeconds?: number;
  /** How long a stop waits for attempts under way before they are given back to the queue. */
  stopWithinMs?: number;
}

const envelope = z.object({ clubId: z.uuid(), data: z.unknown() });

/** Workers of pg-boss. They also supervise the queue: attempts whose heartbeat is missing go back to it. */
export class BossJobWorkers extends JobWorkers implements BeforeApplicationShutdown {
  readonly #boss: PgBoss;
  readonly #options: BossJobWorkersOptions;
  #started: Promise<unknown> | undefined;

  constructor(options: BossJobWorkersOptions) {
    super();
    this.#options = options;
    this.#boss = new PgBoss({
      connectionString: options.url,
      schema: QUEUE_SCHEMA,
      max: 3,
      migrate: false,
      schedule: false,
      registerInstance: false,
      supervise: true,
      superviseIntervalSeconds: 5,
      monitorIntervalSeconds: 5,
      reindex: false,
    });
    this.#boss.on('error', (error: unknown) => options.onError(asError(error)));
  }

  async work(name: string, options: JobWorkOptions, handle: (attempt: JobAttempt) => Promise<void>): Promise<void> {
    this.#started ??= this.#boss.start();
    await this.#started;
    await this.#boss.createQueue(name);
    const workOptions = {
      includeMetadata: true,
      batchSize: 1,
      localConcurrency: options.concurrency ?? 1,
      pollingIntervalSeconds: this.#options.pollingSeconds ?? 2,
    } as const;
    await this.#boss.work<unknown, void, typeof workOptions>(name, workOptions, async ([job]) => {
      if (job === undefined) return;
      const { clubId, data } = envelope.parse(job.data);
      await handle({ clubId, data, willBeTriedAgain: job.retryCount < job.retryLimit });
    });
  }

  async beforeApplicationShutdown(): Promise<void> {
    if (this.#started === undefined) return;
    await this.#started.catch(() => undefined);
    await this.#boss.stop({ graceful: true, timeout: this.#options.stopWithinMs ?? 20_000 });
  }
}

/** The queue reports failures of its workers as plain objects with the message of the error that was. */
function asError(error: unknown): Error {
  if (error instanceof Error) return error;
  const message = (error as { message?: unknown } | null)?.message;
  return new Error(typeof message === 'string' ? message : 'the queue gave no reason');
}
