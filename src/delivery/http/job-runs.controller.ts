import { Body, Controller, Get, HttpCode, Param, Post } from '@nestjs/common';
import { ApiAcceptedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Principal } from '../../features/access/access.types.ts';
import {
  jobRunInputSchema,
  jobRunListSchema,
  jobRunParamsSchema,
  jobRunQueuedSchema,
} from '../../features/jobs/job-runs.schema.ts';
import type { JobRunAnswer, JobRunInput } from '../../features/jobs/job-runs.schema.ts';
import { JobRunsService } from '../../features/jobs/job-runs.service.ts';
import { Access, CurrentPrincipal } from './access.decorator.ts';

@ApiTags('jobs')
@Controller('v1/squads/:squadId/job-runs')
export class JobRunsController {
  constructor(private readonly runs: JobRunsService) {}

  @Post()
  @HttpCode(202)
  @Access('jobs.run', { kind: 'squad', param: 'squadId' })
  @ApiOperation({ summary: 'Have a job run for a period; not queued if that run waits, is under way or is done' })
  @ApiAcceptedResponse({ standardSchema: jobRunQueuedSchema })
  async request(
    @CurrentPrincipal() { clubId }: Principal,
    @Param({ schema: jobRunParamsSchema }) { squadId }: { squadId: string },
    @Body({ schema: jobRunInputSchema }) input: JobRunInput,
  ): Promise<{ queued: boolean }> {
    return { queued: await this.runs.request(clubId, squadId, input) };
  }

  @Get()
  @Access('jobs.run', { kind: 'squad', param: 'squadId' })
  @ApiOperation({ summary: 'The newest hundred runs of the squad’s jobs and what became of them' })
  @ApiOkResponse({ standardSchema: jobRunListSchema })
  async list(
    @Param({ schema: jobRunParamsSchema }) { squadId }: { squadId: string },
  ): Promise<{ items: JobRunAnswer[] }> {
    return { items: await this.runs.list(squadId) };
  }
}
