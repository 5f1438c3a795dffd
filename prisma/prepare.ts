import { PgBoss } from 'pg-boss';
import type pg from 'pg';
import { databaseAppUrl } from '../src/platform/database-url.ts';
import { UnavailableError } from '../src/platform/errors.ts';
import { ensureAppRole, grantAppRole } from './app-role.ts';
import { withLock } from './lock.ts';
import { applyMigrations, ownMigrationsDir } from './migrate.ts';
import { QUEUE_SCHEMA } from './queue-schema.ts';

export interface PrepareOptions {
  /** The owner's connection. */
  ownerUrl: string;
  /** The connection of API and worker where it is not to be derived from the owner's (DATABASE_APP_URL). */
  appUrl?: string | undefined;
  log?: (line: string) => void;
}

const oldestMajor = 15;

/**
 * Brings a database to where the services can start: migrations, the queue's tables, the role that owns nothing and
 * what it may do. Changes nothing where all is there; any number of processes may call it at once.
 */
export async function prepareDatabase(options: PrepareOptions): Promise<{ appUrl: string }> {
  const log = options.log ?? (() => undefined);
  const { ownerUrl } = options;
  const appUrl = databaseAppUrl({ DATABASE_URL: ownerUrl, DATABASE_APP_URL: options.appUrl });
  await withLock(ownerUrl, 'loadweir prepare', async (client) => {
    await refuseUnfitServer(client);
    await applyMigrations({ url: ownerUrl, migrationsDir: ownMigrationsDir(), log });
    await installQueue(ownerUrl);
    await ensureAppRole(client, appUrl, { derived: options.appUrl === undefined, log });
    await grantAppRole(client, appUrl);
  });
  return { appUrl };
}

async function refuseUnfitServer(client: pg.Client): Promise<void> {
  const { rows } = await client.query<{ version: number; encoding: string }>(
    "select current_setting('server_version_num')::int as version, current_setting('server_encoding') as encoding",
  );
  const { version = 0, encoding = '' } = rows[0] ?? {};
  if (version < oldestMajor * 10_000) throw new UnavailableError(`PostgreSQL ${oldestMajor} or newer is needed.`);
  if (encoding !== 'UTF8') throw new UnavailableError(`The database's encoding is ${encoding}; it has to be UTF8.`);
}

/** The queue's tables belong to the owner; the services start their queue with `migrate: false`. */
async function installQueue(ownerUrl: string): Promise<void> {
  const boss = new PgBoss({
    connectionString: ownerUrl,
    schema: QUEUE_SCHEMA,
    max: 2,
    migrate: true,
    supervise: false,
    schedule: false,
  });
  boss.on('error', () => undefined);
  await boss.start();
  await boss.stop({ graceful: false });
}
