import { Body, Controller, Get, Param, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Principal } from '../../features/access/access.types.ts';
import {
  definitionInputSchema,
  definitionListSchema,
  definitionParamsSchema,
  definitionSchema,
  definitionsParamsSchema,
  definitionWithdrawalSchema,
  resultCorrectionSchema,
  resultInputSchema,
  resultListSchema,
  resultParamsSchema,
  resultSchema,
  resultsParamsSchema,
  resultsQuerySchema,
  resultWithdrawalSchema,
} from '../../features/tests/tests.schema.ts';
import type { DefinitionInput, ResultCorrection, ResultInput } from '../../features/tests/tests.schema.ts';
import { TestDefinitionsService } from '../../features/tests/test-definitions.service.ts';
import { TestResultsService } from '../../features/tests/test-results.service.ts';
import { Access, CurrentPrincipal } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

interface OneResult {
  athleteId: string;
  resultId: string;
}

@ApiTags('tests')
@ApiBearerAuth()
@Controller('v1')
export class TestsController {
  constructor(
    private readonly definitions: TestDefinitionsService,
    private readonly results: TestResultsService,
  ) {}

  @Post('squads/:squadId/test-definitions')
  @ApiOperation({ summary: 'Define a criterion test (maximal) or a standard bout (fixed work) of the squad.' })
  @Access('tests.define', { kind: 'squad', param: 'squadId' })
  @Answer(201, definitionSchema)
  async define(
    @Param({ schema: definitionsParamsSchema }) { squadId }: { squadId: string },
    @Body({ schema: definitionInputSchema }) input: DefinitionInput,
    @CurrentPrincipal() principal: Principal,
  ) {
    return this.definitions.add(principal, squadId, input);
  }

  @Get('squads/:squadId/test-definitions')
  @ApiOperation({ summary: 'Tests of the squad.' })
  @Access('tests.read', { kind: 'squad', param: 'squadId' })
  @Answer(200, definitionListSchema)
  async defined(@Param({ schema: definitionsParamsSchema }) { squadId }: { squadId: string }) {
    return { items: await this.definitions.list(squadId) };
  }

  @Post('squads/:squadId/test-definitions/:definitionId/withdrawal')
  @ApiOperation({ summary: 'Take a test out of use, with the reason; its results stay.' })
  @Access('tests.define', { kind: 'squad', param: 'squadId' })
  @Answer(200, definitionSchema)
  async withdrawDefinition(
    @Param({ schema: definitionParamsSchema })
    { squadId, definitionId }: { squadId: string; definitionId: string },
    @Body({ schema: definitionWithdrawalSchema }) { reason }: { reason: string },
  ) {
    return this.definitions.withdraw(squadId, definitionId, reason);
  }

  @Post('athletes/:athleteId/test-results')
  @ApiOperation({ summary: 'Enter the result of a criterion test, or the readings of a standard bout.' })
  @Access('tests.write', { kind: 'athlete', param: 'athleteId' })
  @Answer(201, resultSchema)
  async add(
    @Param({ schema: resultsParamsSchema }) { athleteId }: { athleteId: string },
    @Body({ schema: resultInputSchema }) input: ResultInput,
    @CurrentPrincipal() principal: Principal,
  ) {
    return this.results.add(principal, athleteId, input);
  }

  @Get('athletes/:athleteId/test-results')
  @ApiOperation({ summary: 'Results by day, each beside what the own earlier ones let expect.' })
  @Access('tests.read', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, resultListSchema)
  async list(
    @Param({ schema: resultsParamsSchema }) { athleteId }: { athleteId: string },
    @Query({ schema: resultsQuerySchema }) { definitionId }: { definitionId?: string | undefined },
  ) {
    return { items: await this.results.list(athleteId, definitionId) };
  }

  @Post('athletes/:athleteId/test-results/:resultId/correction')
  @ApiOperation({ summary: 'Put another result in the place of one, with the reason; the old one stays on record.' })
  @Access('tests.write', { kind: 'athlete', param: 'athleteId' })
  @Answer(201, resultSchema)
  async correct(
    @Param({ schema: resultParamsSchema }) one: OneResult,
    @Body({ schema: resultCorrectionSchema }) input: ResultCorrection,
    @CurrentPrincipal() principal: Principal,
  ) {
    return this.results.correct(principal, one, input);
  }

  @Post('athletes/:athleteId/test-results/:resultId/withdrawal')
  @ApiOperation({ summary: 'Take a result out, with the reason.' })
  @Access('tests.write', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, resultSchema)
  async withdraw(
    @Param({ schema: resultParamsSchema }) one: OneResult,
    @Body({ schema: resultWithdrawalSchema }) { reason }: { reason: string },
    @CurrentPrincipal() principal: Principal,
  ) {
    return this.results.withdraw(principal, one, reason);
  }
}
