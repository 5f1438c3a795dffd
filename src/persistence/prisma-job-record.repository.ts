import { Injectable } from '@nestjs/common';
import { z } from 'zod';
import { JobRecordRepository } from '../features/jobs/job-record.repository.ts';
import type { JobRecordState } from '../features/jobs/job-record.repository.ts';
import type {
  JobId,
  JobKey,
  JobProgress,
  JobRecord,
  JobRunState,
  ScheduledSquad,
} from '../features/jobs/jobs.types.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';

interface Row {
  job: string;
  squadId: string;
  period: string;
  state: string;
  attempts: number;
  detail: string | null;
  claimedAt: Date;
  finishedAt: Date | null;
}

/** A run still "running" so long after it was claimed may have been killed where no queue looks after it. */
const ABANDONED_MS = 45 * 60_000;

const progress = z.object({ steps: z.array(z.string()), note: z.string().optional() });

@Injectable()
export class PrismaJobRecordRepository extends JobRecordRepository {
  async squadsOfAllClubs(): Promise<ScheduledSquad[]> {
    const rows = await currentTransaction().squad.findMany({ orderBy: [{ clubId: 'asc' }, { id: 'asc' }] });
    return rows.map(({ id, clubId, name, zone, createdAt }) => ({ squadId: id, clubId, name, zone, createdAt }));
  }

  async clubNames(): Promise<Map<string, string>> {
    const rows = await currentTransaction().club.findMany({ select: { id: true, name: true } });
    return new Map(rows.map(({ id, name }) => [id, name]));
  }

  async claimed(runs: readonly JobKey[], now: Date): Promise<JobKey[]> {
    if (runs.length === 0) return [];
    const rows = await currentTransaction().jobRecord.findMany({
      where: {
        job: { in: [...new Set(runs.map(({ job }) => job))] },
        period: { in: [...new Set(runs.map(({ period }) => period))] },
        NOT: [{ state: 'failed' }, { state: 'running', claimedAt: { lt: new Date(now.getTime() - ABANDONED_MS) } }],
      },
      select: { job: true, squadId: true, period: true },
    });
    return rows.map((row) => ({ ...row, job: row.job as JobId }));
  }

  async insert({ job, squadId, period }: JobKey, claimedAt: Date): Promise<boolean> {
    const { clubId } = currentScope();
    const { count } = await currentTransaction().jobRecord.createMany({
      data: [{ clubId, job, squadId, period, state: 'queued', attempts: 0, claimedAt }],
      skipDuplicates: true,
    });
    return count === 1;
  }

  async find(run: JobKey): Promise<JobRecord | null> {
    const row = await currentTransaction().jobRecord.findUnique({ where: this.where(run) });
    return row === null ? null : toRecord(row);
  }

  async lock({ job, squadId, period }: JobKey): Promise<JobRecord | null> {
    const rows = await currentTransaction().$queryRaw<Row[]>`
      select job, squad_id as "squadId", period, state, attempts, detail,
        claimed_at as "claimedAt", finished_at as "finishedAt"
      from job_record
      where club_id = ${currentScope().clubId}::uuid and job = ${job} and squad_id = ${squadId}::uuid and period = ${period}
      for update`;
    return rows[0] === undefined ? null : toRecord(rows[0]);
  }

  async save(run: JobKey, { state, attempts, progress: done, finishedAt }: JobRecordState): Promise<void> {
    const data = { state, attempts, detail: JSON.stringify(progress.parse(done)), finishedAt };
    await currentTransaction().jobRecord.update({ where: this.where(run), data });
  }

  async ofSquad(squadId: string, limit: number): Promise<JobRecord[]> {
    const rows = await currentTransaction().jobRecord.findMany({
      where: { squadId },
      orderBy: [{ claimedAt: 'desc' }, { job: 'asc' }],
      take: limit,
    });
    return rows.map(toRecord);
  }

  private where({ job, squadId, period }: JobKey) {
    return { clubId_job_squadId_period: { clubId: currentScope().clubId, job, squadId, period } };
  }
}

function toRecord({ job, squadId, period, state, attempts, detail, claimedAt, finishedAt }: Row): JobRecord {
  const done: JobProgress = { steps: [] };
  if (detail !== null) {
    const { steps, note } = progress.parse(JSON.parse(detail));
    done.steps = steps;
    if (note !== undefined) done.note = note;
  }
  return {
    job: job as JobId,
    squadId,
    period,
    state: state as JobRunState,
    attempts,
    progress: done,
    claimedAt,
    finishedAt,
  };
}
