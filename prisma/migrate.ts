import { fork } from 'node:child_process';
import { existsSync } from 'node:fs';
import { extname } from 'node:path';
import { fileURLToPath } from 'node:url';
import { UnavailableError } from '../src/platform/errors.ts';
import type { MigrateAnswer, MigrateOrder } from './migrate-main.ts';

export interface ApplyMigrationsOptions {
  /** The owner's connection. */
  url: string;
  migrationsDir: string;
  log?: (line: string) => void;
}

/** The project's own migrations, whether this file runs from source or from the build. */
export function ownMigrationsDir(): string {
  const beside = fileURLToPath(new URL('./migrations', import.meta.url));
  return existsSync(beside) ? beside : fileURLToPath(new URL('../../prisma/migrations', import.meta.url));
}

/**
 * Applies what is new in the folder, in order, each migration in one transaction, and returns the names. Any number of
 * processes may call it at once. The engine keeps timers and a lock on its connection, so it runs in a process of its
 * own and ends with it.
 */
export async function applyMigrations(options: ApplyMigrationsOptions): Promise<string[]> {
  const entry = fileURLToPath(new URL(`./migrate-main${extname(import.meta.url)}`, import.meta.url));
  const child = fork(entry, { execArgv: ['--disable-warning=ExperimentalWarning'] });
  const answer = await new Promise<MigrateAnswer>((resolve, reject) => {
    child.once('message', (message) => resolve(message as MigrateAnswer));
    child.once('error', reject);
    child.once('exit', (code, signal) => reject(new Error(`The migration process ended (${signal ?? code}).`)));
    // Not as an argument: the URL carries a password, and arguments can be read by everyone on the machine.
    child.send({ url: options.url, migrationsDir: options.migrationsDir } satisfies MigrateOrder);
  });
  child.disconnect();
  for (const line of answer.notes) options.log?.(line);
  if (answer.error !== undefined) throw new UnavailableError(answer.error, { code: 'migrations-not-applied' });
  for (const name of answer.applied) options.log?.(`Migration ${name} applied.`);
  return answer.applied;
}
