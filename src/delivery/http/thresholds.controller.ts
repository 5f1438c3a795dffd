import { Body, Controller, Get, Param, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Principal } from '../../features/access/access.types.ts';
import { ThresholdEntryService } from '../../features/thresholds/threshold-entry.service.ts';
import {
  inForceQuerySchema,
  inForceSchema,
  thresholdCorrectionAnswerSchema,
  thresholdCorrectionSchema,
  thresholdListSchema,
  thresholdParamsSchema,
  thresholdQuerySchema,
  thresholdsAnswerSchema,
  thresholdsInputSchema,
  thresholdValueParamsSchema,
  thresholdWithdrawalAnswerSchema,
  thresholdWithdrawalSchema,
} from '../../features/thresholds/thresholds.schema.ts';
import type {
  InForceQuery,
  ThresholdCorrection,
  ThresholdQuery,
  ThresholdsInput,
} from '../../features/thresholds/thresholds.schema.ts';
import { ThresholdsService } from '../../features/thresholds/thresholds.service.ts';
import { Access, CurrentPrincipal } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('thresholds')
@ApiBearerAuth()
@Controller('v1/athletes/:athleteId/thresholds')
export class ThresholdsController {
  constructor(
    private readonly thresholds: ThresholdsService,
    private readonly entry: ThresholdEntryService,
  ) {}

  @Post()
  @ApiOperation({
    summary: 'Many values, all or none. Sessions they touch are weighed again; more than 500 of them by a task.',
  })
  @Access('thresholds.enter', { kind: 'athlete', param: 'athleteId' })
  @Answer(201, thresholdsAnswerSchema)
  async enter(
    @Param({ schema: thresholdParamsSchema }) { athleteId }: { athleteId: string },
    @Body({ schema: thresholdsInputSchema }) input: ThresholdsInput,
    @CurrentPrincipal() principal: Principal,
  ) {
    return this.entry.enter(principal, athleteId, input);
  }

  @Get()
  @ApiOperation({ summary: 'The history, corrected and withdrawn values included.' })
  @Access('thresholds.read', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, thresholdListSchema)
  async history(
    @Param({ schema: thresholdParamsSchema }) { athleteId }: { athleteId: string },
    @Query({ schema: thresholdQuerySchema }) query: ThresholdQuery,
    @CurrentPrincipal() principal: Principal,
  ) {
    return { items: await this.thresholds.history(principal, athleteId, query) };
  }

  @Get('in-force')
  @ApiOperation({ summary: 'The values in force on a day for a modality and setting.' })
  @Access('thresholds.read', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, inForceSchema)
  async inForce(
    @Param({ schema: thresholdParamsSchema }) { athleteId }: { athleteId: string },
    @Query({ schema: inForceQuerySchema }) query: InForceQuery,
    @CurrentPrincipal() principal: Principal,
  ) {
    return this.thresholds.inForceView(principal, athleteId, query);
  }

  @Post(':valueId/correction')
  @ApiOperation({ summary: 'Correct a value, with the reason; the old one stays in the history.' })
  @Access('thresholds.enter', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, thresholdCorrectionAnswerSchema)
  async correct(
    @Param({ schema: thresholdValueParamsSchema }) { athleteId, valueId }: { athleteId: string; valueId: string },
    @Body({ schema: thresholdCorrectionSchema }) input: ThresholdCorrection,
    @CurrentPrincipal() principal: Principal,
  ) {
    return this.entry.correct(principal, athleteId, valueId, input);
  }

  @Post(':valueId/withdrawal')
  @ApiOperation({ summary: 'Withdraw a value, with the reason; its days fall back to the value before.' })
  @Access('thresholds.enter', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, thresholdWithdrawalAnswerSchema)
  async withdraw(
    @Param({ schema: thresholdValueParamsSchema }) { athleteId, valueId }: { athleteId: string; valueId: string },
    @Body({ schema: thresholdWithdrawalSchema }) { reason }: { reason: string },
    @CurrentPrincipal() principal: Principal,
  ) {
    return this.entry.withdraw(principal, athleteId, valueId, reason);
  }
}
