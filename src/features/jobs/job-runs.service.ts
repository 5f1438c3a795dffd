import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { RuleError } from '../../platform/errors.ts';
import { localDay } from '../../platform/zoned-time.ts';
import { AuditService } from '../access/audit.service.ts';
import { SquadsService } from '../squads/squads.service.ts';
import { isOver } from './job-period.ts';
import { JobRecordRepository } from './job-record.repository.ts';
import { JobRecordsService } from './job-records.service.ts';
import type { JobRunAnswer, JobRunInput } from './job-runs.schema.ts';
import { jobKinds } from './jobs.types.ts';

const shown = 100;

/** Runs a person asks for, and what became of all runs. */
@Injectable()
export class JobRunsService {
  constructor(
    private readonly squads: SquadsService,
    private readonly records: JobRecordsService,
    private readonly repository: JobRecordRepository,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  /** False if that run waits, is under way or is done: it is not made twice. @throws {RuleError} before its time */
  async request(clubId: string, squadId: string, { job, period }: JobRunInput): Promise<boolean> {
    const { zone } = await this.squads.squad(squadId);
    this.refuseTooEarly(job, period, zone);
    const queued = await this.records.claim(clubId, { job, squadId, period });
    if (queued) await this.audit.record('jobs.run', 'squad', squadId, { job, period });
    return queued;
  }

  /** @throws {RuleError} */
  refuseTooEarly(job: JobRunInput['job'], period: string, zone: string): void {
    const kind = jobKinds[job];
    if (isOver(kind, period, localDay(this.clock.now(), zone))) return;
    const allowed = kind.covers === 'ended' ? 'a period that has ended' : 'a period that has begun';
    throw new RuleError(`The job ${job} needs ${allowed}.`, [{ field: 'period', value: period, allowed }]);
  }

  /** The newest hundred of the squad. */
  async list(squadId: string): Promise<JobRunAnswer[]> {
    const records = await this.repository.ofSquad(squadId, shown);
    return records.map(({ job, period, state, attempts, progress, claimedAt, finishedAt }) => ({
      job,
      period,
      state,
      attempts,
      note: progress.note ?? null,
      claimedAt: claimedAt.toISOString(),
      finishedAt: finishedAt?.toISOString() ?? null,
    }));
  }
}
