import { Controller, Get, Param, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import { CAUTIONS } from '../../features/flags/cautions.types.ts';
import {
  athleteFlagsParamsSchema,
  athleteFlagsSchema,
  squadFlagsParamsSchema,
  squadFlagsQuerySchema,
  squadFlagsSchema,
} from '../../features/flags/flags.schema.ts';
import { FlagsService } from '../../features/flags/flags.service.ts';
import { Access } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('flags')
@ApiBearerAuth()
@Controller('v1')
export class FlagsController {
  constructor(private readonly flags: FlagsService) {}

  @Get('athletes/:athleteId/flags')
  @ApiOperation({ summary: 'All flags of the athlete, newest first; open ones have no until.' })
  @Access('flags.read', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, athleteFlagsSchema)
  async ofAthlete(@Param({ schema: athleteFlagsParamsSchema }) { athleteId }: { athleteId: string }) {
    return { cautions: CAUTIONS, items: await this.flags.ofAthlete(athleteId) };
  }

  @Get('squads/:squadId/flags')
  @ApiOperation({
    summary: 'Flags of the squad that are open on its last closed day not after day (today where none is named).',
  })
  @Access('flags.read', { kind: 'squad', param: 'squadId' })
  @Answer(200, squadFlagsSchema)
  async ofSquad(
    @Param({ schema: squadFlagsParamsSchema }) { squadId }: { squadId: string },
    @Query({ schema: squadFlagsQuerySchema }) { day }: { day?: string },
  ) {
    const { asOf, flags } = await this.flags.ofSquad(squadId, day ?? null);
    return { cautions: CAUTIONS, asOf, items: flags };
  }
}
