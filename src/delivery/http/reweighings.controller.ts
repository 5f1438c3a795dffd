import { Controller, Get, Param } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import { ReweighService } from '../../features/sessions/reweigh.service.ts';
import { reweighingParamsSchema, reweighingSchema } from '../../features/sessions/sessions.schema.ts';
import { Access } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('thresholds')
@ApiBearerAuth()
@Controller('v1/reweighings')
export class ReweighingsController {
  constructor(private readonly reweigh: ReweighService) {}

  @Get(':taskId')
  @ApiOperation({ summary: 'How far a re-weighing has come, and which sessions weigh differently so far.' })
  @Access('thresholds.read', { kind: 'reweighing', param: 'taskId' })
  @Answer(200, reweighingSchema)
  async one(@Param({ schema: reweighingParamsSchema }) { taskId }: { taskId: string }) {
    return this.reweigh.progress(taskId);
  }
}
