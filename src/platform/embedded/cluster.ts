import { randomBytes } from 'node:crypto';
import {
  appendFileSync,
  chownSync,
  existsSync,
  mkdirSync,
  readdirSync,
  renameSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { dirname, join } from 'node:path';
import { runAs } from './account.ts';
import type { Account } from './account.ts';
import type { Binaries } from './binaries.ts';
import { commandLine } from './server-process.ts';

export const OWNER = 'loadweir_owner';
export const DATABASE = 'loadweir';
export const PASSWORD_FILE = 'loadweir-owner-password';

// Reached over 127.0.0.1 only. The server's log keeps no values: details and statements of errors carry health data.
const settings = `
listen_addresses = '127.0.0.1'
unix_socket_directories = ''
timezone = 'UTC'
log_timezone = 'UTC'
log_error_verbosity = terse
log_min_error_statement = panic
log_checkpoints = off
jit = off
`;

/** Builds a cluster beside its place and moves it there when it is whole, so that a start cut short leaves none. */
export async function buildCluster(
  cluster: string,
  binaries: Binaries,
  account: Account | undefined,
  durable: boolean,
): Promise<void> {
  removeAbandoned(dirname(cluster));
  const building = join(dirname(cluster), `building-${process.pid}-${randomBytes(4).toString('hex')}`);
  const data = join(building, 'data');
  const password = randomBytes(24).toString('base64url');
  try {
    mkdirSync(building, { mode: 0o700 });
    writeAs(account, join(building, 'password'), password);
    if (account !== undefined) chownSync(building, account.uid, account.gid);
    await mustRun(account, binaries.initdb, [
      ...['--pgdata', data, '--username', OWNER, '--pwfile', join(building, 'password')],
      ...['--auth', 'scram-sha-256', '--encoding=UTF8', '--locale-provider=builtin', '--builtin-locale=C.UTF-8'],
      ...['--locale=C', '--no-instructions', ...(durable ? [] : ['--no-sync'])],
    ]);
    appendFileSync(join(data, 'postgresql.conf'), settings);
    writeAs(account, join(data, PASSWORD_FILE), password);
    const single = ['--single', '-D', data, ...(durable ? [] : ['-F']), 'postgres'];
    await mustRun(account, binaries.postgres, single, `create database ${DATABASE}\n`);
    moveIntoPlace(data, cluster);
  } finally {
    rmSync(building, { recursive: true, force: true });
  }
}

async function mustRun(account: Account | undefined, file: string, args: string[], input = ''): Promise<void> {
  const { code, output } = await runAs(account, file, args, input);
  if (code !== 0) throw new Error(`${file} failed (${code}):\n${output}`);
}

function writeAs(account: Account | undefined, file: string, text: string): void {
  writeFileSync(file, text, { mode: 0o600 });
  if (account !== undefined) chownSync(file, account.uid, account.gid);
}

function moveIntoPlace(data: string, cluster: string): void {
  try {
    renameSync(data, cluster);
  } catch (error) {
    // Another process was faster with the same: its cluster stays, ours goes.
    if (!existsSync(join(cluster, 'PG_VERSION'))) throw error;
  }
}

/** What processes that were killed while building left behind. */
function removeAbandoned(folder: string): void {
  for (const name of readdirSync(folder)) {
    const pid = /^building-(\d+)-/.exec(name)?.[1];
    if (pid === undefined || Number(pid) === process.pid || commandLine(Number(pid)) !== undefined) continue;
    rmSync(join(folder, name), { recursive: true, force: true });
  }
}
