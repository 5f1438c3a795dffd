import { Injectable } from '@nestjs/common';
import { roles } from '../features/access/access.types.ts';
import { PeopleRepository } from '../features/people/people.repository.ts';
import type { AssignedRole, Person } from '../features/people/people.types.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';
import { holdName } from './sql/hold-name.sql.ts';

@Injectable()
export class PrismaPeopleRepository extends PeopleRepository {
  async insert(person: Omit<Person, 'roles'> & { createdAt: Date }): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().person.create({ data: { ...person, clubId } });
  }

  async find(id: string): Promise<Person | null> {
    const person = await currentTransaction().person.findFirst({ where: { id } });
    if (person === null) return null;
    return { id, name: person.name, email: person.email, roles: (await rolesOf([id])).get(id) ?? [] };
  }

  async list(): Promise<Person[]> {
    const people = await currentTransaction().person.findMany({ orderBy: [{ name: 'asc' }, { id: 'asc' }] });
    const assigned = await rolesOf(people.map(({ id }) => id));
    return people.map(({ id, name, email }) => ({ id, name, email, roles: assigned.get(id) ?? [] }));
  }

  async insertRole(personId: string, role: AssignedRole & { createdAt: Date }): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().roleAssignment.create({ data: { ...role, clubId, personId } });
  }

  async deleteRole(personId: string, roleId: string): Promise<boolean> {
    const { count } = await currentTransaction().roleAssignment.deleteMany({ where: { id: roleId, personId } });
    return count > 0;
  }

  async countAdmins(): Promise<number> {
    const tx = currentTransaction();
    await holdName(tx, `roles|${currentScope().clubId}`);
    return tx.roleAssignment.count({ where: { role: 'admin' } });
  }
}

async function rolesOf(personIds: string[]): Promise<Map<string, AssignedRole[]>> {
  const rows = await currentTransaction().roleAssignment.findMany({
    where: { personId: { in: personIds } },
    orderBy: [{ createdAt: 'asc' }, { role: 'asc' }, { squadId: 'asc' }],
  });
  const byPerson = Map.groupBy(rows, ({ personId }) => personId);
  const toRole = ({ id, role, squadId }: (typeof rows)[number]) => {
    const known = roles.find((name) => name === role);
    return known === undefined ? [] : [{ id, role: known, squadId }];
  };
  return new Map([...byPerson].map(([personId, own]) => [personId, own.flatMap(toRole)]));
}
