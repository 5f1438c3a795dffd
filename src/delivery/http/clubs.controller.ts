import { Body, Controller, Post, Req, Res } from '@nestjs/common';
import { ApiBearerAuth, ApiHeader, ApiOperation, ApiTags } from '@nestjs/swagger';
import { clubInputSchema, clubMadeSchema } from '../../features/clubs/clubs.schema.ts';
import type { ClubInput } from '../../features/clubs/clubs.schema.ts';
import { ClubsService } from '../../features/clubs/clubs.service.ts';
import { Access } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';
import { idempotencyKeyOf } from './bearer.ts';
import type { AppReply, AppRequest } from './request.types.ts';

@ApiTags('clubs')
@ApiBearerAuth('operator')
@Controller('v1/clubs')
export class ClubsController {
  constructor(private readonly clubs: ClubsService) {}

  @Post()
  @ApiOperation({
    summary:
      'By the operator’s key. With an Idempotency-Key the same club is answered again, with 200 and without a token.',
  })
  @Access('club.create', { kind: 'operator' })
  @ApiHeader({ name: 'Idempotency-Key', required: false })
  @Answer(201, clubMadeSchema)
  async add(
    @Body({ schema: clubInputSchema }) input: ClubInput,
    @Req() request: AppRequest,
    @Res({ passthrough: true }) reply: AppReply,
  ) {
    const { made, answer } = await this.clubs.add(input, idempotencyKeyOf(request));
    reply.status(made ? 201 : 200);
    return answer;
  }
}
