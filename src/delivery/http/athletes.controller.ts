import { Body, Controller, Get, Param, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Principal } from '../../features/access/access.types.ts';
import {
  athleteInputSchema,
  athleteListSchema,
  athleteParamsSchema,
  athleteQuerySchema,
  athleteSchema,
  membershipEndSchema,
  membershipInputSchema,
  membershipListSchema,
  membershipParamsSchema,
  membershipSchema,
  zonePeriodInputSchema,
  zonePeriodListSchema,
  zonePeriodSchema,
} from '../../features/athletes/athletes.schema.ts';
import type { AthleteInput, MembershipInput, ZonePeriodInput } from '../../features/athletes/athletes.schema.ts';
import { AthletesService } from '../../features/athletes/athletes.service.ts';
import { Access, CurrentPrincipal } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('athletes')
@ApiBearerAuth()
@Controller('v1/athletes')
export class AthletesController {
  constructor(private readonly athletes: AthletesService) {}

  @Post()
  @ApiOperation({ summary: 'Add an athlete to a squad from a day on.' })
  @Access('athletes.write', { kind: 'club' })
  @Answer(201, athleteSchema)
  async add(@Body({ schema: athleteInputSchema }) input: AthleteInput, @CurrentPrincipal() principal: Principal) {
    return this.athletes.add(principal, input);
  }

  @Get()
  @ApiOperation({ summary: 'Athletes of one squad today, or all the person may read.' })
  @Access('athletes.read', { kind: 'club' })
  @Answer(200, athleteListSchema)
  async list(
    @Query({ schema: athleteQuerySchema }) { squadId }: { squadId?: string },
    @CurrentPrincipal() principal: Principal,
  ) {
    return { items: await this.athletes.list(principal, squadId) };
  }

  @Get(':athleteId')
  @ApiOperation({ summary: 'One athlete.' })
  @Access('athletes.read', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, athleteSchema)
  async one(@Param({ schema: athleteParamsSchema }) { athleteId }: { athleteId: string }) {
    return this.athletes.athlete(athleteId);
  }

  @Post(':athleteId/memberships')
  @ApiOperation({ summary: 'Put the athlete into a squad for a time; stays may not overlap.' })
  @Access('athletes.write', { kind: 'athlete', param: 'athleteId' })
  @Answer(201, membershipSchema)
  async addMembership(
    @Param({ schema: athleteParamsSchema }) { athleteId }: { athleteId: string },
    @Body({ schema: membershipInputSchema }) input: MembershipInput,
    @CurrentPrincipal() principal: Principal,
  ) {
    return this.athletes.addMembership(principal, athleteId, input);
  }

  @Get(':athleteId/memberships')
  @ApiOperation({ summary: 'The squads the athlete was and is in.' })
  @Access('athletes.read', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, membershipListSchema)
  async memberships(@Param({ schema: athleteParamsSchema }) { athleteId }: { athleteId: string }) {
    return { items: await this.athletes.membership(athleteId) };
  }

  @Post(':athleteId/memberships/:membershipId/end')
  @ApiOperation({ summary: 'End a stay in a squad on a day.' })
  @Access('athletes.write', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, membershipSchema)
  async endMembership(
    @Param({ schema: membershipParamsSchema })
    { athleteId, membershipId }: { athleteId: string; membershipId: string },
    @Body({ schema: membershipEndSchema }) { to }: { to: string },
  ) {
    return this.athletes.endMembership(athleteId, membershipId, to);
  }

  @Post(':athleteId/zone-periods')
  @ApiOperation({ summary: 'Another time zone for a time, such as a camp.' })
  @Access('athletes.write', { kind: 'athlete', param: 'athleteId' })
  @Answer(201, zonePeriodSchema)
  async addZonePeriod(
    @Param({ schema: athleteParamsSchema }) { athleteId }: { athleteId: string },
    @Body({ schema: zonePeriodInputSchema }) input: ZonePeriodInput,
  ) {
    return this.athletes.addZonePeriod(athleteId, input);
  }

  @Get(':athleteId/zone-periods')
  @ApiOperation({ summary: 'Times the athlete spent in other zones.' })
  @Access('athletes.read', { kind: 'athlete', param: 'athleteId' })
  @Answer(200, zonePeriodListSchema)
  async zonePeriods(@Param({ schema: athleteParamsSchema }) { athleteId }: { athleteId: string }) {
    return { items: await this.athletes.zonePeriods(athleteId) };
  }
}
