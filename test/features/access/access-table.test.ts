import { expect, test } from '@jest/globals';
import { accessTable, actions } from '../../../src/features/access/access-table.ts';
import type { Action } from '../../../src/features/access/access-table.ts';
import { roles } from '../../../src/features/access/access.types.ts';

const whoMay = (action: Action) =>
  accessTable
    .filter((row) => row.action === action)
    .map(({ role }) => role)
    .toSorted();

test('health is for the athlete and those who treat them', () => {
  expect(whoMay('health.read')).toEqual(['athlete', 'medic']);
  expect(whoMay('health.write')).toEqual(['athlete', 'medic']);
});

test('an athlete reaches own data only', () => {
  const scopes = new Set(accessTable.filter(({ role }) => role === 'athlete').map(({ scope }) => scope));
  expect([...scopes]).toEqual(['own']);
});

test('people, roles and tokens are the admin’s', () => {
  const ofPeople = actions.filter((action) => /^(people|roles|tokens)\./.test(action));
  expect(ofPeople.length).toBe(5);
  for (const action of ofPeople) expect(whoMay(action)).toEqual(['admin']);
});

test('a coach changes nothing', () => {
  const changes = accessTable.filter(({ role, action }) => role === 'coach' && !action.endsWith('.read'));
  expect(changes).toEqual([]);
});

test('an admin reads, but changes no training', () => {
  const changes = accessTable.filter(
    ({ role, action }) => role === 'admin' && /\.(write|enter|close|import)$/.test(action),
  );
  expect(changes.map(({ action }) => action).toSorted()).toEqual([
    'athletes.write',
    'people.write',
    'roles.write',
    'squads.write',
    'tokens.write',
  ]);
});

test('every row is said once, and every action but the two without a role belongs to someone', () => {
  const keys = accessTable.map(({ role, action }) => `${role} ${action}`);
  expect(new Set(keys).size).toBe(keys.length);
  expect(actions.filter((action) => whoMay(action).length === 0)).toEqual(['club.create', 'self.read']);
  expect(new Set(accessTable.map(({ role }) => role))).toEqual(new Set(roles));
});
