import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { operatorKey, startTestApp } from '../support/app.ts';
import type { ApiAnswer, TestApp, TestClub } from '../support/app.ts';

let app: TestApp;
let club: TestClub;
beforeAll(async () => {
  app = await startTestApp();
  club = await app.newClub();
});
afterAll(async () => app?.close());

const newPerson = () => ({ name: 'Pat', email: `${randomUUID()}@example.org` });
const post = (path: string, body: unknown, key: string, token = club.adminToken): Promise<ApiAnswer> =>
  app.api('POST', path, { token, body, headers: { 'idempotency-key': key } });
/** Opens the connections, so that requests sent at the same moment are worked on at the same moment. */
const warm = () => Promise.all(Array.from({ length: 10 }, () => app.api('GET', '/v1/me', { token: club.adminToken })));
const replayed = ({ headers }: ApiAnswer) => headers.get('idempotent-replayed') === 'true';
const peopleCalled = async (email: string) => {
  const { body } = await app.api('GET', '/v1/people', { token: club.adminToken });
  return (body as { items: { email: string }[] }).items.filter((person) => person.email === email).length;
};

describe('the same key', () => {
  test('with the same request gets the same answer, and the work is done once', async () => {
    const person = newPerson();
    const first = await post('/v1/people', person, 'again');
    // The order of fields makes no other request.
    const second = await post('/v1/people', { email: person.email, name: person.name }, 'again');
    expect([first.status, second.status]).toEqual([201, 201]);
    expect(second.body).toEqual(first.body);
    expect([replayed(first), replayed(second)]).toEqual([false, true]);
    expect(await peopleCalled(person.email)).toBe(1);
  });

  test('with another body or path is refused', async () => {
    await post('/v1/people', newPerson(), 'other');
    const otherBody = await post('/v1/people', newPerson(), 'other');
    expect(otherBody.status).toBe(422);
    expect(otherBody.body.type).toBe('urn:loadweir:problem:idempotency-key-reused');
    expect((await post('/v1/squads', { name: 'Four', zone: 'UTC' }, 'other')).status).toBe(422);
  });

  test('belongs to one person', async () => {
    const { token } = await club.person([{ role: 'admin' }]);
    const [mine, theirs] = [newPerson(), newPerson()];
    await post('/v1/people', mine, 'shared');
    const answer = await post('/v1/people', theirs, 'shared', token);
    expect([answer.status, replayed(answer), answer.body.email]).toEqual([201, false, theirs.email]);
  });

  test('sent at the same moment: one is done, the others get its answer', async () => {
    const person = newPerson();
    await warm();
    const answers = await Promise.all(Array.from({ length: 6 }, () => post('/v1/people', person, 'race')));
    expect(answers.map(({ status }) => status)).toEqual([201, 201, 201, 201, 201, 201]);
    expect(new Set(answers.map(({ body }) => (body as { id: string }).id)).size).toBe(1);
    expect(answers.filter(replayed).length).toBe(5);
    expect(await peopleCalled(person.email)).toBe(1);
  });

  test('after a refusal is still free', async () => {
    const person = newPerson();
    const { body } = await app.api('POST', '/v1/people', { token: club.adminToken, body: person });
    expect((await post('/v1/people', person, 'failed')).status).toBe(409);
    const other = newPerson();
    const answer = await post('/v1/people', other, 'failed');
    expect([answer.status, replayed(answer)]).toEqual([201, false]);
    expect((answer.body as { id: string }).id).not.toBe((body as { id: string }).id);
  });

  test('has to be 1 to 200 visible ASCII characters', async () => {
    for (const key of ['with space', 'x'.repeat(201)]) {
      const answer = await post('/v1/people', newPerson(), key);
      expect(answer.status).toBe(400);
      expect(answer.body.errors[0].field).toBe('Idempotency-Key');
    }
    expect((await post('/v1/people', newPerson(), 'x'.repeat(200))).status).toBe(201);
  });
});

test('a secret is shown once and stored nowhere', async () => {
  const path = `/v1/people/${club.adminId}/tokens`;
  const first = await post(path, { label: 'laptop', validDays: 10 }, 'secret');
  const second = await post(path, { label: 'laptop', validDays: 10 }, 'secret');
  expect(first.body.secret).toMatch(/^lw\./);
  expect(second.body).toEqual({ ...first.body, secret: null });
});

describe('a club by the operator’s key', () => {
  const input = { name: 'Rowers', admin: { name: 'Ada', email: 'ada@example.org' } };

  test('is made once, and answered again without a token', async () => {
    const first = await post('/v1/clubs', input, 'club-1', operatorKey);
    const second = await post('/v1/clubs', input, 'club-1', operatorKey);
    expect([first.status, second.status]).toEqual([201, 200]);
    expect(first.body.token.secret).toMatch(/^lw\./);
    expect(second.body).toEqual({ ...first.body, token: null });
    const me = await app.api('GET', '/v1/me', { token: first.body.token.secret as string });
    expect(me.body).toEqual({
      clubId: first.body.club.id,
      person: { id: first.body.admin.personId, ...input.admin },
      roles: [{ role: 'admin', squadId: null }],
      athleteId: null,
    });
  });

  test('with the key of another club is refused', async () => {
    await post('/v1/clubs', input, 'club-2', operatorKey);
    const answer = await post('/v1/clubs', { ...input, name: 'Others' }, 'club-2', operatorKey);
    expect([answer.status, answer.body.type]).toEqual([422, 'urn:loadweir:problem:idempotency-key-reused']);
  });

  test('asked for at the same moment is one club', async () => {
    await warm();
    const answers = await Promise.all(Array.from({ length: 4 }, () => post('/v1/clubs', input, 'club-3', operatorKey)));
    expect(answers.map(({ status }) => status).toSorted()).toEqual([200, 200, 200, 201]);
    expect(new Set(answers.map(({ body }) => (body as { club: { id: string } }).club.id)).size).toBe(1);
  });

  test('is made by nobody else', async () => {
    for (const token of [club.adminToken, `${operatorKey}x`, undefined]) {
      expect((await app.api('POST', '/v1/clubs', { token, body: input })).status).toBe(401);
    }
  });
});
