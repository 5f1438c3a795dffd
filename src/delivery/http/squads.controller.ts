import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Principal } from '../../features/access/access.types.ts';
import {
  squadInputSchema,
  squadListSchema,
  squadParamsSchema,
  squadSchema,
} from '../../features/squads/squads.schema.ts';
import type { SquadInput } from '../../features/squads/squads.schema.ts';
import { SquadsService } from '../../features/squads/squads.service.ts';
import { Access, CurrentPrincipal } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('squads')
@ApiBearerAuth()
@Controller('v1/squads')
export class SquadsController {
  constructor(private readonly squads: SquadsService) {}

  @Post()
  @ApiOperation({ summary: 'The squad’s first policy is made with it, with the defaults, from 2000-01-01 on.' })
  @Access('squads.write', { kind: 'club' })
  @Answer(201, squadSchema)
  async add(@Body({ schema: squadInputSchema }) input: SquadInput) {
    return this.squads.add(input);
  }

  @Get()
  @ApiOperation({ summary: 'The squads the person may read.' })
  @Access('squads.read', { kind: 'club' })
  @Answer(200, squadListSchema)
  async list(@CurrentPrincipal() principal: Principal) {
    return { items: await this.squads.listFor(principal) };
  }

  @Get(':squadId')
  @ApiOperation({ summary: 'One squad.' })
  @Access('squads.read', { kind: 'squad', param: 'squadId' })
  @Answer(200, squadSchema)
  async one(@Param({ schema: squadParamsSchema }) { squadId }: { squadId: string }) {
    return this.squads.squad(squadId);
  }
}
