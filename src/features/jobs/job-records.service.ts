import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { JobQueue } from '../../platform/job-queue.ts';
import { StaleAttemptError } from './jobs.errors.ts';
import { JobRecordRepository } from './job-record.repository.ts';
import { keyOf } from './jobs.types.ts';
import type { JobKey, JobRecord } from './jobs.types.ts';

/** The life of a run: claimed once, begun as often as needed, done once. Every method joins the unit of work under way. */
@Injectable()
export class JobRecordsService {
  constructor(
    private readonly records: JobRecordRepository,
    private readonly queue: JobQueue,
    private readonly clock: Clock,
  ) {}

  /** Queues the run together with its record, or once more one the queue gave up. False if it waits, runs or is done. */
  async claim(clubId: string, run: JobKey): Promise<boolean> {
    const { job, squadId, period } = run;
    const record = await this.startRecord(run);
    if (record !== 'new' && record.state === 'done') return false;
    const queued = await this.queue.enqueueOnce({ name: job, key: keyOf(run), clubId, data: { squadId, period } });
    if (!queued) return false;
    if (record !== 'new') await this.records.save(run, { ...record, state: 'queued', finishedAt: null });
    return true;
  }

  /** Begins an attempt, which from now on is the only one that may write. Null if the run is done. */
  async begin(run: JobKey): Promise<JobRecord | null> {
    await this.records.insert(run, this.clock.now());
    const record = await this.held(run);
    if (record.state === 'done') return null;
    const begun: JobRecord = { ...record, state: 'running', attempts: record.attempts + 1, finishedAt: null };
    await this.records.save(run, begun);
    return begun;
  }

  /** The record, if this attempt is still the one that may write. @throws {StaleAttemptError} */
  async holdFor(run: JobKey, attempt: number): Promise<JobRecord> {
    const record = await this.held(run);
    if (record.attempts !== attempt || record.state !== 'running') throw new StaleAttemptError(keyOf(run), attempt);
    return record;
  }

  async stepDone(record: JobRecord, step: string): Promise<void> {
    await this.records.save(record, {
      ...record,
      progress: { ...record.progress, steps: [...record.progress.steps, step] },
    });
  }

  async done(run: JobKey, attempt: number, note: string): Promise<void> {
    const record = await this.holdFor(run, attempt);
    const progress = { ...record.progress, note };
    await this.records.save(run, { ...record, state: 'done', progress, finishedAt: this.clock.now() });
  }

  /** Says why an attempt failed; for good where no other follows. An attempt that was overtaken says nothing. */
  async failed(run: JobKey, attempt: number, note: string, willBeTriedAgain: boolean): Promise<void> {
    const record = await this.held(run);
    if (record.attempts !== attempt || record.state !== 'running') return;
    const progress = { ...record.progress, note };
    const finishedAt = willBeTriedAgain ? null : this.clock.now();
    await this.records.save(run, { ...record, state: willBeTriedAgain ? 'queued' : 'failed', progress, finishedAt });
  }

  private async startRecord(run: JobKey): Promise<JobRecord | 'new'> {
    return (await this.records.insert(run, this.clock.now())) ? 'new' : this.held(run);
  }

  private async held(run: JobKey): Promise<JobRecord> {
    const record = await this.records.lock(run);
    if (record === null) throw new Error(`no record of ${keyOf(run)}`);
    return record;
  }
}
