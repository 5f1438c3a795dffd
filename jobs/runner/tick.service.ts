import { Injectable, Logger } from '@nestjs/common';
import { JobRecordRepository } from '../../src/features/jobs/job-record.repository.ts';
import { JobRecordsService } from '../../src/features/jobs/job-records.service.ts';
import { Clock } from '../../src/platform/clock.ts';
import { UnitOfWork } from '../../src/platform/unit-of-work.ts';
import { schedule } from '../schedule.ts';
import { due } from './due.ts';
import type { DueRun } from './due.ts';

/** Looks what is due and claims it. Any number of workers may do so at the same moment: one of them gets each run. */
@Injectable()
export class TickService {
  private readonly logger = new Logger(TickService.name);

  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly records: JobRecordRepository,
    private readonly jobRecords: JobRecordsService,
    private readonly clock: Clock,
  ) {}

  /** The runs this tick claimed. A run that cannot be claimed is logged and tried again at the next tick. */
  async tick(): Promise<DueRun[]> {
    const claimed: DueRun[] = [];
    for (const run of await this.dueNow()) {
      try {
        const scope = { clubId: run.clubId, personId: null };
        if (await this.unitOfWork.run(scope, () => this.jobRecords.claim(run.clubId, run))) claimed.push(run);
      } catch (error) {
        this.logger.error({ err: error, job: run.job, period: run.period }, 'a run that is due could not be claimed');
      }
    }
    for (const { job, squadId, period } of claimed) this.logger.log({ job, squadId, period }, 'run claimed');
    return claimed;
  }

  private async dueNow(): Promise<DueRun[]> {
    const now = this.clock.now();
    return this.unitOfWork.runAsOperator(async () => {
      const squads = await this.records.squadsOfAllClubs();
      const candidates = due(schedule, [], squads, now);
      return due(schedule, await this.records.claimed(candidates, now), squads, now);
    });
  }
}
