import type { AssignedRole, Person } from './people.types.ts';

/** People of a club and their roles (port and DI token). */
export abstract class PeopleRepository {
  abstract insert(person: Omit<Person, 'roles'> & { createdAt: Date }): Promise<void>;
  abstract find(id: string): Promise<Person | null>;
  /** By name. */
  abstract list(): Promise<Person[]>;
  abstract insertRole(personId: string, role: AssignedRole & { createdAt: Date }): Promise<void>;
  /** False if the person has no such role. */
  abstract deleteRole(personId: string, roleId: string): Promise<boolean>;
  /** How many people hold the role admin; nobody else changes roles until the unit of work ends. */
  abstract countAdmins(): Promise<number>;
}
