import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { startTestApp } from '../support/app.ts';
import type { TestApp } from '../support/app.ts';
import { filled, routesOf } from '../support/routes.ts';

// Values only the athlete and a medic may see are planted; then every route that can be read is read by everybody who
// looks after the athlete. A new route is walked without being named here, unless it needs a query. A workbook is compressed: its own tests read it.
const planted = {
  sleepHours: 3.217,
  restingHeartRateBpm: 53.193,
  rmssdMs: 41.779,
  bodyMassKg: 71.371,
  reason: 'Planted words about a knee',
  cause: 'complaint',
  changeReason: 'Planted words about a mistake',
};
const span = '?from=2026-02-01&to=2026-03-01';
/** Routes that answer 400 without a query. */
const queries: Readonly<Record<string, string>> = {
  '/v1/athletes/:athleteId/mornings': span,
  '/v1/squads/:squadId/days': span,
  '/v1/athletes/:athleteId/thresholds/in-force': '?date=2026-02-10&modality=rowing',
  '/v1/squads/:squadId/job-runs': '?job=weekly-report&period=2026-W09',
};

let app: TestApp;
let values: Record<string, string>;
let tokens: Record<'admin' | 'manager' | 'coach' | 'staff' | 'medic' | 'athlete', string>;

beforeAll(async () => {
  app = await startTestApp();
  const club = await app.newClub();
  const squadId = await club.squad();
  const inSquad = async (role: string) => (await club.person([{ role, squadId }])).token;
  const athlete = await club.athlete(squadId, { memberFrom: '2026-01-10', login: true });
  tokens = {
    admin: club.adminToken,
    manager: await inSquad('manager'),
    coach: await inSquad('coach'),
    staff: await inSquad('staff'),
    medic: await inSquad('medic'),
    athlete: athlete.token!,
  };
  const { athleteId } = athlete;
  const send = async (method: string, path: string, body: object, by: keyof typeof tokens, version?: string) => {
    const headers = version === undefined ? {} : { 'if-match': version };
    const answer = await app.api(method, path, { token: tokens[by], body, headers });
    if (answer.status >= 300) throw new Error(`${method} ${path}: ${answer.status} ${JSON.stringify(answer.body)}`);
    return answer.body as { id: string };
  };
  const { sleepHours, restingHeartRateBpm, rmssdMs } = planted;
  const day = '2026-02-28';
  const mornings = `/v1/athletes/${athleteId}/mornings`;
  await send('POST', mornings, { day, sleepHours, restingHeartRateBpm, rmssdMs }, 'athlete');
  const change = { sleepHours: 8, changeReason: planted.changeReason };
  await send('PATCH', `${mornings}/${day}`, change, 'athlete', '"v1"');
  const mass = { quantity: 'body-mass', value: planted.bodyMassKg, method: 'scales', validFrom: '2026-02-01' };
  await send('POST', `/v1/athletes/${athleteId}/thresholds`, { values: [mass] }, 'athlete');
  const entry = { state: 'none', cause: planted.cause, reason: planted.reason, from: '2026-02-10', to: '2026-02-12' };
  await send('POST', `/v1/athletes/${athleteId}/availability`, entry, 'medic');
  const session = { startedAt: '2026-02-28T09:00:00Z', durationMin: 60, modality: 'rowing', rating: 4 };
  const { id: sessionId } = await send('POST', `/v1/athletes/${athleteId}/sessions`, session, 'athlete');
  for (let date = 23; date <= 28; date += 1) {
    await send('POST', `/v1/squads/${squadId}/days/2026-02-${date}/closing`, {}, 'staff');
  }
  await send('POST', `/v1/squads/${squadId}/days/2026-03-01/closing`, {}, 'staff');
  const { id: reportId } = await send('POST', `/v1/squads/${squadId}/reports`, { isoWeek: '2026-W09' }, 'manager');
  values = { squadId, athleteId, sessionId, reportId, day, personId: club.adminId };
});
afterAll(async () => app?.close());

/** What each route answered that can be read: status and body as text. */
async function walk(who: keyof typeof tokens): Promise<{ path: string; status: number; text: string }[]> {
  const routes = routesOf(app.app).filter(({ method, rule }) => method === 'GET' && rule !== null);
  expect(routes.length).toBeGreaterThan(25);
  return Promise.all(
    routes.map(async ({ path }) => {
      const url = `${filled(path, values, '0198f3a0-ffff-7000-8000-00000000ffff')}${queries[path] ?? ''}`;
      const { status, body } = await app.api('GET', url, { token: tokens[who] });
      return { path, status, text: JSON.stringify(body) };
    }),
  );
}

function seen(text: string): string[] {
  return Object.entries(planted).flatMap(([name, value]) => (text.includes(String(value)) ? [name] : []));
}

describe.each(['admin', 'manager', 'coach', 'staff'] as const)('the %s', (who) => {
  test('reads no answer, no reason and no body mass anywhere', async () => {
    const answers = await walk(who);
    expect(answers.filter(({ status }) => ![200, 403, 404].includes(status))).toEqual([]);
    expect(answers.filter(({ status }) => status === 200).length).toBeGreaterThan(10);
    expect(answers.flatMap(({ path, text }) => (seen(text).length > 0 ? [[path, seen(text)]] : []))).toEqual([]);
  });
});

test.each(['medic', 'athlete'] as const)('the %s reads all that was planted, so that it can be found', async (who) => {
  const answers = await walk(who);
  expect(answers.filter(({ status }) => ![200, 403, 404].includes(status))).toEqual([]);
  expect([...new Set(answers.flatMap(({ text }) => seen(text)))].toSorted()).toEqual(Object.keys(planted).toSorted());
});
