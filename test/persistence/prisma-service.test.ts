import { randomBytes } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from '@jest/globals';
import { PrismaService } from '../../src/persistence/prisma.service.ts';
import { createTestDatabase } from '../support/database.ts';
import type { TestDatabase } from '../support/database.ts';
import { execute } from '../support/global-setup.ts';

let database: TestDatabase;

beforeAll(async () => {
  database = await createTestDatabase();
});

afterAll(() => database.drop());

async function start(url: string): Promise<void> {
  const service = new PrismaService({ url });
  try {
    await service.onModuleInit();
  } finally {
    await service.onApplicationShutdown();
  }
}

test('starts as the role that owns nothing and refuses the owner', async () => {
  await start(database.appUrl);
  await expect(start(database.ownerUrl)).rejects.toThrow(/may bypass row-level security|owns/);
});

test.each([
  ['may bypass row-level security', (role: string) => `alter role ${role} bypassrls`],
  ['owns or may act as the owner of squad', (role: string) => `alter table squad owner to ${role}`],
  [
    'owns or may act as the owner of squad',
    (role: string) =>
      `create role ${role}_group; alter table squad owner to ${role}_group; grant ${role}_group to ${role}`,
  ],
])('refuses a role that %s', async (reason, empower) => {
  const role = `powerful_${randomBytes(4).toString('hex')}`;
  const url = new URL(database.ownerUrl);
  const owner = decodeURIComponent(url.username);
  [url.username, url.password] = [role, 'x'];
  await execute(database.ownerUrl, `create role ${role} login password 'x'`);
  try {
    await start(url.href);
    await execute(database.ownerUrl, empower(role));
    await expect(start(url.href)).rejects.toThrow(reason);
  } finally {
    await execute(database.ownerUrl, `alter table squad owner to "${owner}"`);
    await execute(database.ownerUrl, `drop role if exists ${role}, ${role}_group`);
  }
});

test('reads instants rightly whatever zone the server is set to', async () => {
  await execute(database.ownerUrl, `alter database ${database.name} set timezone = 'Asia/Kolkata'`);
  const service = new PrismaService({ url: database.appUrl });
  const rows = await service.client.$queryRaw`select timestamptz '2026-03-02T12:00:00Z' as instant`;
  await service.close();
  await execute(database.ownerUrl, `alter database ${database.name} reset timezone`);
  expect(rows).toEqual([{ instant: new Date('2026-03-02T12:00:00Z') }]);
});

test('lives on when the server ends its idle connections', async () => {
  const heard: Error[] = [];
  const service = new PrismaService({ url: database.appUrl, onConnectionError: (error) => heard.push(error) });
  expect(await service.isReachable()).toBe(true);
  await execute(
    database.ownerUrl,
    `select pg_terminate_backend(pid, 5000) from pg_stat_activity
     where datname = current_database() and application_name = 'loadweir'`,
  );
  while (heard.length === 0) await new Promise((resolve) => setTimeout(resolve, 10));
  expect(await service.client.$queryRaw`select 1 as x`).toEqual([{ x: 1 }]);
  await service.close();
});

test('says so when the database cannot be reached', async () => {
  const service = new PrismaService({ url: 'postgresql://nobody:x@127.0.0.1:1/none' });
  expect(await service.isReachable()).toBe(false);
  await service.close();
});
