import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, realpathSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { UnavailableError } from '../errors.ts';
import { canEnter } from './account.ts';
import type { Account } from './account.ts';

/** Where an account other than root can always be at home. */
export const SHARED_HOME = '/var/lib/loadweir';

export interface Place {
  /** The folder of the cluster itself; it need not exist yet. */
  cluster: string;
  note?: string;
}

/**
 * The cluster lies in the data folder, or, where the server's account cannot enter that, under /var/lib/loadweir. The
 * data folder then keeps a file saying so: a folder opened up later must not look as if the data were gone.
 */
export async function findPlace(
  dataDir: string,
  account: Account | undefined,
  major: number,
  sharedHome = SHARED_HOME,
): Promise<Place> {
  mkdirSync(resolve(dataDir), { recursive: true });
  const folder = realpathSync(resolve(dataDir));
  const own = join(folder, `postgresql-${major}`);
  const pointer = join(folder, 'database-location');
  if (existsSync(pointer)) return elsewhere(readFileSync(pointer, 'utf8').trim(), folder, true);
  if (await canEnter(account, folder)) return { cluster: own };
  if (existsSync(own)) {
    throw new UnavailableError(
      `The database lies in ${own}, but account ${account?.name ?? ''} may not enter ${folder}.`,
    );
  }
  const home = join(sharedHome, createHash('sha256').update(folder).digest('hex').slice(0, 12));
  mkdirSync(home, { recursive: true, mode: 0o755 });
  const cluster = join(home, `postgresql-${major}`);
  writeFileSync(pointer, `${cluster}\n`);
  return elsewhere(cluster, folder, false);
}

function elsewhere(cluster: string, folder: string, expected: boolean): Place {
  if (expected && !existsSync(join(cluster, '..'))) {
    throw new UnavailableError(
      `The database of ${folder} was kept in ${cluster}, which is gone. Without it, remove ${folder}.`,
    );
  }
  return { cluster, note: `The database server may not enter ${folder}: its data is kept in ${cluster}.` };
}
