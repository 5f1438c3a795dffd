import { randomBytes } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import pg from 'pg';
import { PgBoss } from 'pg-boss';
import { ensureAppRole } from '../../prisma/app-role.ts';
import { prepareDatabase } from '../../prisma/prepare.ts';
import { createTestDatabase } from '../support/database.ts';
import type { TestDatabase } from '../support/database.ts';
import { execute } from '../support/global-setup.ts';

let database: TestDatabase;
let app: pg.Client;

beforeAll(async () => {
  database = await createTestDatabase();
  app = new pg.Client({ connectionString: database.appUrl });
  await app.connect();
});

afterAll(async () => {
  await app.end();
  await database.drop();
});

describe('a prepared database', () => {
  test('connects the services as a role that owns nothing and has no power', async () => {
    const { rows } = await app.query(`
      select rolsuper, rolbypassrls, rolcreaterole, rolcreatedb,
        (select count(*)::int from pg_class where relowner = r.oid) as owned
      from pg_roles r where rolname = current_user`);
    expect(rows).toEqual([
      { rolsuper: false, rolbypassrls: false, rolcreaterole: false, rolcreatedb: false, owned: 0 },
    ]);
  });

  test('lets that role work with every table of the project', async () => {
    const { rows } = await app.query<{ name: string }>(`
      select c.oid::regclass::text as name from pg_class c join pg_namespace n on n.oid = relnamespace
      where relkind in ('r', 'p') and nspname in ('public', 'pgboss') and relname <> '_prisma_migrations'
        and not (has_table_privilege(c.oid, 'select') and has_table_privilege(c.oid, 'insert')
          and has_table_privilege(c.oid, 'update') and has_table_privilege(c.oid, 'delete'))`);
    expect(rows).toEqual([]);
  });

  test.each([
    'create table mine (x int)',
    'create table pgboss.mine (x int)',
    'truncate club',
    'select * from _prisma_migrations',
    'alter table club disable row level security',
    'drop table club',
  ])('refuses it %s', async (statement) => {
    await expect(app.query(statement)).rejects.toMatchObject({ code: '42501' });
  });

  test('gives it what is made later', async () => {
    await execute(database.ownerUrl, 'create table later (x int generated always as identity, y int)');
    await expect(app.query('insert into later (y) values (1) returning x')).resolves.toMatchObject({
      rows: [{ x: 1 }],
    });
    await execute(database.ownerUrl, 'drop table later');
  });

  test('lets it make a queue, send and work without owning the tables', async () => {
    const boss = new PgBoss({ connectionString: database.appUrl, migrate: false, supervise: false, schedule: false });
    const errors: unknown[] = [];
    boss.on('error', (error) => errors.push(error));
    await boss.start();
    await boss.createQueue('greet');
    const id = await boss.send('greet', { name: 'Ada' });
    const [job] = await boss.fetch<{ name: string }>('greet');
    expect(job).toMatchObject({ id, data: { name: 'Ada' } });
    await boss.complete('greet', job?.id ?? '');
    await boss.supervise('greet');
    await boss.stop({ graceful: false });
    expect(errors).toEqual([]);
  });

  test('every table with a club in it is under row-level security', async () => {
    const { rows } = await app.query(`
      select c.relname from pg_class c join pg_attribute a on a.attrelid = c.oid and a.attname = 'club_id'
      where c.relkind in ('r', 'p') and c.relnamespace = 'public'::regnamespace and not c.relrowsecurity`);
    expect(rows).toEqual([]);
  });
});

describe('prepareDatabase', () => {
  test('changes nothing the second time', async () => {
    const said: string[] = [];
    const given = database.appUrl;
    const again = await prepareDatabase({ ownerUrl: database.ownerUrl, appUrl: given, log: (line) => said.push(line) });
    expect(said).toEqual([]);
    expect(again).toEqual({ appUrl: given });
  });

  test('starters at once, of one database and of another on the same server, agree on a new role', async () => {
    const other = await createTestDatabase({ empty: true });
    const third = await createTestDatabase({ empty: true });
    const role = `loadweir_app_${randomBytes(4).toString('hex')}`;
    const said: string[] = [];
    const prepare = async ({ ownerUrl }: TestDatabase) => {
      const appUrl = new URL(ownerUrl);
      appUrl.username = role;
      appUrl.password = 'correct horse';
      return prepareDatabase({ ownerUrl, appUrl: appUrl.href, log: (line) => said.push(line) });
    };
    try {
      const answers = await Promise.all([prepare(other), prepare(third), prepare(other)]);
      for (const { appUrl } of answers) await execute(appUrl, 'select count(*) from club');
      expect(said.filter((line) => line === `Role ${role} created.`)).toHaveLength(1);
      await expect(prepareWrong(other, role)).rejects.toThrow('cannot log in');
    } finally {
      await other.drop();
      await third.drop();
      await execute(database.ownerUrl, `drop role ${role}`);
    }
  });

  test('sets a derived password anew when the one in the database is another', async () => {
    const role = `loadweir_app_${randomBytes(4).toString('hex')}`;
    const appUrl = new URL(database.ownerUrl);
    appUrl.username = role;
    appUrl.password = 'derived today';
    const owner = new pg.Client({ connectionString: database.ownerUrl });
    await owner.connect();
    try {
      await owner.query(`create role ${role} login password 'derived from the old one'`);
      const said: string[] = [];
      const options = { derived: true, log: (line: string) => said.push(line) };
      await ensureAppRole(owner, appUrl.href, options);
      await ensureAppRole(owner, appUrl.href, options);
      await execute(appUrl.href, 'select 1');
      expect(said).toEqual([`Password of role ${role} set anew.`]);
    } finally {
      await owner.query(`drop role ${role}`);
      await owner.end();
    }
  });

  test('refuses to connect the services as the owner, whatever its password', async () => {
    const { ownerUrl } = database;
    await expect(prepareDatabase({ ownerUrl, appUrl: ownerUrl })).rejects.toThrow('may bypass row-level security');
    const owner = decodeURIComponent(new URL(ownerUrl).username);
    await expect(prepareWrong(database, owner)).rejects.toThrow('may bypass row-level security');
    await execute(ownerUrl, 'select 1');
  });
});

function prepareWrong({ ownerUrl }: TestDatabase, role: string): Promise<unknown> {
  const wrong = new URL(ownerUrl);
  wrong.username = role;
  wrong.password = 'wrong';
  return prepareDatabase({ ownerUrl, appUrl: wrong.href });
}
