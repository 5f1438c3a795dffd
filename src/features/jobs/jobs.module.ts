import { Module } from '@nestjs/common';
import { AccessModule } from '../access/access.module.ts';
import { SquadsModule } from '../squads/squads.module.ts';
import { JobRecordsService } from './job-records.service.ts';
import { JobRunsService } from './job-runs.service.ts';

@Module({
  imports: [AccessModule, SquadsModule],
  providers: [JobRecordsService, JobRunsService],
  exports: [JobRecordsService, JobRunsService],
})
export class JobRecordsModule {}
