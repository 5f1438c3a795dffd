import { Controller, Get } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Principal } from '../../features/access/access.types.ts';
import { meSchema } from '../../features/people/people.schema.ts';
import { PeopleService } from '../../features/people/people.service.ts';
import { Access, CurrentPrincipal } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('people')
@ApiBearerAuth()
@Controller('v1/me')
export class MeController {
  constructor(private readonly people: PeopleService) {}

  @Get()
  @ApiOperation({ summary: 'Who is asking, with which roles.' })
  @Access('self.read', { kind: 'self' })
  @Answer(200, meSchema)
  async me(@CurrentPrincipal() principal: Principal) {
    return this.people.me(principal);
  }
}
