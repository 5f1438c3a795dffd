import type { Role } from './access.types.ts';

/**
 * How far a row reaches. club: needs a club-wide role. squad: the squads of the role (all of them when it is
 * club-wide). own: only the athlete the person is.
 */
export type Scope = 'club' | 'squad' | 'own';

export const actions = [
  'club.create',
  'self.read',
  'people.read',
  'people.write',
  'roles.write',
  'tokens.read',
  'tokens.write',
  'squads.read',
  'squads.write',
  'policies.read',
  'policies.write',
  'athletes.read',
  'athletes.write',
  /** Reading thresholds; body mass among them needs health.read as well. */
  'thresholds.read',
  /** Reaching the route; which quantity may be written is thresholds.write or, for body mass, health.write. */
  'thresholds.enter',
  'thresholds.write',
  'sessions.read',
  'sessions.write',
  'sessions.import',
  'days.read',
  'days.close',
  /** State and until when; cause and reason need health.read as well. */
  'availability.read',
  'availability.write',
  'health.read',
  'health.write',
  /** Entering mornings; what was entered is read with responses.read. */
  'responses.enter',
  'responses.read',
  'circumstances.read',
  'circumstances.write',
  'tests.define',
  'tests.read',
  'tests.write',
  'periods.read',
  'periods.write',
  'series.read',
  'flags.read',
  'reports.read',
  'reports.write',
  'jobs.run',
] as const;
export type Action = (typeof actions)[number];

export interface AccessRow {
  role: Role;
  action: Action;
  scope: Scope;
}

const rows = (role: Role, scope: Scope, ...allowed: Action[]): AccessRow[] =>
  allowed.map((action) => ({ role, action, scope }));

/** Who may do what. What is not written here is refused. `self.read` and `club.create` belong to no role. */
export const accessTable: readonly AccessRow[] = [
  ...rows('admin', 'club', 'people.read', 'people.write', 'roles.write', 'tokens.read', 'tokens.write', 'squads.write'),
  ...rows('admin', 'squad', 'squads.read', 'policies.read', 'athletes.read', 'athletes.write', 'thresholds.read'),
  ...rows('admin', 'squad', 'sessions.read', 'days.read', 'availability.read', 'periods.read', 'series.read'),
  ...rows('admin', 'squad', 'circumstances.read', 'tests.read', 'flags.read', 'reports.read', 'jobs.run'),

  ...rows('manager', 'club', 'squads.write'),
  ...rows('manager', 'squad', 'squads.read', 'policies.read', 'policies.write', 'athletes.read', 'athletes.write'),
  ...rows('manager', 'squad', 'thresholds.read', 'thresholds.enter', 'thresholds.write'),
  ...rows('manager', 'squad', 'sessions.read', 'sessions.write', 'sessions.import', 'days.read', 'days.close'),
  ...rows('manager', 'squad', 'availability.read', 'availability.write', 'periods.read', 'periods.write'),
  ...rows('manager', 'squad', 'circumstances.read', 'circumstances.write', 'tests.define', 'tests.read', 'tests.write'),
  ...rows('manager', 'squad', 'series.read', 'flags.read', 'reports.read', 'reports.write', 'jobs.run'),

  ...rows('coach', 'squad', 'squads.read', 'policies.read', 'athletes.read', 'sessions.read', 'days.read'),
  ...rows('coach', 'squad', 'availability.read', 'periods.read', 'series.read', 'flags.read', 'reports.read'),
  ...rows('coach', 'squad', 'circumstances.read', 'tests.read'),

  ...rows('staff', 'squad', 'squads.read', 'athletes.read', 'sessions.read', 'sessions.write', 'sessions.import'),
  ...rows('staff', 'squad', 'days.read', 'days.close', 'availability.read', 'periods.read'),
  ...rows('staff', 'squad', 'responses.enter', 'circumstances.read', 'circumstances.write', 'tests.read'),
  ...rows('staff', 'squad', 'tests.write'),

  ...rows('medic', 'squad', 'squads.read', 'athletes.read', 'sessions.read', 'days.read', 'periods.read'),
  ...rows('medic', 'squad', 'availability.read', 'availability.write', 'health.read', 'health.write'),
  ...rows('medic', 'squad', 'responses.enter', 'responses.read', 'circumstances.read', 'circumstances.write'),
  ...rows('medic', 'squad', 'tests.read', 'thresholds.read', 'thresholds.enter', 'series.read', 'flags.read'),

  ...rows('athlete', 'own', 'athletes.read', 'sessions.read', 'sessions.write', 'thresholds.read', 'thresholds.enter'),
  ...rows('athlete', 'own', 'availability.read', 'availability.write', 'health.read', 'health.write'),
  ...rows('athlete', 'own', 'responses.enter', 'responses.read', 'tests.read', 'series.read', 'flags.read'),
];
