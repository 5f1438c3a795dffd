import { Body, Controller, Get, Param, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import {
  closingInputSchema,
  closingListSchema,
  closingSchema,
  closingsQuerySchema,
  reopeningInputSchema,
  reopeningSchema,
  squadDayParamsSchema,
  squadDaySchema,
  squadDaysParamsSchema,
} from '../../features/days/days.schema.ts';
import type { ClosingInput, ClosingsQuery } from '../../features/days/days.schema.ts';
import { DaysService } from '../../features/days/days.service.ts';
import { Access } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('days')
@ApiBearerAuth()
@Controller('v1/squads/:squadId/days')
export class DaysController {
  constructor(private readonly days: DaysService) {}

  @Get()
  @ApiOperation({ summary: 'Which days of a stretch are closed.' })
  @Access('days.read', { kind: 'squad', param: 'squadId' })
  @Answer(200, closingListSchema)
  async closings(
    @Param({ schema: squadDaysParamsSchema }) { squadId }: { squadId: string },
    @Query({ schema: closingsQuerySchema }) { from, to }: ClosingsQuery,
  ) {
    return { items: await this.days.closings(squadId, from, to) };
  }

  @Get(':day')
  @ApiOperation({ summary: 'What is known of each athlete on a day.' })
  @Access('days.read', { kind: 'squad', param: 'squadId' })
  @Answer(200, squadDaySchema)
  async squadDay(@Param({ schema: squadDayParamsSchema }) { squadId, day }: { squadId: string; day: string }) {
    return this.days.squadDay(squadId, day);
  }

  @Post(':day/closing')
  @ApiOperation({ summary: 'The day’s log is whole, but for the athletes named: whoever else has no session rested.' })
  @Access('days.close', { kind: 'squad', param: 'squadId' })
  @Answer(200, closingSchema)
  async close(
    @Param({ schema: squadDayParamsSchema }) { squadId, day }: { squadId: string; day: string },
    @Body({ schema: closingInputSchema }) { unknownAthleteIds }: ClosingInput,
  ) {
    return this.days.close(squadId, day, unknownAthleteIds);
  }

  @Post(':day/reopening')
  @ApiOperation({ summary: 'Take a closing back.' })
  @Access('days.close', { kind: 'squad', param: 'squadId' })
  @Answer(200, reopeningSchema)
  async reopen(
    @Param({ schema: squadDayParamsSchema }) { squadId, day }: { squadId: string; day: string },
    @Body({ schema: reopeningInputSchema }) _: object,
  ) {
    return this.days.reopen(squadId, day);
  }
}
