import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import { startTestApp } from '../support/app.ts';
import type { TestApp } from '../support/app.ts';
import { loggedClub } from '../support/logged-club.ts';
import type { LoggedClub } from '../support/logged-club.ts';
import { fingerprint } from '../support/rows.ts';
import { nobody } from './bad-input-sessions.cases.ts';
import { cases } from './bad-input.cases.ts';

// Whatever is wrong, the answer names the field and what is allowed, and nothing at all is stored.
let test: TestApp;
let club: LoggedClub;
let before: Record<string, string>;

beforeAll(async () => {
  test = await startTestApp();
  club = await loggedClub(test);
  before = await fingerprint(test.db.ownerUrl);
});
afterAll(async () => test?.close());

const filled = (path: string) =>
  path.replace(/\{(\w+)\}/g, (_, name: string) => (name === 'nobody' ? nobody : club[name as keyof LoggedClub]));

describe('bad input', () => {
  it.each(cases.map((each) => [each.name, each] as const))(
    '%s',
    async (_, { method = 'POST', path, body, status, field, headers }) => {
      const given =
        typeof body === 'string'
          ? filled(body)
          : body === undefined
            ? undefined
            : JSON.parse(filled(JSON.stringify(body)));
      const answer = await test.api(method, filled(path), {
        token: club.token,
        body: given,
        ...(headers && { headers }),
      });
      expect([answer.status, answer.body.status]).toEqual([status, status]);
      expect(answer.headers.get('content-type')).toContain('application/problem+json');
      expect(answer.body).toMatchObject({
        type: expect.stringMatching(/^urn:loadweir:problem:/),
        correlationId: expect.any(String),
      });
      if (field === null) return;
      const errors = answer.body.errors as { field: string; allowed: string }[];
      expect(errors.map((error) => error.field)).toContain(field);
      for (const error of errors) expect(error.allowed.length).toBeGreaterThan(2);
    },
  );

  it('a body of 20 MB, JSON or a sheet', async () => {
    const title = 'x'.repeat(20 * 1024 * 1024);
    for (const [path, body, type] of [
      [`/v1/athletes/${club.athleteId}/sessions`, JSON.stringify({ title }), 'application/json'],
      [`/v1/squads/${club.squadId}/session-imports`, `athlete\n${title}`, 'text/csv'],
    ] as const) {
      const answer = await test.api('POST', path, { token: club.token, body, headers: { 'content-type': type } });
      expect([answer.status, answer.body.type]).toEqual([413, 'urn:loadweir:problem:too-large']);
    }
  });

  it('a key used before with another body', async () => {
    const body = { startedAt: '2026-02-01T07:30:00+01:00', durationMin: 61, modality: 'rowing' };
    const headers = { 'idempotency-key': 'used-before' };
    const answer = await test.api('POST', `/v1/athletes/${club.athleteId}/sessions`, {
      token: club.token,
      body,
      headers,
    });
    expect([answer.status, answer.body.type]).toEqual([422, 'urn:loadweir:problem:idempotency-key-reused']);
  });

  it('a new key on a refused request is as good as never used', async () => {
    const headers = { 'idempotency-key': 'never-kept' };
    const answer = await test.api('POST', `/v1/athletes/${club.athleteId}/sessions`, {
      token: club.token,
      body: {},
      headers,
    });
    expect(answer.status).toBe(400);
  });

  it('there are enough cases, and after all of them nothing at all has changed', async () => {
    expect(cases.length).toBeGreaterThanOrEqual(60);
    expect(await fingerprint(test.db.ownerUrl)).toEqual(before);
  });
});
