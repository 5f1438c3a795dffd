/** What a person may be in a club; club-wide, or in one squad. An athlete sees own data only. */
export const roles = ['admin', 'manager', 'coach', 'staff', 'medic', 'athlete'] as const;
export type Role = (typeof roles)[number];

export interface RoleGrant {
  role: Role;
  /** Null: in every squad of the club. */
  squadId: string | null;
}

/** The person who is asking. */
export interface Principal {
  clubId: string;
  personId: string;
  roles: readonly RoleGrant[];
  /** The athlete this person is, if any. */
  athleteId: string | null;
}

/** Kinds of things a right is about. Everything but the club itself is looked up before a right is judged. */
export const targetKinds = ['squad', 'athlete', 'session', 'report', 'person', 'reweighing'] as const;
export type TargetKind = (typeof targetKinds)[number];

/** Where a route finds its target: a path parameter, or something that needs none. */
export type RouteTarget =
  { kind: TargetKind; param: string } | { kind: 'club' } | { kind: 'self' } | { kind: 'operator' };

/** One thing a right is asked for. */
export type Target = { kind: TargetKind; id: string } | { kind: 'club' };

/** To whom a thing belongs: its squads, and the athlete or person it is about. */
export interface Reach {
  squadIds: readonly string[];
  athleteId: string | null;
  personId: string | null;
}
