import { randomBytes, randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { expectRefused, openAsOwner } from './support/constraints.ts';
import type { OwnersDatabase } from './support/constraints.ts';

// Every constraint of these tables is broken once, past the schemas of the edge, and says what is allowed.
const tables = [
  ...['club', 'person', 'role_assignment', 'access_token', 'squad', 'load_policy'],
  ...['athlete', 'membership', 'zone_period'],
];
const [club, person, squad, athlete] = [randomUUID(), randomUUID(), randomUUID(), randomUUID()];
const now = '2026-03-02T12:00:00Z';

let db: OwnersDatabase;
beforeAll(async () => {
  db = await openAsOwner();
  const { insert } = db;
  await insert('club', { id: club, name: 'Club', external_key: 'key', created_at: now });
  await insert('person', { club_id: club, id: person, name: 'Pat', email: 'pat@example.org', created_at: now });
  await insert('squad', { club_id: club, id: squad, name: 'Squad', zone: 'UTC', created_at: now });
  await insert('athlete', { ...newAthlete(), id: athlete, person_id: person });
  await insert('role_assignment', newRole());
  await insert('membership', { ...newStay(), valid_from: '2026-01-01' });
  await insert('zone_period', { ...newZone(), valid_from: '2026-01-01', valid_to: '2026-01-10' });
  await insert('load_policy', { ...newPolicy(), valid_from: '2026-01-01' });
});
afterAll(() => db.close());

const newClub = () => ({ id: randomUUID(), name: 'Other', created_at: now });
const newPerson = () => ({ club_id: club, id: randomUUID(), name: 'Kim', email: 'kim@example.org', created_at: now });
const newRole = () => ({
  club_id: club,
  id: randomUUID(),
  person_id: person,
  role: 'coach',
  squad_id: squad,
  created_at: now,
});
const newToken = () => ({
  club_id: club,
  id: randomUUID(),
  person_id: person,
  label: 'x',
  token_hash: randomBytes(32),
  created_at: now,
  expires_at: '2026-04-02T12:00:00Z',
});
const newAthlete = () => ({ club_id: club, id: randomUUID(), name: 'Alex', created_at: now });
const newStay = () => ({ club_id: club, id: randomUUID(), athlete_id: athlete, squad_id: squad });
const newZone = () => ({ club_id: club, id: randomUUID(), athlete_id: athlete, zone: 'UTC' });
const newPolicy = () => ({ club_id: club, id: randomUUID(), squad_id: squad, settings: {}, created_at: now });
const backwards = { valid_from: '2020-02-02', valid_to: '2020-02-01' };

const broken: [constraint: string, table: string, row: () => object, status: number][] = [
  ['club_external_key_key', 'club', () => ({ ...newClub(), external_key: 'key' }), 409],
  ['club_name_length', 'club', () => ({ ...newClub(), name: '' }), 400],
  ['person_club_id_email_key', 'person', () => ({ ...newPerson(), email: 'pat@example.org' }), 409],
  ['person_email_shape', 'person', () => ({ ...newPerson(), email: 'Kim@example.org' }), 400],
  ['person_name_length', 'person', () => ({ ...newPerson(), name: 'n'.repeat(201) }), 400],
  ['role_assignment_once', 'role_assignment', newRole, 409],
  ['role_assignment_person_fk', 'role_assignment', () => ({ ...newRole(), person_id: randomUUID() }), 404],
  ['role_assignment_role_known', 'role_assignment', () => ({ ...newRole(), role: 'owner' }), 400],
  ['role_assignment_squad_fk', 'role_assignment', () => ({ ...newRole(), squad_id: randomUUID() }), 404],
  ['access_token_expires_later', 'access_token', () => ({ ...newToken(), expires_at: now }), 400],
  ['access_token_person_fk', 'access_token', () => ({ ...newToken(), person_id: randomUUID() }), 404],
  [
    'squad_name_length',
    'squad',
    () => ({ club_id: club, id: randomUUID(), name: '', zone: 'UTC', created_at: now }),
    400,
  ],
  [
    'squad_club_id_name_key',
    'squad',
    () => ({ club_id: club, id: randomUUID(), name: 'Squad', zone: 'UTC', created_at: now }),
    409,
  ],
  ['load_policy_no_overlap', 'load_policy', () => ({ ...newPolicy(), valid_from: '2026-06-01' }), 409],
  ['load_policy_order', 'load_policy', () => ({ ...newPolicy(), ...backwards }), 422],
  ['load_policy_created_by_fk', 'load_policy', () => ({ ...newPolicy(), created_by: randomUUID(), ...longAgo }), 404],
  ['load_policy_squad_fk', 'load_policy', () => ({ ...newPolicy(), squad_id: randomUUID(), ...tomorrow }), 404],
  ['athlete_birth_year_range', 'athlete', () => ({ ...newAthlete(), birth_year: 1899 }), 400],
  ['athlete_club_id_person_id_key', 'athlete', () => ({ ...newAthlete(), person_id: person }), 409],
  ['athlete_name_length', 'athlete', () => ({ ...newAthlete(), name: '' }), 400],
  ['athlete_person_fk', 'athlete', () => ({ ...newAthlete(), person_id: randomUUID() }), 404],
  ['athlete_sex_known', 'athlete', () => ({ ...newAthlete(), sex: 'other' }), 400],
  ['membership_athlete_fk', 'membership', () => ({ ...newStay(), athlete_id: randomUUID(), ...tomorrow }), 404],
  ['membership_no_overlap', 'membership', () => ({ ...newStay(), ...tomorrow }), 409],
  ['membership_order', 'membership', () => ({ ...newStay(), ...backwards }), 422],
  ['membership_squad_fk', 'membership', () => ({ ...newStay(), squad_id: randomUUID(), ...longAgo }), 404],
  ['zone_period_athlete_fk', 'zone_period', () => ({ ...newZone(), athlete_id: randomUUID(), ...longAgo }), 404],
  [
    'zone_period_no_overlap',
    'zone_period',
    () => ({ ...newZone(), valid_from: '2026-01-10', valid_to: '2026-01-11' }),
    409,
  ],
  ['zone_period_order', 'zone_period', () => ({ ...newZone(), ...backwards }), 422],
];
const tomorrow = { valid_from: '2026-03-03' };
const longAgo = { valid_from: '2019-01-01', valid_to: '2019-01-02' };

describe('a broken constraint', () => {
  test.each(broken)('%s', async (constraint, table, row, status) => {
    await expectRefused(db.insert(table, row()), constraint, status);
  });

  test('none of these tables is forgotten', async () => {
    const all = await db.constraintsOf(tables);
    // The club is never the sender's to choose, nor is the hash of a token.
    const named = all.filter((name) => !name.endsWith('_club_fk') && name !== 'access_token_token_hash_key');
    expect(broken.map(([constraint]) => constraint).toSorted()).toEqual(named);
  });
});
