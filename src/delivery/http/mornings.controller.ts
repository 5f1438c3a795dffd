import { Body, Controller, Get, Param, Patch, Post, Query, Req, Res } from '@nestjs/common';
import { ApiBearerAuth, ApiHeader, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Principal } from '../../features/access/access.types.ts';
import {
  morningAdditionSchema,
  morningAnswerSchema,
  morningHistorySchema,
  morningInputSchema,
  morningListSchema,
  morningParamsSchema,
  morningSchema,
  morningsParamsSchema,
  morningsQuerySchema,
  morningWithdrawalSchema,
} from '../../features/responses/mornings.schema.ts';
import type { MorningAddition, MorningInput, MorningsQuery } from '../../features/responses/mornings.schema.ts';
import { MorningsService } from '../../features/responses/mornings.service.ts';
import { Access, CurrentPrincipal } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';
import { ifMatch, sendEtag } from './if-match.ts';
import type { AppReply, AppRequest } from './request.types.ts';

interface OneMorning {
  athleteId: string;
  day: string;
}
const basedOn = { name: 'If-Match', required: true, description: 'ETag of the version the change is based on' };

@ApiTags('mornings')
@ApiBearerAuth()
@Controller('v1/athletes/:athleteId/mornings')
export class MorningsController {
  constructor(private readonly mornings: MorningsService) {}

  @Post()
  @ApiOperation({ summary: 'Enter what was answered or measured in a morning; at least one value.' })
  @Access('responses.enter', { kind: 'athlete', param: 'athleteId' })
  @Answer(201, morningAnswerSchema)
  async add(
    @Param({ schema: morningsParamsSchema }) { athleteId }: { athleteId: string },
    @Body({ schema: morningInputSchema }) input: MorningInput,
    @CurrentPrincipal() principal: Principal,
    @Res({ passthrough: true }) reply: AppReply,
  ) {
    return tagged(reply, await this.mornings.add(principal, athleteId, input));
  }

  @Get()
  @ApiOperation({ summary: 'Mornings of a span of days, with the sum of the four ratings where all are there.' })
  @Access('responses.read', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, morningListSchema)
  async list(
    @Param({ schema: morningsParamsSchema }) { athleteId }: { athleteId: string },
    @Query({ schema: morningsQuerySchema }) query: MorningsQuery,
  ) {
    return { items: await this.mornings.list(athleteId, query) };
  }

  @Get(':day')
  @ApiOperation({ summary: 'One morning; the ETag is its version.' })
  @Access('responses.read', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, morningSchema)
  async one(
    @Param({ schema: morningParamsSchema }) { athleteId, day }: OneMorning,
    @Res({ passthrough: true }) reply: AppReply,
  ) {
    return tagged(reply, await this.mornings.one(athleteId, day));
  }

  @Get(':day/history')
  @ApiOperation({ summary: 'Every earlier version of a morning, who changed it and why.' })
  @Access('responses.read', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, morningHistorySchema)
  async history(@Param({ schema: morningParamsSchema }) { athleteId, day }: OneMorning) {
    return this.mornings.history(athleteId, day);
  }

  @Patch(':day')
  @ApiOperation({ summary: 'Add answers to a morning; changing one that is there needs a reason.' })
  @Access('responses.enter', { kind: 'athlete', param: 'athleteId' })
  @ApiHeader(basedOn)
  @Answer(200, morningAnswerSchema)
  async addTo(
    @Param({ schema: morningParamsSchema }) one: OneMorning,
    @Body({ schema: morningAdditionSchema }) input: MorningAddition,
    @CurrentPrincipal() principal: Principal,
    @Req() request: AppRequest,
    @Res({ passthrough: true }) reply: AppReply,
  ) {
    return tagged(reply, await this.mornings.addTo(principal, one, ifMatch(request), input));
  }

  @Post(':day/withdrawal')
  @ApiOperation({ summary: 'Take a morning out, with the reason; needs If-Match.' })
  @Access('responses.enter', { kind: 'athlete', param: 'athleteId' })
  @ApiHeader(basedOn)
  @Answer(200, morningAnswerSchema)
  async withdraw(
    @Param({ schema: morningParamsSchema }) one: OneMorning,
    @Body({ schema: morningWithdrawalSchema }) { reason }: { reason: string },
    @CurrentPrincipal() principal: Principal,
    @Req() request: AppRequest,
    @Res({ passthrough: true }) reply: AppReply,
  ) {
    return tagged(reply, await this.mornings.withdraw(principal, one, ifMatch(request), reason));
  }
}

function tagged<T extends { version: number }>(reply: AppReply, morning: T): T {
  sendEtag(reply, morning.version);
  return morning;
}
