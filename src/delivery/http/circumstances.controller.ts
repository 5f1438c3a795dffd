import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Principal } from '../../features/access/access.types.ts';
import {
  circumstanceInputSchema,
  circumstanceListSchema,
  circumstanceParamsSchema,
  circumstanceSchema,
  circumstancesParamsSchema,
  circumstanceWithdrawalSchema,
} from '../../features/responses/circumstances.schema.ts';
import type { CircumstanceInput } from '../../features/responses/circumstances.schema.ts';
import { CircumstancesService } from '../../features/responses/circumstances.service.ts';
import { Access, CurrentPrincipal } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('circumstances')
@ApiBearerAuth()
@Controller('v1/squads/:squadId/circumstances')
export class CircumstancesController {
  constructor(private readonly circumstances: CircumstancesService) {}

  @Post()
  @ApiOperation({ summary: 'Say that a squad or an athlete travels, or trains in heat or at altitude, for a time.' })
  @Access('circumstances.write', { kind: 'squad', param: 'squadId' })
  @Answer(201, circumstanceSchema)
  async add(
    @Param({ schema: circumstancesParamsSchema }) { squadId }: { squadId: string },
    @Body({ schema: circumstanceInputSchema }) input: CircumstanceInput,
    @CurrentPrincipal() principal: Principal,
  ) {
    return this.circumstances.add(principal, squadId, input);
  }

  @Get()
  @ApiOperation({ summary: 'Travel, heat and altitude of the squad and its athletes.' })
  @Access('circumstances.read', { kind: 'squad', param: 'squadId' })
  @Answer(200, circumstanceListSchema)
  async list(@Param({ schema: circumstancesParamsSchema }) { squadId }: { squadId: string }) {
    return { items: await this.circumstances.list(squadId) };
  }

  @Post(':circumstanceId/withdrawal')
  @ApiOperation({ summary: 'Take an entry back, with the reason.' })
  @Access('circumstances.write', { kind: 'squad', param: 'squadId' })
  @Answer(200, circumstanceSchema)
  async withdraw(
    @Param({ schema: circumstanceParamsSchema })
    { squadId, circumstanceId }: { squadId: string; circumstanceId: string },
    @Body({ schema: circumstanceWithdrawalSchema }) { reason }: { reason: string },
  ) {
    return this.circumstances.withdraw(squadId, circumstanceId, reason);
  }
}
