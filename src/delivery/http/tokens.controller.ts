import { Body, Controller, Delete, Get, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Principal } from '../../features/access/access.types.ts';
import {
  issuedTokenSchema,
  tokenInputSchema,
  tokenListSchema,
  tokenParamsSchema,
} from '../../features/access/tokens.schema.ts';
import type { TokenInput } from '../../features/access/tokens.schema.ts';
import { TokensService } from '../../features/access/tokens.service.ts';
import { personParamsSchema } from '../../features/people/people.schema.ts';
import { Access, CurrentPrincipal } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('people')
@ApiBearerAuth()
@Controller('v1/people/:personId/tokens')
export class TokensController {
  constructor(private readonly tokens: TokensService) {}

  @Post()
  @ApiOperation({ summary: 'The secret is shown in this answer only.' })
  @Access('tokens.write', { kind: 'person', param: 'personId' })
  @Answer(201, issuedTokenSchema)
  async issue(
    @Param({ schema: personParamsSchema }) { personId }: { personId: string },
    @Body({ schema: tokenInputSchema }) input: TokenInput,
    @CurrentPrincipal() { clubId }: Principal,
  ) {
    return this.tokens.issue(clubId, personId, input);
  }

  @Get()
  @ApiOperation({ summary: 'Tokens of a person, without their secrets.' })
  @Access('tokens.read', { kind: 'person', param: 'personId' })
  @Answer(200, tokenListSchema)
  async list(@Param({ schema: personParamsSchema }) { personId }: { personId: string }) {
    return { items: await this.tokens.list(personId) };
  }

  @Delete(':tokenId')
  @ApiOperation({ summary: 'Make a token useless from now on.' })
  @Access('tokens.write', { kind: 'person', param: 'personId' })
  @Answer(204)
  async revoke(
    @Param({ schema: tokenParamsSchema }) { personId, tokenId }: { personId: string; tokenId: string },
  ): Promise<void> {
    await this.tokens.revoke(personId, tokenId);
  }
}
