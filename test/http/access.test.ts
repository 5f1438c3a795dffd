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

/**
 * Rows by who may inside the squad: A admin, M a manager of the club, m one of the squad, c coach, s staff, d medic, and
 * for an athlete's things a the athlete. All others do not see that it is there.
 */
const inside = 'AMmcsd';
const ofSquad = (may: string): Row => [
  ...[...inside].map((one) => (may.includes(one) ? 1 : 403)),
  ...[404, 404, 404, 404, 404],
];
const ofAthlete = (may: string): Row => [
  ...[...inside, 'a'].map((one) => (may.includes(one) ? 1 : 403)),
  ...[404, 404, 404, 404],
];

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

  'POST /v1/athletes/:athleteId/availability': ofAthlete('Mmda'),
  'GET /v1/athletes/:athleteId/availability': ofAthlete('AMmcsda'),
  'POST /v1/athletes/:athleteId/availability/:availabilityId/end': ofAthlete('Mmda'),
  'POST /v1/squads/:squadId/circumstances': ofSquad('Mmsd'),
  'GET /v1/squads/:squadId/circumstances': ofSquad('AMmcsd'),
  'POST /v1/squads/:squadId/circumstances/:circumstanceId/withdrawal': ofSquad('Mmsd'),
  'GET /v1/squads/:squadId/days': ofSquad('AMmcsd'),
  'GET /v1/squads/:squadId/days/:day': ofSquad('AMmcsd'),
  'POST /v1/squads/:squadId/days/:day/closing': ofSquad('Mms'),
  'POST /v1/squads/:squadId/days/:day/reopening': ofSquad('Mms'),
  'GET /v1/athletes/:athleteId/flags': ofAthlete('AMmcda'),
  'GET /v1/squads/:squadId/flags': ofSquad('AMmcd'),
  'POST /v1/squads/:squadId/job-runs': ofSquad('AMm'),
  'GET /v1/squads/:squadId/job-runs': ofSquad('AMm'),
  'POST /v1/athletes/:athleteId/mornings': ofAthlete('sda'),
  'GET /v1/athletes/:athleteId/mornings': ofAthlete('da'),
  'GET /v1/athletes/:athleteId/mornings/:day': ofAthlete('da'),
  'GET /v1/athletes/:athleteId/mornings/:day/history': ofAthlete('da'),
  'PATCH /v1/athletes/:athleteId/mornings/:day': ofAthlete('sda'),
  'POST /v1/athletes/:athleteId/mornings/:day/withdrawal': ofAthlete('sda'),
  'POST /v1/squads/:squadId/periods': ofSquad('Mm'),
  'GET /v1/squads/:squadId/periods': ofSquad('AMmcsd'),
  'POST /v1/squads/:squadId/reports': ofSquad('Mm'),
  'GET /v1/squads/:squadId/reports': ofSquad('AMmc'),
  'GET /v1/reports/:reportId': ofSquad('AMmc'),
  'GET /v1/reports/:reportId/workbook': ofSquad('AMmc'),
  'GET /v1/reports/:reportId/deliveries': ofSquad('AMmc'),
  'GET /v1/athletes/:athleteId/series': ofAthlete('AMmcda'),
  'GET /v1/squads/:squadId/overview': ofSquad('AMmcd'),
  'POST /v1/squads/:squadId/session-imports': ofSquad('Mms'),
  'POST /v1/athletes/:athleteId/sessions': ofAthlete('Mmsa'),
  'POST /v1/squads/:squadId/sessions': ofSquad('Mms'),
  'GET /v1/athletes/:athleteId/sessions': ofAthlete('AMmcsda'),
  'GET /v1/sessions/:sessionId': ofAthlete('AMmcsda'),
  'GET /v1/sessions/:sessionId/history': ofAthlete('AMmcsda'),
  'PUT /v1/sessions/:sessionId': ofAthlete('Mmsa'),
  'POST /v1/sessions/:sessionId/withdrawal': ofAthlete('Mmsa'),
  'POST /v1/squads/:squadId/test-definitions': ofSquad('Mm'),
  'GET /v1/squads/:squadId/test-definitions': ofSquad('AMmcsd'),
  'POST /v1/squads/:squadId/test-definitions/:definitionId/withdrawal': ofSquad('Mm'),
  'POST /v1/athletes/:athleteId/test-results': ofAthlete('Mms'),
  'GET /v1/athletes/:athleteId/test-results': ofAthlete('AMmcsda'),
  'POST /v1/athletes/:athleteId/test-results/:resultId/correction': ofAthlete('Mms'),
  'POST /v1/athletes/:athleteId/test-results/:resultId/withdrawal': ofAthlete('Mms'),
  'POST /v1/athletes/:athleteId/thresholds': ofAthlete('Mmda'),
  'GET /v1/athletes/:athleteId/thresholds': ofAthlete('AMmda'),
  'GET /v1/athletes/:athleteId/thresholds/in-force': ofAthlete('AMmda'),
  'POST /v1/athletes/:athleteId/thresholds/:valueId/correction': ofAthlete('Mmda'),
  'POST /v1/athletes/:athleteId/thresholds/:valueId/withdrawal': ofAthlete('Mmda'),
};
/** Without a person, and one that needs a task of more than 500 sessions: test/http/reweighing.test.ts. */
const elsewhere = ['POST /v1/clubs', 'GET /health/live', 'GET /health/ready', 'GET /v1/reweighings/:taskId'];

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
  const made = async (path: string, body: object) =>
    ((await app.api('POST', path, { token: tokens.manager, body })).body as { id: string }).id;
  const run = { startedAt: '2026-02-20T10:00:00Z', durationMin: 30, modality: 'running', rating: 3 };
  values.sessionId = await made(`/v1/athletes/${athlete.athleteId}/sessions`, run);
  values.reportId = await made(`/v1/squads/${squadA}/reports`, { isoWeek: '2026-W08' });
});
afterAll(async () => app?.close());

const cells = Object.entries(matrix).flatMap(([route, row]) =>
  askers.map((asker, i) => [route, asker, row[i]!] as const),
);

test.each(cells)('%s by %s', async (route, asker, expected) => {
  const [method, path] = route.split(' ') as [string, string];
  const wrong = path.endsWith('session-imports') ? 'no sheet' : { unknownField: true };
  const body = ['POST', 'PUT', 'PATCH'].includes(method) ? wrong : undefined;
  const answer = await app.api(method, filled(path, values, 'no-id'), { token: tokens[asker], body });
  // Past the rights, a GET may still miss its query, and anything may be refused for its input.
  if (expected === 1) expect(method === 'GET' ? [200, 400] : [400, 415, 428]).toContain(answer.status);
  else expect(answer.status).toBe(expected);
});

test('one’s own person and things in sight are 403, not 404', async () => {
  const own = await app.api('GET', '/v1/me', { token: tokens.coachA });
  const { id } = own.body.person as { id: string };
  expect((await app.api('GET', `/v1/people/${id}`, { token: tokens.coachA })).status).toBe(403);
});

describe('every route of the application', () => {
  test('the matrix above leaves none out', () => {
    const names = routesOf(app.app).map(({ method, path }) => `${method} ${path}`);
    expect(names.toSorted()).toEqual([...Object.keys(matrix), ...elsewhere].toSorted());
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
