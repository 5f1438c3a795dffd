import { randomBytes } from 'node:crypto';
import { execute, onDatabase } from './global-setup.ts';
import type { TestServer } from './global-setup.ts';

export interface TestDatabase {
  name: string;
  /** The owner's connection: for arranging what services may not, and for looking past row-level security. */
  ownerUrl: string;
  /** The services' connection: the role that owns nothing. */
  appUrl: string;
  /** Refused while a connection is open: a test file that leaks one fails here. */
  drop(): Promise<void>;
}

/** A migrated database of one's own, cloned from the run's template; empty: true gives one without any table. */
export async function createTestDatabase(options: { empty?: boolean } = {}): Promise<TestDatabase> {
  const server = testServer();
  const name = `loadweir_test_${randomBytes(6).toString('hex')}`;
  await execute(server.ownerUrl, `create database ${name} template ${options.empty ? 'template1' : server.template}`);
  return {
    name,
    ownerUrl: onDatabase(server.ownerUrl, name),
    appUrl: onDatabase(server.appUrl, name),
    drop: () => execute(server.ownerUrl, `drop database if exists ${name}`),
  };
}

function testServer(): TestServer {
  const given = process.env.LOADWEIR_TEST_SERVER;
  if (given === undefined)
    throw new Error('This run was started without a database: see test/support/global-setup.ts.');
  return JSON.parse(given) as TestServer;
}
