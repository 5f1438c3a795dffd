import { afterAll, beforeAll, beforeEach, expect, test } from '@jest/globals';
import pg from 'pg';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';

interface Line {
  level: number;
  msg: string;
  req?: Record<string, unknown>;
  res?: Record<string, unknown>;
  code?: string;
  correlationId?: string;
  err?: { message: string };
}

let lines: Line[] = [];
let text = '';
let app: TestApp;
let club: TestClub;
beforeAll(async () => {
  const logTo = {
    write: (line: string) => {
      text += line;
      lines.push(JSON.parse(line) as Line);
    },
  };
  app = await startTestApp({ logTo });
  club = await app.newClub();
});
afterAll(async () => app?.close());
beforeEach(() => {
  lines = [];
});

const token = () => club.adminToken;
const about = (id: string) => lines.filter((line) => line.req?.id === id || line.correlationId === id);
const id = 'request-0001';

test('of a request are logged its id, method, path and status, and nothing it carries', async () => {
  await app.api('GET', '/v1/athletes?squadId=private-query', { token: token(), headers: { 'x-request-id': id } });
  const done = about(id).filter(({ res }) => res !== undefined);
  expect(done.map(({ req, res }) => [req, res])).toEqual([
    [{ id, method: 'GET', path: '/v1/athletes' }, { status: 400 }],
  ]);
});

test('neither tokens nor bodies are ever in the log', async () => {
  const body = { name: 'Private Name', email: 'private@example.org', roles: [], surprise: 'private-field' };
  await app.api('POST', '/v1/people', { token: token(), body });
  await app.api('POST', '/v1/people', { token: token(), body: { name: 'Private Name', email: 'private@example.org' } });
  await app.api('POST', '/v1/people', { token: token(), body: { name: 'Private Name', email: 'private@example.org' } });
  await app.api('POST', '/v1/clubs', { token: 'wrong-operator-key-of-some-length', body: {} });
  expect(lines.filter(({ res }) => res !== undefined).length).toBe(4);
  expect(text).not.toMatch(/private/i);
  for (const secret of [token(), token().split('.')[2]!, 'wrong-operator-key', 'Bearer']) {
    expect(text.includes(secret)).toBe(false);
  }
});

test('a refusal is one line at its level, under the id the client was given', async () => {
  const answer = await app.api('GET', '/v1/squads/9', { token: token() });
  const correlationId = answer.body.correlationId as string;
  const told = lines.filter(({ code }) => code !== undefined);
  expect(told.map((line) => [line.level, line.code, line.correlationId])).toEqual([
    [30, 'invalid-input', correlationId],
  ]);
});

test('a database error is one error line that repeats neither statement nor values', async () => {
  const owner = new pg.Client({ connectionString: app.db.ownerUrl });
  await owner.connect();
  await owner.query('alter table squad rename column zone to zone_away');
  const body = { name: 'Confidential Eight', zone: 'UTC' };
  const answer = await app.api('POST', '/v1/squads', { token: token(), body });
  await owner.query('alter table squad rename column zone_away to zone');
  await owner.end();
  expect(answer.status).toBe(500);
  const told = lines.filter(({ code }) => code !== undefined);
  expect(told.map((line) => [line.level, line.code, line.err?.message])).toEqual([[50, 'internal', 'database error']]);
  expect(text).not.toMatch(/Confidential|insert into/i);
});
