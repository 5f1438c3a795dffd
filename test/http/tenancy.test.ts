import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import pg from 'pg';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';

// Two clubs in one database: neither sees the other, through the API and, below it, on a bare connection of the role
// the services use.
let app: TestApp;
let one: TestClub;
let two: TestClub;
let squad: string;
let athlete: string;
let raw: pg.Client;

beforeAll(async () => {
  app = await startTestApp();
  [one, two] = [await app.newClub(), await app.newClub()];
  squad = await one.squad('Eight');
  ({ athleteId: athlete } = await one.athlete(squad, { login: true }));
  raw = new pg.Client({ connectionString: app.db.appUrl });
  await raw.connect();
});
afterAll(async () => {
  await raw?.end();
  await app?.close();
});

describe('through the API', () => {
  test('lists hold the own club only', async () => {
    const token = two.adminToken;
    expect((await app.api('GET', '/v1/squads', { token })).body).toEqual({ items: [] });
    expect((await app.api('GET', '/v1/athletes', { token })).body).toEqual({ items: [] });
    const people = (await app.api('GET', '/v1/people', { token })).body as { items: { id: string }[] };
    expect(people.items.map(({ id }) => id)).toEqual([two.adminId]);
    expect((await app.api('GET', `/v1/athletes?squadId=${squad}`, { token })).status).toBe(404);
  });

  test('a body cannot name things of another club', async () => {
    const token = two.adminToken;
    const ownSquad = await two.squad();
    const newcomer = { name: 'Nova', squadId: squad, memberFrom: '2026-01-01' };
    expect((await app.api('POST', '/v1/athletes', { token, body: newcomer })).status).toBe(404);
    const foreignPerson = { ...newcomer, squadId: ownSquad, personId: one.adminId };
    expect((await app.api('POST', '/v1/athletes', { token, body: foreignPerson })).status).toBe(404);
    const role = { role: 'coach', squadId: squad };
    const path = `/v1/people/${two.adminId}/roles`;
    expect((await app.api('POST', path, { token, body: role })).status).toBe(404);
    const { items } = (await app.api('GET', '/v1/athletes', { token })).body as { items: unknown[] };
    expect(items).toEqual([]);
  });

  test('the same name and address may be in both', async () => {
    await expect(two.squad('Eight')).resolves.toMatch(/-/);
    const person = { name: 'Pat', email: 'both@example.org' };
    for (const { adminToken: token } of [one, two]) {
      expect((await app.api('POST', '/v1/people', { token, body: person })).status).toBe(201);
    }
    const again = await app.api('POST', '/v1/people', { token: two.adminToken, body: person });
    expect(again.status).toBe(409);
    expect(again.body.errors).toEqual([{ field: 'email', allowed: 'a mail address nobody in the club has' }]);
  });

  test('a token whose club part is exchanged opens nothing', async () => {
    const [, , secret] = one.adminToken.split('.');
    const [, club] = two.adminToken.split('.');
    expect((await app.api('GET', '/v1/me', { token: `lw.${club}.${secret}` })).status).toBe(401);
  });
});

describe('on the services’ own connection', () => {
  const asClub = async <T>(clubId: string | null, work: () => Promise<T>): Promise<T> => {
    await raw.query('begin');
    await raw.query("select set_config('loadweir.club_id', $1, true)", [clubId ?? '']);
    return work().finally(() => raw.query('rollback'));
  };
  const tenantTables = async () => {
    const { rows } = await raw.query<{ name: string }>(
      "select table_name as name from information_schema.columns where table_schema = 'public' and column_name = 'club_id'",
    );
    return rows.map(({ name }) => name);
  };
  const count = async (table: string) => {
    const { rows } = await raw.query<{ count: number; clubs: string[] }>(
      `select count(*)::int as count, coalesce(array_agg(distinct club_id), '{}') as clubs from ${pg.escapeIdentifier(table)}`,
    );
    return rows[0]!;
  };

  test('no tenant row is seen without a club, and one club’s rows with it', async () => {
    const tables = await tenantTables();
    expect(tables.length).toBeGreaterThan(20);
    const seen = new Map<string, string[]>();
    for (const table of tables) {
      await asClub(null, async () =>
        expect({ table, ...(await count(table)) }).toEqual({ table, count: 0, clubs: [] }),
      );
      await asClub(one.clubId, async () => seen.set(table, (await count(table)).clubs));
    }
    for (const table of ['person', 'squad', 'athlete', 'membership', 'load_policy', 'access_token', 'audit_entry']) {
      expect({ table, clubs: seen.get(table) }).toEqual({ table, clubs: [one.clubId] });
    }
    expect([...seen.values()].flat().every((club) => club === one.clubId)).toBe(true);
  });

  test('a row of another club cannot be written, changed or removed', async () => {
    await asClub(two.clubId, async () => {
      const changed = await raw.query('update athlete set name = $1 where id = $2', ['x', athlete]);
      const removed = await raw.query('delete from membership where athlete_id = $1', [athlete]);
      expect([changed.rowCount, removed.rowCount]).toEqual([0, 0]);
      const insert = raw.query(
        'insert into squad (club_id, id, name, zone, created_at) values ($1, $2, $3, $4, now())',
        [one.clubId, randomUUID(), 'Planted', 'UTC'],
      );
      await expect(insert).rejects.toMatchObject({ code: '42501' });
    });
  });

  test('a row cannot point into another club', async () => {
    await asClub(two.clubId, async () => {
      const insert = raw.query(
        'insert into load_policy (club_id, id, squad_id, valid_from, settings, created_at) values ($1, $2, $3, $4, $5, now())',
        [two.clubId, randomUUID(), squad, '2026-01-01', '{}'],
      );
      await expect(insert).rejects.toMatchObject({ code: '23503' });
    });
  });

  test('the operator sees clubs and squads, and nothing inside them', async () => {
    await raw.query('begin');
    await raw.query("select set_config('loadweir.operator', 'on', true)");
    for (const table of ['person', 'athlete', 'access_token', 'audit_entry', 'membership']) {
      expect({ table, ...(await count(table)) }).toEqual({ table, count: 0, clubs: [] });
    }
    const { rows } = await raw.query('select id from club');
    expect(rows.length).toBe(2);
    await raw.query('rollback');
  });
});
