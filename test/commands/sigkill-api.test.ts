import { afterAll, beforeAll, expect, it } from '@jest/globals';
import { randomInt, randomUUID } from 'node:crypto';
import { pathToFileURL } from 'node:url';
import pg from 'pg';
import { ServiceProcess } from '../../src/commands/start/service-process.ts';
import { createTestDatabase } from '../support/database.ts';
import type { TestDatabase } from '../support/database.ts';
import { built, pause } from './support/command.ts';

const SESSIONS = 200;
const KILLS = 20;
const SENDERS = 4;
const operatorKey = 'operator-key-of-this-test-only';

let database: TestDatabase;
const started: ServiceProcess[] = [];

beforeAll(async () => {
  database = await createTestDatabase();
});

afterAll(async () => {
  await Promise.all(started.map((api) => api.stop()));
  await database.drop();
});

/** An API in a process of its own, on a free port. */
async function startApi(): Promise<{ api: ServiceProcess; url: string }> {
  const api = new ServiceProcess('API', pathToFileURL(built('src/main.js')), {
    PATH: process.env.PATH,
    TZ: 'UTC',
    PORT: '0',
    LOG_LEVEL: 'fatal',
    DATABASE_APP_URL: database.appUrl,
    LOADWEIR_OPERATOR_KEY: operatorKey,
  });
  started.push(api);
  const { url } = await api.ready();
  return { api, url: url! };
}

async function post(url: string, token: string, path: string, body: object, key: string = randomUUID()) {
  const response = await fetch(`${url}${path}`, {
    method: 'POST',
    headers: { authorization: `Bearer ${token}`, 'content-type': 'application/json', 'idempotency-key': key },
    body: JSON.stringify(body),
  });
  return { status: response.status, body: (await response.json()) as Record<string, unknown> };
}

it('keeps every session it said yes to, once, and no other, through twenty kills at random moments', async () => {
  let current = await startApi();
  // The next ones start while the present one works, so that no kill waits for a start.
  const standby = [startApi(), startApi()];
  const { athleteId, token } = await setUp(current.url);

  const acknowledged = new Map<string, string>();
  let unanswered = 0;
  let released = 0;
  let begun = 0;
  const send = async (): Promise<void> => {
    while (begun < SESSIONS) {
      if (begun >= released) {
        await pause(10);
        continue;
      }
      const number = (begun += 1);
      const externalId = `session-${number}`;
      for (;;) {
        const { url } = current;
        const path = `/v1/athletes/${athleteId}/sessions`;
        const answer = await post(url, token, path, session(number), externalId).catch(() => null);
        if (answer !== null) {
          expect([answer.status, answer.body]).toEqual([201, answer.body]);
          acknowledged.set(externalId, answer.body.id as string);
          break;
        }
        // No answer: it may be stored or not. The same request with the same key goes to the next process.
        unanswered += 1;
        while (current.url === url) await pause(5);
      }
    }
  };
  const sending = Promise.all(Array.from({ length: SENDERS }, send));
  for (let kill = 1; kill <= KILLS; kill += 1) {
    const next = await standby.shift()!;
    if (kill + standby.length < KILLS) standby.push(startApi());
    released = (SESSIONS / (KILLS + 1)) * kill;
    await pause(randomInt(1, 60));
    current.api.kill();
    current = next;
  }
  released = SESSIONS;
  await sending;

  expect(unanswered).toBeGreaterThan(0);
  expect(acknowledged.size).toBe(SESSIONS);
  const ids = [...acknowledged.values()].sort();
  const stored = await counts();
  expect(stored.sessions).toEqual(ids);
  expect(stored.weights).toEqual(ids);
  expect(stored.daily).toBe(SESSIONS);
  expect(stored.minutes).toBe(SESSIONS * 30);
  const fresh = await fetch(`${current.url}/v1/sessions/${ids[0]}`, { headers: { authorization: `Bearer ${token}` } });
  expect(fresh.status).toBe(200);
}, 240_000);

/** Three sessions a day, from a day on that lies before the present. */
function session(number: number): object {
  const startedAt = new Date(Date.UTC(2024, 0, 5 + Math.floor(number / 3), 6 + 4 * (number % 3))).toISOString();
  return { startedAt, durationMin: 30, modality: 'running', rating: 4, externalId: `session-${number}` };
}

async function setUp(url: string): Promise<{ athleteId: string; token: string }> {
  const made = async (token: string, path: string, body: object) => {
    const answer = await post(url, token, path, body);
    expect([path, answer.status, answer.body]).toEqual([path, 201, answer.body]);
    return answer.body as { id: string; secret: string; token: { secret: string } };
  };
  const admin = { name: 'Ada', email: 'ada@example.org' };
  const { token: first } = await made(operatorKey, '/v1/clubs', { name: 'Club', admin });
  const squad = await made(first.secret, '/v1/squads', { name: 'Runners', zone: 'UTC' });
  const person = { name: 'Staff', email: 'staff@example.org', roles: [{ role: 'staff' }] };
  const { id } = await made(first.secret, '/v1/people', person);
  const { secret } = await made(first.secret, `/v1/people/${id}/tokens`, { label: 'test', validDays: 1 });
  const athlete = { name: 'Alex', squadId: squad.id, memberFrom: '2024-01-01' };
  return { athleteId: (await made(first.secret, '/v1/athletes', athlete)).id, token: secret };
}

async function counts() {
  const client = new pg.Client({ connectionString: database.ownerUrl });
  await client.connect();
  try {
    const column = async (text: string) => (await client.query<{ v: string }>(text)).rows.map(({ v }) => v);
    const [daily] = await column('select sum(sessions)::int as v from daily_total');
    const [minutes] = await column('select sum(minutes)::int as v from daily_total');
    return {
      sessions: await column('select id as v from training_session order by 1'),
      weights: await column('select session_id as v from session_weight order by 1'),
      daily: Number(daily),
      minutes: Number(minutes),
    };
  } finally {
    await client.end();
  }
}
