import { randomBytes } from 'node:crypto';
import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pg from 'pg';
import { prepareDatabase } from '../../prisma/prepare.ts';
import { startEmbedded } from '../../src/platform/embedded/start-embedded.ts';

/** What test files inherit through the environment of their worker process. */
export interface TestServer {
  ownerUrl: string;
  appUrl: string;
  template: string;
}

/** Undoes this set-up; called by global-teardown.ts in the same process. */
export type StopTestServer = () => Promise<void>;

/** A run of nothing but pure numbers needs no database. */
export function needsDatabase(patterns: readonly string[]): boolean {
  return patterns.length === 0 || !patterns.every((pattern) => /(^|\/)test\/(core|architecture)(\/|$)/.test(pattern));
}

/**
 * One server and one migrated template database for the whole run; test files clone the template. The server is a
 * throw-away one, or the one in DATABASE_URL, with a superuser's connection: tests make databases and powerful roles.
 */
export default async function globalSetup(config: { testPathPatterns?: { patterns: string[] } }): Promise<void> {
  if (!needsDatabase(config.testPathPatterns?.patterns ?? [])) return;
  const { url, stop } = process.env.DATABASE_URL
    ? { url: process.env.DATABASE_URL, stop: async () => undefined }
    : await startThrowAway();
  try {
    await requireSuperuser(url);
    const template = `loadweir_template_${randomBytes(4).toString('hex')}`;
    await execute(url, `create database ${template}`);
    const ownerUrl = onDatabase(url, template);
    const given = process.env.DATABASE_APP_URL;
    const prepared = await prepareDatabase({ ownerUrl, appUrl: given && onDatabase(given, template) });
    const server: TestServer = { ownerUrl: url, appUrl: prepared.appUrl, template };
    process.env.LOADWEIR_TEST_SERVER = JSON.stringify(server);
    const stopAll: StopTestServer = async () => {
      await execute(url, `drop database ${template}`);
      await stop();
    };
    Object.assign(globalThis, { stopTestServer: stopAll });
  } catch (error) {
    await stop();
    throw error;
  }
}

async function requireSuperuser(url: string): Promise<void> {
  const sql = 'select 1 / rolsuper::int from pg_roles where rolname = current_user';
  await execute(url, sql).catch((cause: unknown) => {
    throw new Error('Tests need a superuser of the server in DATABASE_URL.', { cause });
  });
}

async function startThrowAway() {
  const folder = mkdtempSync(join(tmpdir(), 'loadweir-test-'));
  // As root the server runs under another account, which has to be able to enter.
  chmodSync(folder, 0o755);
  const database = await startEmbedded({ dataDir: folder, durable: false });
  const stop = async () => {
    await database.stop();
    for (const left of [database.dataDir, folder]) rmSync(left, { recursive: true, force: true });
  };
  return { url: database.ownerUrl, stop };
}

export function onDatabase(url: string, name: string): string {
  const other = new URL(url);
  other.pathname = `/${name}`;
  return other.href;
}

export async function execute(url: string, statement: string): Promise<void> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    await client.query(statement);
  } finally {
    await client.end();
  }
}
