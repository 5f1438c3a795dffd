import { randomUUID } from 'node:crypto';
import pg from 'pg';
import { TickService } from '../../../jobs/runner/tick.service.ts';
import { JobRunner } from '../../../jobs/runner/job-runner.ts';
import { JobRecordsService } from '../../../src/features/jobs/job-records.service.ts';
import { BossJobQueue } from '../../../src/persistence/boss-job-queue.ts';
import { BossJobWorkers } from '../../../src/persistence/boss-job-workers.ts';
import { PrismaJobRecordRepository } from '../../../src/persistence/prisma-job-record.repository.ts';
import { PrismaUnitOfWork } from '../../../src/persistence/prisma-unit-of-work.ts';
import { PrismaService } from '../../../src/persistence/prisma.service.ts';
import type { Clock } from '../../../src/platform/clock.ts';
import type { TestDatabase } from '../../support/database.ts';

export interface Workplace {
  unitOfWork: PrismaUnitOfWork;
  repository: PrismaJobRecordRepository;
  queue: BossJobQueue;
  workers: BossJobWorkers;
  records: JobRecordsService;
  ticks: TickService;
  runner: JobRunner;
  errors: Error[];
  close(): Promise<void>;
}

/** What one worker process is made of, without the features behind its jobs. */
export function workplace(database: TestDatabase, clock: Clock): Workplace {
  const errors: Error[] = [];
  const url = database.appUrl;
  const prisma = new PrismaService({ url, maxConnections: 4 });
  const unitOfWork = new PrismaUnitOfWork(prisma);
  const repository = new PrismaJobRecordRepository();
  const queue = new BossJobQueue({ url, onError: (error) => errors.push(error) });
  const workers = new BossJobWorkers({ url, pollingSeconds: 0.5, onError: (error) => errors.push(error) });
  const records = new JobRecordsService(repository, queue, clock);
  return {
    unitOfWork,
    repository,
    queue,
    workers,
    records,
    ticks: new TickService(unitOfWork, repository, records, clock),
    runner: new JobRunner(unitOfWork, records),
    errors,
    async close() {
      await workers.beforeApplicationShutdown();
      await queue.beforeApplicationShutdown();
      await prisma.close();
    },
  };
}

/** A club with one squad, written by the owner of the database. */
export async function makeSquad(database: TestDatabase, zone = 'UTC', createdAt = '2026-01-01T00:00:00Z') {
  const [clubId, squadId] = [randomUUID(), randomUUID()];
  await asOwner(database, async (client) => {
    await client.query('insert into club (id, name, created_at) values ($1, $2, $3)', [clubId, 'Club', createdAt]);
    await client.query('insert into squad (club_id, id, name, zone, created_at) values ($1, $2, $3, $4, $5)', [
      clubId,
      squadId,
      'Eight',
      zone,
      createdAt,
    ]);
  });
  return { clubId, squadId };
}

export async function asOwner<T>(database: TestDatabase, work: (client: pg.Client) => Promise<T>): Promise<T> {
  const client = new pg.Client({ connectionString: database.ownerUrl });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}
