import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import pg from 'pg';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';

let app: TestApp;
let club: TestClub;
beforeAll(async () => {
  app = await startTestApp();
  club = await app.newClub();
});
afterAll(async () => app?.close());

const day = 86_400_000;
const asAdmin = (method: string, path: string, body?: unknown) =>
  app.api(method, path, { token: club.adminToken, body });
const me = async (token: string) => (await app.api('GET', '/v1/me', { token })).status;

describe('people', () => {
  test('are made with roles and read back', async () => {
    const squadId = await club.squad();
    const roles = [{ role: 'coach', squadId }, { role: 'medic' }];
    const made = await asAdmin('POST', '/v1/people', { name: ' Kim Coach ', email: 'Kim@Example.org', roles });
    expect(made.status).toBe(201);
    expect(made.body).toMatchObject({ name: 'Kim Coach', email: 'kim@example.org' });
    expect(made.body.roles).toEqual([
      expect.objectContaining({ role: 'coach', squadId }),
      expect.objectContaining({ role: 'medic', squadId: null }),
    ]);
    expect((await asAdmin('GET', `/v1/people/${made.body.id}`)).body).toEqual(made.body);
  });

  test('with one bad role are not made at all', async () => {
    const roles = [{ role: 'coach' }, { role: 'coach' }];
    const answer = await asAdmin('POST', '/v1/people', { name: 'Twice', email: 'twice@example.org', roles });
    expect(answer.status).toBe(409);
    const { items } = (await asAdmin('GET', '/v1/people')).body as { items: { email: string }[] };
    expect(items.some(({ email }) => email === 'twice@example.org')).toBe(false);
  });

  test('lose a role at once', async () => {
    const squadId = await club.squad();
    const { personId, token } = await club.person([{ role: 'coach', squadId }]);
    const person = (await asAdmin('GET', `/v1/people/${personId}`)).body as { roles: { id: string }[] };
    expect((await app.api('GET', `/v1/squads/${squadId}`, { token })).status).toBe(200);
    const path = `/v1/people/${personId}/roles/${person.roles[0]!.id}`;
    expect((await asAdmin('DELETE', path)).status).toBe(204);
    expect((await asAdmin('DELETE', path)).status).toBe(404);
    expect((await app.api('GET', `/v1/squads/${squadId}`, { token })).status).toBe(404);
  });

  test('the last admin keeps the role', async () => {
    const other = await app.newClub();
    const asOther = (method: string, path: string, body?: unknown) =>
      app.api(method, path, { token: other.adminToken, body });
    const { roles } = (await asOther('GET', `/v1/people/${other.adminId}`)).body as { roles: { id: string }[] };
    const path = `/v1/people/${other.adminId}/roles/${roles[0]!.id}`;
    expect((await asOther('DELETE', path)).status).toBe(409);
    await other.person([{ role: 'admin' }]);
    expect((await asOther('DELETE', path)).status).toBe(204);
    expect((await asOther('GET', '/v1/people')).status).toBe(403);
  });

  test('an admin is one of the whole club', async () => {
    const squadId = await club.squad();
    const { personId } = await club.person([]);
    const answer = await asAdmin('POST', `/v1/people/${personId}/roles`, { role: 'admin', squadId });
    expect(answer.status).toBe(400);
    expect(answer.body.errors).toEqual([
      { field: 'squadId', value: squadId, allowed: 'nothing: an admin is one of the whole club' },
    ]);
  });
});

describe('tokens', () => {
  test('end by the clock', async () => {
    const { personId } = await club.person([]);
    const issued = await asAdmin('POST', `/v1/people/${personId}/tokens`, { label: 'tablet', validDays: 2 });
    const token = issued.body.secret as string;
    const before = app.clock.now();
    expect(issued.body.expiresAt).toBe(new Date(before.getTime() + 2 * day).toISOString());
    app.clock.advance(2 * day - 1);
    expect(await me(token)).toBe(200);
    app.clock.advance(1);
    expect(await me(token)).toBe(401);
    app.clock.set(before);
    expect(await me(token)).toBe(200);
  });

  test('end at once when revoked, the others stay', async () => {
    const { personId, token } = await club.person([]);
    const path = `/v1/people/${personId}/tokens`;
    const second = await asAdmin('POST', path, { label: 'second', validDays: 1 });
    expect((await asAdmin('DELETE', `${path}/${second.body.id}`)).status).toBe(204);
    expect(await me(second.body.secret as string)).toBe(401);
    expect(await me(token)).toBe(200);
    const { items } = (await asAdmin('GET', path)).body as { items: { label: string; revokedAt: string | null }[] };
    const revoked = new Map(items.map(({ label, revokedAt }) => [label, revokedAt !== null]));
    expect(Object.fromEntries(revoked)).toEqual({ test: false, second: true });
    expect(JSON.stringify(items)).not.toMatch(/secret|hash/i);
  });

  test('of one person cannot be revoked through another', async () => {
    const [a, b] = [await club.person([]), await club.person([])];
    const { items } = (await asAdmin('GET', `/v1/people/${a.personId}/tokens`)).body as { items: { id: string }[] };
    expect((await asAdmin('DELETE', `/v1/people/${b.personId}/tokens/${items[0]!.id}`)).status).toBe(404);
    expect(await me(a.token)).toBe(200);
  });

  test('are stored as their hash only', async () => {
    const { token } = await club.person([]);
    const owner = new pg.Client({ connectionString: app.db.ownerUrl });
    await owner.connect();
    const hash = createHash('sha256').update(token).digest();
    const { rows } = await owner.query('select label from access_token where token_hash = $1', [hash]);
    const { rows: audit } = await owner.query<{ text: string }>(
      'select row_to_json(a)::text as text from audit_entry a',
    );
    await owner.end();
    expect(rows).toEqual([{ label: 'test' }]);
    expect(audit.length).toBeGreaterThan(5);
    expect(audit.filter(({ text }) => text.includes(token.split('.')[2]!))).toEqual([]);
  });

  test.each([
    [{ label: 'x', validDays: 0 }, 'validDays', 'at least 1'],
    [{ label: 'x', validDays: 401 }, 'validDays', 'at most 400'],
    [{ label: 'x', validDays: 1.5 }, 'validDays', 'a whole number'],
    [{ label: '', validDays: 1 }, 'label', 'text of 1 to 120 characters'],
  ])('%j is refused', async (body, field, allowed) => {
    const answer = await asAdmin('POST', `/v1/people/${club.adminId}/tokens`, body);
    expect(answer.status).toBe(400);
    expect(answer.body.errors).toEqual([expect.objectContaining({ field, allowed })]);
  });
});
