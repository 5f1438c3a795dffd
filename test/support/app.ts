import { randomUUID } from 'node:crypto';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import type { DestinationStream } from 'pino';
import { runApi } from '../../src/http-app.ts';
import type { FixedClock } from '../../src/platform/clock.ts';
import { readEnv } from '../../src/platform/env.ts';
import { fixedClock } from './clock.ts';
import { createTestDatabase } from './database.ts';
import type { TestDatabase } from './database.ts';

export const operatorKey = 'test operator key, 32 characters'.replaceAll(' ', '-');

export interface ApiOptions {
  token?: string | undefined;
  /** An object is sent as JSON, a string as it is with the content type in the headers (default text/csv). */
  body?: unknown;
  headers?: Record<string, string>;
}

export interface ApiAnswer {
  status: number;
  /** Parsed JSON, or the text of anything else. */
  // eslint-disable-next-line @typescript-eslint/no-explicit-any -- tests look at answers field by field
  body: any;
  headers: Headers;
}

export interface TestClub {
  clubId: string;
  adminId: string;
  adminToken: string;
  /** A person with these roles and a token for them. */
  person: (
    roles: readonly { role: string; squadId?: string }[],
    name?: string,
  ) => Promise<{ personId: string; token: string }>;
  squad: (name?: string, zone?: string) => Promise<string>;
  /** An athlete of the squad; with `login` also a person with the role athlete. */
  athlete: (
    squadId: string,
    options?: { name?: string; memberFrom?: string; sex?: string; login?: boolean },
  ) => Promise<{ athleteId: string; token?: string }>;
}

export interface TestApp {
  url: string;
  app: NestFastifyApplication;
  clock: FixedClock;
  db: TestDatabase;
  api: (method: string, path: string, options?: ApiOptions) => Promise<ApiAnswer>;
  newClub: (name?: string) => Promise<TestClub>;
  close: () => Promise<void>;
}

/** The real API on a free port, against a database of its own. */
export async function startTestApp(options: { clock?: FixedClock; logTo?: DestinationStream } = {}): Promise<TestApp> {
  const db = await createTestDatabase();
  const clock = options.clock ?? fixedClock();
  const env = readEnv({
    DATABASE_URL: db.ownerUrl,
    DATABASE_APP_URL: db.appUrl,
    PORT: '0',
    LOG_LEVEL: options.logTo === undefined ? (process.env.TEST_LOG_LEVEL ?? 'silent') : 'debug',
    LOADWEIR_MODE: 'test',
    LOADWEIR_OPERATOR_KEY: operatorKey,
  });
  const { url, app, close } = await runApi(env, clock, options.logTo).catch(async (error: unknown) => {
    await db.drop();
    throw error;
  });
  const api = (method: string, path: string, given: ApiOptions = {}) => call(url, method, path, given);
  return {
    url,
    app,
    clock,
    db,
    api,
    newClub: (name) => newClub(api, name ?? `Club ${randomUUID()}`),
    close: async () => {
      await close();
      await db.drop();
    },
  };
}

async function call(base: string, method: string, path: string, given: ApiOptions): Promise<ApiAnswer> {
  const { token, body, headers } = given;
  const text = typeof body === 'string' || body === undefined ? body : JSON.stringify(body);
  const type = typeof body === 'string' ? 'text/csv' : 'application/json';
  const response = await fetch(`${base}${path}`, {
    method,
    headers: {
      ...(token === undefined ? {} : { authorization: `Bearer ${token}` }),
      ...(text === undefined ? {} : { 'content-type': type }),
      ...headers,
    },
    ...(text === undefined ? {} : { body: text }),
  });
  const isJson = /json/.test(response.headers.get('content-type') ?? '');
  const answer = await response.text();
  return { status: response.status, body: isJson ? JSON.parse(answer) : answer, headers: response.headers };
}

type Api = TestApp['api'];

async function made(api: Api, path: string, token: string, body: object): Promise<Record<string, string>> {
  const answer = await api('POST', path, { token, body });
  if (answer.status !== 201) throw new Error(`POST ${path}: ${answer.status} ${JSON.stringify(answer.body)}`);
  return answer.body as Record<string, string>;
}

async function newClub(api: Api, name: string): Promise<TestClub> {
  const mail = () => `${randomUUID()}@example.org`;
  const admin = { name: 'Ada Admin', email: mail() };
  const answer = await api('POST', '/v1/clubs', { token: operatorKey, body: { name, admin } });
  if (answer.status !== 201) throw new Error(`POST /v1/clubs: ${answer.status} ${JSON.stringify(answer.body)}`);
  const { club, token } = answer.body as { club: { id: string }; token: { secret: string } };
  const adminId = (answer.body as { admin: { personId: string } }).admin.personId;
  const adminToken = token.secret;
  const person: TestClub['person'] = async (roles, personName = 'Pat Person') => {
    const { id } = await made(api, '/v1/people', adminToken, { name: personName, email: mail(), roles });
    const issued = await made(api, `/v1/people/${id!}/tokens`, adminToken, { label: 'test', validDays: 400 });
    return { personId: id!, token: issued.secret! };
  };
  return {
    clubId: club.id,
    adminId,
    adminToken,
    person,
    squad: async (squadName = `Squad ${randomUUID().slice(0, 8)}`, zone = 'Europe/Prague') =>
      (await made(api, '/v1/squads', adminToken, { name: squadName, zone })).id!,
    athlete: async (squadId, { name: athleteName = 'Alex Athlete', memberFrom = '2025-01-01', sex, login } = {}) => {
      const own = login ? await person([{ role: 'athlete' }], athleteName) : undefined;
      const { id } = await made(api, '/v1/athletes', adminToken, {
        name: athleteName,
        squadId,
        memberFrom,
        ...(sex === undefined ? {} : { sex }),
        ...(own === undefined ? {} : { personId: own.personId }),
      });
      return { athleteId: id!, ...(own === undefined ? {} : { token: own.token }) };
    },
  };
}
