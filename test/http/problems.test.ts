import { once } from 'node:events';
import { request as httpRequest, Agent } from 'node:http';
import { connect } from 'node:net';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import pg from 'pg';
import { startTestApp } from '../support/app.ts';
import type { ApiAnswer, TestApp, TestClub } from '../support/app.ts';
import { routesOf } from '../support/routes.ts';

let app: TestApp;
let club: TestClub;
beforeAll(async () => {
  app = await startTestApp();
  club = await app.newClub();
});
afterAll(async () => app?.close());

/** The body as it is, with any content type. */
const send = (method: string, path: string, text: string, type: string): Promise<ApiAnswer> =>
  app.api(method, path, { token: club.adminToken, body: text, headers: { 'content-type': type } });

function expectProblem(answer: ApiAnswer, status: number, code: string): void {
  expect([answer.status, answer.body.type]).toEqual([status, `urn:loadweir:problem:${code}`]);
  expect(answer.headers.get('content-type')).toMatch(/^application\/problem\+json/);
  expect(answer.body.status).toBe(status);
  expect(answer.body.title).toMatch(/\w/);
  expect(answer.body.detail).toMatch(/\w/);
  expect(answer.body.correlationId).toBe(answer.headers.get('x-request-id'));
  expect(JSON.stringify(answer.body)).not.toMatch(/ at |\.ts:|node_modules|prisma|select |FST_|SyntaxError/i);
}

describe('a body that cannot be read', () => {
  test.each([
    ['malformed JSON', '{"name": ', 'application/json', 400, 'malformed-request'],
    ['no JSON at all', '', 'application/json', 400, 'malformed-request'],
    ['a prototype in it', '{"__proto__": {"x": 1}}', 'application/json', 400, 'malformed-request'],
    ['a list', '[]', 'application/json', 400, 'invalid-input'],
    ['plain text', 'name=x', 'text/plain', 415, 'unsupported-media-type'],
    ['a form', 'name=x', 'application/x-www-form-urlencoded', 415, 'unsupported-media-type'],
    ['CSV where JSON is taken', 'name\nx', 'text/csv', 415, 'unsupported-media-type'],
  ])('%s', async (_, text, type, status, code) => {
    expectProblem(await send('POST', '/v1/people', text, type), status, code);
  });

  test('20 MB is too large, and one byte above 1 MiB too', async () => {
    const padded = (bytes: number) => JSON.stringify({ name: 'x'.repeat(bytes - 11) });
    expectProblem(await send('POST', '/v1/people', padded(1024 * 1024 + 1), 'application/json'), 413, 'too-large');
    expectProblem(await send('POST', '/v1/people', padded(1024 * 1024), 'application/json'), 400, 'invalid-input');
    const big = await send('POST', '/v1/people', padded(20_000_000), 'application/json').catch(() => null);
    // The server lets go before all of it was sent; the client may see that instead of the answer.
    if (big !== null) expectProblem(big, 413, 'too-large');
    expect((await app.api('GET', '/health/live')).status).toBe(200);
  });
});

describe('a path', () => {
  test('nobody serves is 404', async () => {
    expectProblem(await app.api('GET', '/v1/nothing'), 404, 'not-found');
    expectProblem(await app.api('GET', '/%ZZ'), 400, 'malformed-request');
  });

  test('asked with another method is 405 and names the ones there are', async () => {
    const answer = await app.api('PATCH', `/v1/people/${club.adminId}`);
    expectProblem(answer, 405, 'method-not-allowed');
    expect(answer.headers.get('allow')).toBe('GET, HEAD');
  });

  test('with something else than an id is 400', async () => {
    const answer = await app.api('GET', '/v1/squads/nine', { token: club.adminToken });
    expectProblem(answer, 400, 'invalid-input');
    expect(answer.body.errors).toEqual([{ field: 'squadId', value: 'nine', allowed: 'a UUID' }]);
  });
});

describe('input that breaks its schema', () => {
  const post = (path: string, body: unknown) => app.api('POST', path, { token: club.adminToken, body });

  test('names every field, what was given and what is allowed', async () => {
    const body = { name: ' ', zone: 'Mars/Olympus', colour: 'red', token: 'abc' };
    const answer = await post('/v1/squads', body);
    expectProblem(answer, 400, 'invalid-input');
    expect(answer.body.errors).toEqual([
      { field: 'name', value: '', allowed: 'text of 1 to 120 characters' },
      { field: 'zone', value: 'Mars/Olympus', allowed: 'an IANA time zone like Europe/Prague' },
      { field: 'colour', allowed: 'nothing: the field is unknown' },
      { field: 'token', allowed: 'nothing: the field is unknown' },
    ]);
  });

  test('missing altogether names what is required', async () => {
    const answer = await post('/v1/people', undefined);
    expectProblem(answer, 400, 'invalid-input');
    const { errors } = answer.body as { errors: { field: string }[] };
    expect(errors.map(({ field }) => field)).toEqual(['name', 'email']);
  });

  test('inside a list names its place', async () => {
    const person = { name: 'Pat', email: 'pat@example.org', roles: [{ role: 'coach' }, { role: 'king' }] };
    const { errors } = (await post('/v1/people', person)).body;
    expect(errors).toEqual([
      { field: 'roles[1].role', value: 'king', allowed: 'one of admin, manager, coach, staff, medic, athlete' },
    ]);
  });

  test('an unknown query parameter is refused too', async () => {
    const answer = await app.api('GET', '/v1/athletes?sqadId=1', { token: club.adminToken });
    expect(answer.body.errors).toEqual([{ field: 'sqadId', allowed: 'nothing: the field is unknown' }]);
  });

  test('a long value is cut', async () => {
    const answer = await post('/v1/squads', { name: 'A', zone: 'x'.repeat(5000) });
    expect(answer.body.errors[0].value).toBe(`${'x'.repeat(100)}…`);
  });
});

describe('the correlation id', () => {
  test('is the client’s own where it is harmless', async () => {
    const own = await app.api('GET', '/v1/nothing', { headers: { 'x-request-id': 'client-id-0001' } });
    expect(own.body.correlationId).toBe('client-id-0001');
    const odd = await app.api('GET', '/v1/nothing', { headers: { 'x-request-id': 'a b<script>' } });
    expect(odd.body.correlationId).toMatch(/^[0-9a-f-]{36}$/);
  });
});

test('a defect below says nothing about itself', async () => {
  const owner = new pg.Client({ connectionString: app.db.ownerUrl });
  await owner.connect();
  await owner.query('alter table person rename column email to mail');
  const answer = await app.api('GET', '/v1/people', { token: club.adminToken });
  await owner.query('alter table person rename column mail to email');
  await owner.end();
  expectProblem(answer, 500, 'internal');
  expect(JSON.stringify(answer.body)).not.toMatch(/person\.|column|email/i);
  expect((await app.api('GET', '/v1/people', { token: club.adminToken })).status).toBe(200);
});

describe('the description', () => {
  test('loads nothing from elsewhere', async () => {
    const page = await app.api('GET', '/docs');
    expect(page.status).toBe(200);
    const html = String(page.body);
    const addresses = [...html.matchAll(/(?:src|href)="([^"]+)"/g)].map((match) => match[1]!);
    expect(addresses.length).toBeGreaterThan(4);
    for (const address of addresses) {
      expect(address).toMatch(/^\.\/docs\//);
      const asset = await app.api('GET', address.slice(1));
      expect([address, asset.status]).toEqual([address, 200]);
    }
    expect(html.replaceAll(/xmlns(:xlink)?="[^"]*"/g, '')).not.toMatch(/https?:/);
    expect(String((await app.api('GET', '/docs/swagger-ui-init.js')).body)).not.toMatch(/https?:\/\//);
    const policy = page.headers.get('content-security-policy')!;
    expect(policy).toContain("default-src 'self'");
    expect(policy).not.toMatch(/https?:|script-src[^;]*unsafe/);
    expect(html).not.toMatch(/<script(?![^>]* src=)/);
  });

  test('is OpenAPI 3.0.3 and holds every route with its body', async () => {
    const { body } = await app.api('GET', '/docs/json');
    expect(body.openapi).toBe('3.0.3');
    const { post } = body.paths['/v1/squads'];
    expect(post.requestBody.content['application/json'].schema.required).toEqual(['name', 'zone']);
    expect(post.responses['201'].content['application/json'].schema.properties.id).toBeDefined();
    const served = routesOf(app.app).map(({ path }) => path.replace(/:(\w+)/g, '{$1}'));
    expect(new Set(Object.keys(body.paths as object))).toEqual(new Set(served));
    expect(post.parameters).toEqual([expect.objectContaining({ name: 'Idempotency-Key', in: 'header' })]);
    expect(post.responses.default.content['application/problem+json']).toBeDefined();
    expect(body.paths['/v1/squads'].get.security).toEqual([{ bearer: [] }]);
    expect(Object.keys(body.paths as object)).toContain('/v1/athletes/{athleteId}/memberships/{membershipId}/end');
    const paths = body.paths as Record<string, Record<string, { summary?: string }>>;
    const silent = Object.entries(paths).flatMap(([path, operations]) =>
      Object.entries(operations).flatMap(([method, { summary }]) => (summary ? [] : [`${method} ${path}`])),
    );
    expect(silent).toEqual([]);
  });
});

test('health answers without a token; ready looks at the database', async () => {
  expect((await app.api('GET', '/health/live')).body).toEqual({ live: true });
  expect((await app.api('GET', '/health/ready')).body).toEqual({ ready: true });
  const owner = new pg.Client({ connectionString: app.db.ownerUrl });
  await owner.connect();
  await owner.query('alter table job_record rename to job_record_away');
  const answer = await app.api('GET', '/health/ready');
  await owner.query('alter table job_record_away rename to job_record');
  await owner.end();
  expectProblem(answer, 503, 'not-ready');
});

test('answers about people are not kept by caches', async () => {
  const answer = await app.api('GET', '/v1/me', { token: club.adminToken });
  expect(answer.headers.get('cache-control')).toBe('no-store');
});

test('closing answers what is under way and lets kept connections go', async () => {
  const other = await startTestApp();
  const agent = new Agent({ keepAlive: true });
  const get = (path: string) =>
    new Promise<{ status: number; connection: string }>((done, fail) => {
      httpRequest(`${other.url}${path}`, { agent }, (response) => {
        response.resume();
        response.on('end', () =>
          done({ status: response.statusCode!, connection: String(response.headers.connection) }),
        );
      })
        .on('error', fail)
        .end();
    });
  const owner = new pg.Client({ connectionString: other.db.ownerUrl });
  await owner.connect();
  const { adminToken } = await other.newClub();
  expect(await get('/health/live')).toEqual({ status: 200, connection: 'keep-alive' });
  await owner.query('begin; lock table person in access exclusive mode');
  const underWay = other.api('GET', '/v1/people', { token: adminToken });
  // The request waits for the lock before the close begins.
  for (;;) {
    const { rows } = await owner.query<{ waiting: boolean }>(
      "select exists (select from pg_locks where not granted and relation = 'person'::regclass) as waiting",
    );
    if (rows[0]?.waiting === true) break;
  }
  const begun = Date.now();
  const closed = other.close();
  await new Promise((done) => setTimeout(done, 100));
  await owner.query('commit');
  await owner.end();
  const answer = await underWay;
  await closed;
  agent.destroy();
  expect([answer.status, answer.headers.get('connection')]).toEqual([200, 'close']);
  expect(Date.now() - begun).toBeLessThan(5000);
});

test('closing waits for no connection on which nothing was asked', async () => {
  const other = await startTestApp();
  const { hostname, port } = new URL(other.url);
  const silent = connect(Number(port), hostname);
  await once(silent, 'connect');
  expect((await other.api('GET', '/health/live')).status).toBe(200);
  const begun = Date.now();
  const ended = once(silent, 'close');
  silent.resume();
  await other.close();
  await ended;
  expect(Date.now() - begun).toBeLessThan(5000);
});
