import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { ConflictError, NotFoundError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import type { Principal } from '../access/access.types.ts';
import { AuditService } from '../access/audit.service.ts';
import { PeopleRepository } from './people.repository.ts';
import type { Me, PersonInput, RoleInput } from './people.schema.ts';
import type { AssignedRole, Person } from './people.types.ts';

@Injectable()
export class PeopleService {
  constructor(
    private readonly people: PeopleRepository,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  async add({ name, email, roles }: PersonInput): Promise<Person> {
    const now = this.clock.now();
    const id = newId(now);
    await this.people.insert({ id, name, email, createdAt: now });
    await this.audit.record('people.write', 'person', id);
    for (const role of roles) await this.addRole(id, role);
    return this.person(id);
  }

  /** @throws {NotFoundError} */
  async person(id: string): Promise<Person> {
    const person = await this.people.find(id);
    if (person === null) throw new NotFoundError();
    return person;
  }

  async list(): Promise<Person[]> {
    return this.people.list();
  }

  async me({ clubId, personId, roles, athleteId }: Principal): Promise<Me> {
    const { id, name, email } = await this.person(personId);
    return { clubId, person: { id, name, email }, roles: [...roles], athleteId };
  }

  async addRole(personId: string, { role, squadId }: RoleInput): Promise<AssignedRole> {
    const now = this.clock.now();
    const assigned = { id: newId(now), role, squadId: squadId ?? null };
    await this.people.insertRole(personId, { ...assigned, createdAt: now });
    await this.audit.record('roles.write', 'person', personId, { role, squadId: assigned.squadId });
    return assigned;
  }

  /** @throws {ConflictError} for the club's last admin: nobody could give the role again */
  async removeRole(personId: string, roleId: string): Promise<void> {
    const admins = await this.people.countAdmins();
    const role = (await this.person(personId)).roles.find(({ id }) => id === roleId);
    if (role === undefined) throw new NotFoundError();
    if (role.role === 'admin' && admins === 1) throw new ConflictError('A club keeps at least one admin.');
    await this.people.deleteRole(personId, roleId);
    await this.audit.record('roles.remove', 'person', personId, { role: role.role, squadId: role.squadId });
  }
}
