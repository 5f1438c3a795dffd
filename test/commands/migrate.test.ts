import { spawn } from 'node:child_process';
import { text } from 'node:stream/consumers';
import { fileURLToPath } from 'node:url';
import { once } from 'node:events';
import { afterAll, beforeAll, expect, test } from '@jest/globals';
import { createTestDatabase } from '../support/database.ts';
import type { TestDatabase } from '../support/database.ts';
import { execute } from '../support/global-setup.ts';

let database: TestDatabase;

beforeAll(async () => {
  database = await createTestDatabase({ empty: true });
});

afterAll(() => database.drop());

/** The command as a process of its own, with nothing in its environment but what is given. */
async function migrate(args: string[], env: NodeJS.ProcessEnv) {
  const entry = fileURLToPath(new URL('../../src/commands/migrate.ts', import.meta.url));
  const child = spawn(process.execPath, [entry, ...args], { env, stdio: ['ignore', 'pipe', 'pipe'] });
  const [out, err] = await Promise.all([text(child.stdout), text(child.stderr), once(child, 'close')]);
  return { code: child.exitCode, out, err };
}

test('says what it applied, and the second time that there was nothing to do', async () => {
  const env = { DATABASE_URL: database.ownerUrl, DATABASE_APP_URL: database.appUrl };
  const first = await migrate([], env);
  expect(first).toMatchObject({ code: 0, err: '' });
  expect(first.out).toMatch(
    /^Migration 0001_first applied\.\n(Migration .* applied\.\n)*The database is ready for role \w+\.\n$/,
  );
  await execute(database.appUrl, 'select count(*) from club');
  const second = await migrate([], env);
  expect(second).toEqual({ code: 0, err: '', out: first.out.replace(/^(Migration .*\n)+/, 'Nothing to do.\n') });
});

test('explains itself and refuses what it does not know', async () => {
  expect(await migrate(['--help'], {})).toMatchObject({
    code: 0,
    out: expect.stringContaining('npm run migrate'),
  });
  expect(await migrate(['--force'], {})).toMatchObject({ code: 2, err: 'unknown argument --force; allowed: --help\n' });
});

test('without an outside database, a reachable server or a password to derive one from, it says what is missing', async () => {
  expect(await migrate([], {})).toMatchObject({
    code: 2,
    err: expect.stringMatching(/^DATABASE_URL is not set/),
  });
  const unreachable = await migrate([], { DATABASE_URL: 'postgresql://a:b@127.0.0.1:1/none' });
  expect(unreachable).toMatchObject({
    code: 1,
    err: expect.stringMatching(/^The database cannot be reached: .*ECONNREFUSED/),
  });
  const derived = await migrate([], { DATABASE_URL: 'postgresql://a@127.0.0.1:1/none' });
  expect(derived).toMatchObject({ code: 1, err: expect.stringMatching(/DATABASE_APP_URL: is needed/) });
});
