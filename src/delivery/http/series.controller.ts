import { Controller, Get, Param, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import {
  overviewParamsSchema,
  overviewQuerySchema,
  overviewSchema,
  seriesParamsSchema,
  seriesQuerySchema,
  seriesSchema,
} from '../../features/series/series.schema.ts';
import type { SeriesQuery } from '../../features/series/series.schema.ts';
import { SeriesService } from '../../features/series/series.service.ts';
import { Access } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('series')
@ApiBearerAuth()
@Controller('v1')
export class SeriesController {
  constructor(private readonly series: SeriesService) {}

  @Get('athletes/:athleteId/series')
  @ApiOperation({
    summary:
      'Days up to the squad’s last closed one; the last item is the morning after it. Without from the last 56 days.',
  })
  @Access('series.read', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, seriesSchema)
  async ofAthlete(
    @Param({ schema: seriesParamsSchema }) { athleteId }: { athleteId: string },
    @Query({ schema: seriesQuerySchema }) query: SeriesQuery,
  ) {
    return this.series.excerpt(athleteId, query);
  }

  @Get('squads/:squadId/overview')
  @ApiOperation({ summary: 'The squad on its last closed day not after day (today where none is named).' })
  @Access('series.read', { kind: 'squad', param: 'squadId' })
  @Answer(200, overviewSchema)
  async overview(
    @Param({ schema: overviewParamsSchema }) { squadId }: { squadId: string },
    @Query({ schema: overviewQuerySchema }) { day }: { day?: string },
  ) {
    return this.series.overview(squadId, day ?? null);
  }
}
