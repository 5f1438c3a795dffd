import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { startTestApp } from '../support/app.ts';
import type { TestApp } from '../support/app.ts';
import { filled, routesOf } from '../support/routes.ts';

// Who may do what, route by route. Rights are judged before the input: a body or a child's id that no schema accepts
// is answered 400 to those who may, and 403 or 404 to those who may not, so that nothing is changed here.
const askers = [
  ...(['admin', 'manager', 'managerA', 'coachA', 'staffA', 'medicA'] as const),
  ...(['athlete', 'otherAthlete', 'managerB', 'nobody', 'otherClub'] as const),
];
type Asker = (typeof askers)[number];

/** Statuses in the order of the askers; 1: may. */
type Row = readonly number[];
const adminOnly: Row = [1, 403, 403, 403, 403, 403, 403, 403, 403, 403, 1];
const person: Row = [1, 404, 404, 404, 404, 404, 404, 404, 404, 404, 404];
const athleteRead: Row = [1, 1, 1, 1, 1, 1, 1, 404, 404, 404, 404];
const athleteWrite: Row = [1, 1, 1, 403, 403, 403, 403, 404, 404, 404, 404];

const matrix: Record<string, Row> = {
  'POST /v1/people': adminOnly,
  'GET /v1/people': adminOnly,
  'GET /v1/people/:personId': person,
  'POST /v1/people/:personId/roles': person,
  'DELETE /v1/people/:personId/roles/:roleId': person,
  'POST /v1/people/:personId/tokens': person,
  'GET /v1/people/:personId/tokens': person,
  'DELETE /v1/people/:personId/tokens/:tokenId': person,
  'POST /v1/squads': [1, 1, 403, 403, 403, 403, 403, 403, 403, 403, 1],
  'GET /v1/squads': [1, 1, 1, 1, 1, 1, 403, 403, 1, 403, 1],
  'GET /v1/squads/:squadId': [1, 1, 1, 1, 1, 1, 404, 404, 404, 404, 404],
  'POST /v1/squads/:squadId/policies': [403, 1, 1, 403, 403, 403, 404, 404, 404, 404, 404],
  'GET /v1/squads/:squadId/policies': [1, 1, 1, 1, 403, 403, 404, 404, 404, 404, 404],
  'POST /v1/athletes': [1, 1, 1, 403, 403, 403, 403, 403, 1, 403, 1],
  'GET /v1/athletes': [1, 1, 1, 1, 1, 1, 403, 403, 1, 403, 1],
  'GET /v1/athletes/:athleteId': athleteRead,
  'GET /v1/athletes/:athleteId/memberships': athleteRead,
  'POST /v1/athletes/:athleteId/memberships': athleteWrite,
  'POST /v1/athletes/:athleteId/memberships/:membershipId/end': athleteWrite,
  'GET /v1/athletes/:athleteId/zone-periods': athleteRead,
  'POST /v1/athletes/:athleteId/zone-periods': athleteWrite,
  'GET /v1/me': [1, 1, 1, 1, 1, 1, 1, 1, 1, 1, 1],
};
const mine = /^(Athletes|Clubs|Me|People|Policies|Squads|Tokens|Health)Controller\./;
const withoutPerson = ['POST /v1/clubs', 'GET /health/live', 'GET /health/ready'];

let app: TestApp;
let tokens: Record<Asker, string>;
let values: Record<string, string>;

beforeAll(async () => {
  app = await startTestApp();
  const club = await app.newClub();
  const [squadA, squadB] = [await club.squad(), await club.squad()];
  const athlete = await club.athlete(squadA, { login: true });
  const otherAthlete = await club.athlete(squadA, { login: true });
  const inA = async (role: string) => (await club.person([{ role, squadId: squadA }])).token;
  tokens = {
    admin: club.adminToken,
    manager: (await club.person([{ role: 'manager' }])).token,
    managerA: await inA('manager'),
    coachA: await inA('coach'),
    staffA: await inA('staff'),
    medicA: await inA('medic'),
    athlete: athlete.token!,
    otherAthlete: otherAthlete.token!,
    managerB: (await club.person([{ role: 'manager', squadId: squadB }])).token,
    nobody: (await club.person([])).token,
    otherClub: (await app.newClub()).adminToken,
  };
  values = { squadId: squadA, athleteId: athlete.athleteId, personId: club.adminId };
});
afterAll(async () => app?.close());

const cells = Object.entries(matrix).flatMap(([route, row]) =>
  askers.map((asker, i) => [route, asker, row[i]!] as const),
);

test.each(cells)('%s by %s', async (route, asker, expected) => {
  const [method, path] = route.split(' ') as [string, string];
  const body = method === 'POST' ? { unknownField: true } : undefined;
  const answer = await app.api(method, filled(path, values, 'no-id'), { token: tokens[asker], body });
  const hasOpenInput = method !== 'GET';
  expect(answer.status).toBe(expected === 1 ? (hasOpenInput ? 400 : 200) : expected);
});

test('one’s own person and things in sight are 403, not 404', async () => {
  const own = await app.api('GET', '/v1/me', { token: tokens.coachA });
  const { id } = own.body.person as { id: string };
  expect((await app.api('GET', `/v1/people/${id}`, { token: tokens.coachA })).status).toBe(403);
});

describe('every route of the application', () => {
  test('the matrix above leaves none of its features out', () => {
    const names = routesOf(app.app).flatMap(({ name, method, path }) => (mine.test(name) ? [`${method} ${path}`] : []));
    expect(names.toSorted()).toEqual([...Object.keys(matrix), ...withoutPerson].toSorted());
  });

  test('has an access rule, and a schema for everything it takes', () => {
    const routes = routesOf(app.app);
    expect(routes.length).toBeGreaterThan(20);
    expect(routes.filter(({ rule }) => rule === undefined)).toEqual([]);
    expect(routes.filter(({ unchecked }) => unchecked.length > 0)).toEqual([]);
    const open = routes.filter(({ rule }) => rule === null).map(({ path }) => path);
    expect(open.toSorted()).toEqual(['/health/live', '/health/ready']);
  });

  test('answers 401 without a token and with one nobody has', async () => {
    const closed = routesOf(app.app).filter(({ rule }) => rule !== null);
    for (const { method, path } of closed) {
      for (const token of [undefined, 'nonsense', `lw.${'A'.repeat(22)}.${'A'.repeat(43)}`]) {
        const answer = await app.api(method, filled(path, {}, randomUUID()), { token });
        expect({ path, status: answer.status }).toEqual({ path, status: 401 });
        expect(answer.headers.get('www-authenticate')).toBe('Bearer');
      }
    }
  });

  test('with a target answers 404 to the admin of another club', async () => {
    const targeted = routesOf(app.app).filter(({ rule }) => rule && 'param' in rule.target);
    expect(targeted.length).toBeGreaterThan(10);
    for (const { method, path } of targeted) {
      const answer = await app.api(method, filled(path, values, randomUUID()), { token: tokens.otherClub });
      expect({ method, path, status: answer.status }).toEqual({ method, path, status: 404 });
    }
  });
});
