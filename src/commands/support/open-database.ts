import { prepareDatabase } from '../../../prisma/prepare.ts';
import { startEmbedded } from '../../platform/embedded/start-embedded.ts';
import type { Env } from '../../platform/env.ts';
import { UsageError } from './usage-error.ts';

export interface OpenDatabase {
  /** The environment with the connections the services use. */
  env: Env;
  /** Stops the embedded server if this process started it. */
  stop(): Promise<void>;
}

/**
 * The database of this installation, migrated and ready: the one in DATABASE_URL, or the embedded one under DATA_DIR,
 * which is started, or joined where another process runs it.
 */
export async function openDatabase(env: Env, log: (line: string) => void): Promise<OpenDatabase> {
  if (env.DATABASE_URL !== undefined) return prepared(env, env.DATABASE_URL, async () => undefined, log);
  if (env.DATABASE_APP_URL !== undefined) {
    throw new UsageError(
      'DATABASE_APP_URL is set and DATABASE_URL is not: migrations need the connection of the owner.',
    );
  }
  const embedded = await startEmbedded({ dataDir: env.DATA_DIR, durable: true, log });
  try {
    return await prepared(env, embedded.ownerUrl, () => embedded.stop(), log);
  } catch (error) {
    await embedded.stop();
    throw error;
  }
}

async function prepared(env: Env, ownerUrl: string, stop: () => Promise<void>, log: (line: string) => void) {
  const { appUrl } = await prepareDatabase({ ownerUrl, appUrl: env.DATABASE_APP_URL, log });
  return { env: { ...env, DATABASE_URL: ownerUrl, DATABASE_APP_URL: appUrl }, stop };
}
