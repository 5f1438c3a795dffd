import { Body, Controller, Get, Param, Post, Put, Query, Req, Res } from '@nestjs/common';
import { ApiBearerAuth, ApiHeader, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Principal } from '../../features/access/access.types.ts';
import { SessionReadingService } from '../../features/sessions/session-reading.service.ts';
import {
  athleteSessionsParamsSchema,
  groupAnswerSchema,
  groupSessionInputSchema,
  sessionCorrectionSchema,
  sessionHistorySchema,
  sessionInputSchema,
  sessionPageSchema,
  sessionParamsSchema,
  sessionQuerySchema,
  sessionSchema,
  sessionWithdrawalSchema,
  squadSessionsParamsSchema,
} from '../../features/sessions/sessions.schema.ts';
import type {
  GroupSessionInput,
  SessionCorrection,
  SessionInput,
  SessionQuery,
  SessionView,
} from '../../features/sessions/sessions.schema.ts';
import { SessionsService } from '../../features/sessions/sessions.service.ts';
import { Access, CurrentPrincipal } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';
import { ifMatch, sendEtag } from './if-match.ts';
import type { AppReply, AppRequest } from './request.types.ts';

@ApiTags('sessions')
@ApiBearerAuth()
@Controller('v1')
export class SessionsController {
  constructor(
    private readonly sessions: SessionsService,
    private readonly reading: SessionReadingService,
  ) {}

  @Post('athletes/:athleteId/sessions')
  @ApiOperation({ summary: 'Log a session of one athlete.' })
  @Access('sessions.write', { kind: 'athlete', param: 'athleteId' })
  @Answer(201, sessionSchema)
  async log(
    @Param({ schema: athleteSessionsParamsSchema }) { athleteId }: { athleteId: string },
    @Body({ schema: sessionInputSchema }) input: SessionInput,
    @CurrentPrincipal() principal: Principal,
    @Res({ passthrough: true }) reply: AppReply,
  ) {
    return tagged(reply, await this.sessions.log(principal, athleteId, input));
  }

  @Post('squads/:squadId/sessions')
  @ApiOperation({ summary: 'One session given to many athletes, each with own rating: all or none.' })
  @Access('sessions.write', { kind: 'squad', param: 'squadId' })
  @Answer(201, groupAnswerSchema)
  async logForGroup(
    @Param({ schema: squadSessionsParamsSchema }) { squadId }: { squadId: string },
    @Body({ schema: groupSessionInputSchema }) input: GroupSessionInput,
    @CurrentPrincipal() principal: Principal,
  ) {
    return this.sessions.logForGroup(principal, squadId, input);
  }

  @Get('athletes/:athleteId/sessions')
  @ApiOperation({ summary: 'Sessions that were not withdrawn, newest start first.' })
  @Access('sessions.read', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, sessionPageSchema)
  async page(
    @Param({ schema: athleteSessionsParamsSchema }) { athleteId }: { athleteId: string },
    @Query({ schema: sessionQuerySchema }) query: SessionQuery,
  ) {
    return this.reading.page(athleteId, query);
  }

  @Get('sessions/:sessionId')
  @ApiOperation({ summary: 'One session with its weight; the ETag is its version.' })
  @Access('sessions.read', { kind: 'session', param: 'sessionId' })
  @Answer(200, sessionSchema)
  async one(
    @Param({ schema: sessionParamsSchema }) { sessionId }: { sessionId: string },
    @Res({ passthrough: true }) reply: AppReply,
  ) {
    return tagged(reply, await this.reading.session(sessionId));
  }

  @Get('sessions/:sessionId/history')
  @ApiOperation({ summary: 'Every version of a session, who changed it and why.' })
  @Access('sessions.read', { kind: 'session', param: 'sessionId' })
  @Answer(200, sessionHistorySchema)
  async history(@Param({ schema: sessionParamsSchema }) { sessionId }: { sessionId: string }) {
    return this.reading.history(sessionId);
  }

  @Put('sessions/:sessionId')
  @ApiOperation({ summary: 'Replaces what was entered; what is left out is taken out.' })
  @Access('sessions.write', { kind: 'session', param: 'sessionId' })
  @ApiHeader({ name: 'If-Match', required: true, description: 'ETag of the version the change is based on' })
  @Answer(200, sessionSchema)
  async correct(
    @Param({ schema: sessionParamsSchema }) { sessionId }: { sessionId: string },
    @Body({ schema: sessionCorrectionSchema }) input: SessionCorrection,
    @CurrentPrincipal() principal: Principal,
    @Req() request: AppRequest,
    @Res({ passthrough: true }) reply: AppReply,
  ) {
    return tagged(reply, await this.sessions.correct(principal, sessionId, ifMatch(request), input));
  }

  @Post('sessions/:sessionId/withdrawal')
  @ApiOperation({ summary: 'Take a session out of the log, with the reason; needs If-Match.' })
  @Access('sessions.write', { kind: 'session', param: 'sessionId' })
  @ApiHeader({ name: 'If-Match', required: true, description: 'ETag of the version the withdrawal is based on' })
  @Answer(200, sessionSchema)
  async withdraw(
    @Param({ schema: sessionParamsSchema }) { sessionId }: { sessionId: string },
    @Body({ schema: sessionWithdrawalSchema }) { reason }: { reason: string },
    @CurrentPrincipal() principal: Principal,
    @Req() request: AppRequest,
    @Res({ passthrough: true }) reply: AppReply,
  ) {
    return tagged(reply, await this.sessions.withdraw(principal, sessionId, ifMatch(request), reason));
  }
}

function tagged(reply: AppReply, session: SessionView): SessionView {
  sendEtag(reply, session.version);
  return session;
}
