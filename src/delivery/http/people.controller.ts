import { Body, Controller, Delete, Get, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import {
  assignedRoleSchema,
  personInputSchema,
  personListSchema,
  personParamsSchema,
  personSchema,
  roleInputSchema,
  roleParamsSchema,
} from '../../features/people/people.schema.ts';
import type { PersonInput, RoleInput } from '../../features/people/people.schema.ts';
import { PeopleService } from '../../features/people/people.service.ts';
import { Access } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('people')
@ApiBearerAuth()
@Controller('v1/people')
export class PeopleController {
  constructor(private readonly people: PeopleService) {}

  @Post()
  @ApiOperation({ summary: 'Add a person, with roles if wanted.' })
  @Access('people.write', { kind: 'club' })
  @Answer(201, personSchema)
  async add(@Body({ schema: personInputSchema }) input: PersonInput) {
    return this.people.add(input);
  }

  @Get()
  @ApiOperation({ summary: 'All people of the club.' })
  @Access('people.read', { kind: 'club' })
  @Answer(200, personListSchema)
  async list() {
    return { items: await this.people.list() };
  }

  @Get(':personId')
  @ApiOperation({ summary: 'One person with their roles.' })
  @Access('people.read', { kind: 'person', param: 'personId' })
  @Answer(200, personSchema)
  async one(@Param({ schema: personParamsSchema }) { personId }: { personId: string }) {
    return this.people.person(personId);
  }

  @Post(':personId/roles')
  @ApiOperation({ summary: 'Give a role in the club or one squad.' })
  @Access('roles.write', { kind: 'person', param: 'personId' })
  @Answer(201, assignedRoleSchema)
  async addRole(
    @Param({ schema: personParamsSchema }) { personId }: { personId: string },
    @Body({ schema: roleInputSchema }) input: RoleInput,
  ) {
    return this.people.addRole(personId, input);
  }

  @Delete(':personId/roles/:roleId')
  @ApiOperation({ summary: 'Take a role away.' })
  @Access('roles.write', { kind: 'person', param: 'personId' })
  @Answer(204)
  async removeRole(
    @Param({ schema: roleParamsSchema }) { personId, roleId }: { personId: string; roleId: string },
  ): Promise<void> {
    await this.people.removeRole(personId, roleId);
  }
}
