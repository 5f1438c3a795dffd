import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import pg from 'pg';
import { translateDatabaseError } from '../../src/persistence/constraint-errors.ts';
import type { ConstraintMessage } from '../../src/persistence/constraint-messages.ts';
import { PrismaService } from '../../src/persistence/prisma.service.ts';
import { AppError, RuleError } from '../../src/platform/errors.ts';
import { createTestDatabase } from '../support/database.ts';
import type { TestDatabase } from '../support/database.ts';
import { execute } from '../support/global-setup.ts';

const messages: Record<string, ConstraintMessage> = {
  sample_rating_range: { kind: 'validation', field: 'rating', allowed: '0 to 10', hint: 'CR-10' },
  sample_name_key: { kind: 'conflict', field: 'name', allowed: 'a name not used yet', code: 'name-taken' },
  sample_no_overlap: { kind: 'rule', field: 'validFrom', allowed: 'days no other one covers' },
  sample_parent_fkey: { kind: 'not-found', field: 'parentId', allowed: 'an existing one' },
};

let database: TestDatabase;
let prisma: PrismaService;
let bare: pg.Client;

beforeAll(async () => {
  database = await createTestDatabase();
  await execute(
    database.ownerUrl,
    `create table sample (
       id int primary key,
       parent int constraint sample_parent_fkey references sample,
       name text constraint sample_name_key unique,
       rating int constraint sample_rating_range check (rating between 0 and 10),
       amount numeric(3, 1),
       days daterange constraint sample_no_overlap_check check (true),
       constraint sample_no_overlap exclude using gist (days with &&)
     );
     create table protected (id int);
     alter table protected enable row level security;
     grant insert, select on protected to public;
     create function complain() returns void language plpgsql as $$
     begin raise exception 'sample_rating_range is broken in words' using errcode = '23514'; end $$;
     insert into sample (id, name, days) values (1, 'one', '[2026-01-01,2026-02-01)'), (2, 'two', null);
     insert into sample (id, parent) values (3, 2);`,
  );
  prisma = new PrismaService({ url: database.ownerUrl });
  bare = new pg.Client({ connectionString: database.ownerUrl });
  await bare.connect();
});

afterAll(async () => {
  await prisma.close();
  await bare.end();
  await database.drop();
});

async function failureOf(work: () => Promise<unknown>): Promise<unknown> {
  try {
    await work();
  } catch (error) {
    return error;
  }
  throw new Error('nothing failed');
}

/** The same broken statement through Prisma and through a bare connection. */
async function translated(sql: string, known = messages): Promise<unknown[]> {
  return [
    translateDatabaseError(await failureOf(() => prisma.client.$executeRawUnsafe(sql)), known),
    translateDatabaseError(await failureOf(() => bare.query(sql)), known),
  ];
}

const insert = (columns: string, values: string) => `insert into sample (id, ${columns}) values (9, ${values})`;

describe('translateDatabaseError', () => {
  test.each([
    [insert('rating', '11'), 400, 'invalid-input', 'sample_rating_range'],
    [insert('name', "'one'"), 409, 'name-taken', 'sample_name_key'],
    [insert('days', "'[2026-01-15,2026-01-20)'"), 422, 'rule-broken', 'sample_no_overlap'],
    [insert('parent', '77'), 404, 'not-found', 'sample_parent_fkey'],
    ['select complain()', 400, 'invalid-input', 'sample_rating_range'],
  ])('names the field: %s', async (sql, status, code, constraint) => {
    const { kind: _kind, code: _code, ...field } = messages[constraint] ?? { kind: '' };
    for (const error of await translated(sql)) {
      expect(error).toBeInstanceOf(AppError);
      expect(error).toMatchObject({ status, code, fields: [field] });
    }
  });

  test.each([
    [insert('rating', '11'), 422, 'rule-broken'],
    [insert('name', "'one'"), 409, 'conflict'],
    [insert('days', "'[2026-01-15,2026-01-20)'"), 409, 'conflict'],
    [insert('parent', '77'), 422, 'unknown-reference'],
    ['delete from sample where id = 2', 409, 'still-used'],
    [insert('amount', '123.4'), 422, 'number-out-of-range'],
    [insert('rating', '99999999999'), 422, 'number-out-of-range'],
  ])('goes by the kind of a constraint without a message: %s', async (sql, status, code) => {
    for (const error of await translated(sql, {})) expect(error).toMatchObject({ status, code });
  });

  test('repeats nothing that was sent', async () => {
    const sql = insert('name', "'one'");
    for (const known of [messages, {}]) {
      for (const error of await translated(sql, known)) {
        const { message, fields } = error as AppError;
        expect(`${message} ${JSON.stringify(fields)}`).not.toMatch(/\bone\b|insert|sample/);
      }
    }
  });

  test('knows the errors of Prisma’s own calls', async () => {
    const club = { id: randomUUID(), name: 'Club', externalKey: 'key', createdAt: new Date('2026-03-02T12:00:00Z') };
    await prisma.client.club.create({ data: club });
    const again = () => prisma.client.club.create({ data: { ...club, id: randomUUID() } });
    const key = {
      club_external_key_key: { kind: 'conflict', field: 'externalKey', allowed: 'one not used yet' },
    } as const;
    expect(translateDatabaseError(await failureOf(again), key)).toMatchObject({
      status: 409,
      fields: [{ field: 'externalKey', allowed: 'one not used yet' }],
    });
    const orphan = {
      clubId: randomUUID(),
      id: randomUUID(),
      name: 'P',
      email: 'p@example.org',
      createdAt: club.createdAt,
    };
    const error = translateDatabaseError(await failureOf(() => prisma.client.person.create({ data: orphan })), {});
    expect(error).toMatchObject({ status: 422, code: 'unknown-reference' });
  });

  test('row-level security is a refusal; a missing grant and a mistake in a statement stay what they are', async () => {
    const service = new pg.Client({ connectionString: database.appUrl });
    await service.connect();
    const as = (sql: string) => failureOf(() => service.query(sql));
    expect(translateDatabaseError(await as('insert into protected values (1)'))).toMatchObject({ status: 403 });
    for (const sql of ['truncate sample', 'selec 1', 'select * from nowhere', "select 'x'::date"]) {
      const error = await as(sql);
      expect(translateDatabaseError(error)).toBe(error);
    }
    await service.end();
  });

  test('two transactions that wait for each other: one is told to try again', async () => {
    const other = new pg.Client({ connectionString: database.ownerUrl });
    await other.connect();
    await bare.query('begin; update sample set rating = 1 where id = 1');
    await other.query('begin; update sample set rating = 2 where id = 2');
    const both = await Promise.allSettled([
      bare.query('update sample set rating = 1 where id = 2'),
      other.query('update sample set rating = 2 where id = 1'),
    ]);
    await bare.query('rollback');
    await other.end();
    const [lost] = both.filter(({ status }) => status === 'rejected') as PromiseRejectedResult[];
    expect(translateDatabaseError(lost?.reason)).toMatchObject({ status: 409, code: 'concurrent-change' });
  });

  test('a database that does not answer is 503, through Prisma and without', async () => {
    const nowhere = 'postgresql://nobody:x@127.0.0.1:1/none';
    const client = new pg.Client({ connectionString: nowhere });
    expect(translateDatabaseError(await failureOf(() => client.connect()))).toMatchObject({ status: 503 });
    const service = new PrismaService({ url: nowhere });
    const error = await failureOf(() => service.client.$queryRaw`select 1`);
    expect(translateDatabaseError(error)).toMatchObject({ status: 503, code: 'unavailable' });
    await service.close();
    const taken = Object.assign(new Error('expired'), { code: 'P2028', meta: {} });
    expect(translateDatabaseError(taken)).toMatchObject({ status: 503 });
  });

  test.each([new RuleError('ours'), new Error('a defect'), undefined, null, 'text', { code: 'ENOENT' }])(
    'leaves %p alone',
    (error) => {
      expect(translateDatabaseError(error)).toBe(error);
    },
  );
});
