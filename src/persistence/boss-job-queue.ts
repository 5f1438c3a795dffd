import { createHash } from 'node:crypto';
import type { BeforeApplicationShutdown } from '@nestjs/common';
import { fromPrisma, PgBoss } from 'pg-boss';
import type { SendOptions } from 'pg-boss';
import { z } from 'zod';
import { JobQueue } from '../platform/job-queue.ts';
import type { QueuedJob } from '../platform/job-queue.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';

export const QUEUE_SCHEMA = 'pgboss';

/**
 * Seventeen attempts with growing pauses, almost four hours: a mail server that is down in the morning is waited for.
 * A worker that was killed is noticed by its missing heartbeat. Done jobs are kept for ever, because their id is what
 * refuses a second run. Own conventions, but for the heartbeat (10 s is the shortest the queue allows).
 */
const attempts: SendOptions = {
  retryLimit: 16,
  retryDelay: 2,
  retryBackoff: true,
  retryDelayMax: 1800,
  expireInSeconds: 1800,
  heartbeatSeconds: 10,
  retentionSeconds: 30 * 86_400,
  deleteAfterSeconds: 0,
};

/** What the queue answers but does not declare. */
const counted = z.object({ affected: z.number() });

export interface BossJobQueueOptions {
  /** Connection of the role that owns nothing. */
  url: string;
  onError?: (error: Error) => void;
}

/** The queue of pg-boss, used for sending only: nothing is looked after and nothing is taken here. */
export class BossJobQueue extends JobQueue implements BeforeApplicationShutdown {
  readonly #boss: PgBoss;
  readonly #known = new Map<string, Promise<void>>();
  #started: Promise<unknown> | undefined;

  constructor(options: BossJobQueueOptions) {
    super();
    this.#boss = new PgBoss({
      connectionString: options.url,
      schema: QUEUE_SCHEMA,
      max: 1,
      migrate: false,
      supervise: false,
      schedule: false,
      registerInstance: false,
    });
    this.#boss.on('error', options.onError ?? (() => undefined));
  }

  async enqueueOnce(job: QueuedJob): Promise<boolean> {
    const tx = currentTransaction();
    if (currentScope().clubId !== job.clubId) throw new Error('a job is queued in a unit of work of its own club');
    await this.#ensureQueue(job.name);
    const id = jobId(job.name, job.key);
    const db = fromPrisma(tx);
    const sent = await this.#boss.send(job.name, { clubId: job.clubId, data: job.data }, { ...attempts, id, db });
    if (sent !== null) return true;
    return counted.parse(await this.#boss.retry(job.name, id, { db })).affected > 0;
  }

  async beforeApplicationShutdown(): Promise<void> {
    if (this.#started === undefined) return;
    await this.#started.catch(() => undefined);
    await this.#boss.stop({ graceful: false });
  }

  /** A queue is a row of its name. Made outside the transaction under way, once a process. */
  async #ensureQueue(name: string): Promise<void> {
    let known = this.#known.get(name);
    if (known === undefined) {
      known = (this.#started ??= this.#boss.start()).then(() => this.#boss.createQueue(name));
      this.#known.set(name, known);
      known.catch(() => this.#known.delete(name));
    }
    await known;
  }
}

/** The id under which a job is unique for ever: its name and key, hashed into the form of a UUID (RFC 9562, version 8). */
export function jobId(name: string, key: string): string {
  const bytes = createHash('sha256').update(`${name}\n${key}`).digest().subarray(0, 16);
  bytes[6] = (bytes[6]! & 0x0f) | 0x80;
  bytes[8] = (bytes[8]! & 0x3f) | 0x80;
  const hex = bytes.toString('hex');
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-');
}
