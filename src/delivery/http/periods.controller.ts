import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Principal } from '../../features/access/access.types.ts';
import {
  periodInputSchema,
  periodListSchema,
  periodParamsSchema,
  periodSchema,
} from '../../features/periods/periods.schema.ts';
import type { PeriodInput } from '../../features/periods/periods.schema.ts';
import { PeriodsService } from '../../features/periods/periods.service.ts';
import { Access, CurrentPrincipal } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('periods')
@ApiBearerAuth()
@Controller('v1/squads/:squadId/periods')
export class PeriodsController {
  constructor(private readonly periods: PeriodsService) {}

  @Post()
  @ApiOperation({ summary: 'Plan an overload (at most 21 days), an unload or a taper, for the squad or one athlete.' })
  @Access('periods.write', { kind: 'squad', param: 'squadId' })
  @Answer(201, periodSchema)
  async add(
    @Param({ schema: periodParamsSchema }) { squadId }: { squadId: string },
    @Body({ schema: periodInputSchema }) input: PeriodInput,
    @CurrentPrincipal() principal: Principal,
  ) {
    return this.periods.add(principal, squadId, input);
  }

  @Get()
  @ApiOperation({ summary: 'Planned overloads, unloads and tapers.' })
  @Access('periods.read', { kind: 'squad', param: 'squadId' })
  @Answer(200, periodListSchema)
  async list(@Param({ schema: periodParamsSchema }) { squadId }: { squadId: string }) {
    return { items: await this.periods.list(squadId) };
  }
}
