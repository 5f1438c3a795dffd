import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Principal } from '../../features/access/access.types.ts';
import {
  availabilityEndSchema,
  availabilityEntryParamsSchema,
  availabilityInputSchema,
  availabilityListSchema,
  availabilityParamsSchema,
  availabilitySchema,
} from '../../features/availability/availability.schema.ts';
import type { AvailabilityInput } from '../../features/availability/availability.schema.ts';
import { AvailabilityService } from '../../features/availability/availability.service.ts';
import { Access, CurrentPrincipal } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('availability')
@ApiBearerAuth()
@Controller('v1/athletes/:athleteId/availability')
export class AvailabilityController {
  constructor(private readonly availability: AvailabilityService) {}

  @Post()
  @ApiOperation({ summary: 'Say that an athlete is fully, partly or not available for a time.' })
  @Access('availability.write', { kind: 'athlete', param: 'athleteId' })
  @Answer(201, availabilitySchema)
  async add(
    @Param({ schema: availabilityParamsSchema }) { athleteId }: { athleteId: string },
    @Body({ schema: availabilityInputSchema }) input: AvailabilityInput,
    @CurrentPrincipal() principal: Principal,
  ) {
    return this.availability.add(principal, athleteId, input);
  }

  @Get()
  @ApiOperation({ summary: 'State and until when; cause and reason as far as the one asking may know them.' })
  @Access('availability.read', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, availabilityListSchema)
  async list(
    @Param({ schema: availabilityParamsSchema }) { athleteId }: { athleteId: string },
    @CurrentPrincipal() principal: Principal,
  ) {
    return { items: await this.availability.list(principal, athleteId) };
  }

  @Post(':availabilityId/end')
  @ApiOperation({ summary: 'End an entry on a day.' })
  @Access('availability.write', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, availabilitySchema)
  async end(
    @Param({ schema: availabilityEntryParamsSchema })
    { athleteId, availabilityId }: { athleteId: string; availabilityId: string },
    @Body({ schema: availabilityEndSchema }) { to }: { to: string },
    @CurrentPrincipal() principal: Principal,
  ) {
    return this.availability.end(principal, athleteId, availabilityId, to);
  }
}
