import type { Role } from '../access/access.types.ts';

export interface AssignedRole {
  id: string;
  role: Role;
  /** Null: in every squad of the club. */
  squadId: string | null;
}

export interface Person {
  id: string;
  name: string;
  email: string;
  roles: AssignedRole[];
}
