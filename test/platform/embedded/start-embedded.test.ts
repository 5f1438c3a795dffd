import { spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { chmodSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { once } from 'node:events';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, test } from '@jest/globals';
import pg from 'pg';
import { runningServer, until } from '../../../src/platform/embedded/server-process.ts';
import { startEmbedded } from '../../../src/platform/embedded/start-embedded.ts';

let folder: string;
let cluster: string;
let children: ChildProcess[];

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'load weir ')); // with spaces, on purpose
  chmodSync(folder, 0o755);
  cluster = join(folder, 'postgresql-18');
  children = [];
});

afterEach(async () => {
  for (const child of children) child.kill('SIGKILL');
  expect(await until(() => runningServer(cluster) === undefined, 20_000)).toBe(true);
  rmSync(folder, { recursive: true });
});

async function query<T extends pg.QueryResultRow>(url: string, sql: string): Promise<T[]> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query<T>(sql)).rows;
  } finally {
    await client.end();
  }
}

/** Another process that holds the database, with an environment of nothing at all. */
async function hold(): Promise<{ child: ChildProcess; ownerUrl: string; note?: string }> {
  const entry = fileURLToPath(new URL('./holder.ts', import.meta.url));
  const child = spawn(process.execPath, [entry, folder], { env: {}, stdio: ['ignore', 'pipe', 'inherit'] });
  children.push(child);
  const [line] = (await once(child.stdout, 'data')) as [Buffer];
  return { child, ...(JSON.parse(line.toString()) as { ownerUrl: string; note?: string }) };
}

function watchdogs(): number[] {
  return readdirSync(cluster)
    .flatMap((name) => /^loadweir-watchdog\.(\d+)$/.exec(name)?.[1] ?? [])
    .map(Number);
}

async function ended(child: ChildProcess, signal: NodeJS.Signals): Promise<void> {
  child.kill(signal);
  await once(child, 'exit');
}

describe('startEmbedded', () => {
  test('keeps what was written from one start to the next, and a second caller attaches', async () => {
    const first = await startEmbedded({ dataDir: folder, durable: true });
    expect(first).toMatchObject({ dataDir: cluster });
    expect(first.note).toBeUndefined();
    await query(first.ownerUrl, 'create table kept as select 7 as x');
    const second = await startEmbedded({ dataDir: folder, durable: true });
    expect(second.ownerUrl).toBe(first.ownerUrl);
    expect(second.note).toMatch(/belongs to another process/);
    await second.stop();
    expect(await query(first.ownerUrl, 'select x from kept')).toEqual([{ x: 7 }]);
    await first.stop();
    await first.stop();
    expect(runningServer(cluster)).toBeUndefined();
    expect(watchdogs()).toEqual([]);
    const again = await startEmbedded({ dataDir: folder, durable: true });
    expect(await query(again.ownerUrl, 'select x from kept')).toEqual([{ x: 7 }]);
    await again.stop();
  });

  test('the same database whatever the environment: UTF-8, sorted by code point, in UTC, over 127.0.0.1 only', async () => {
    const { ownerUrl } = await hold();
    const settings = ['server_encoding', 'timezone', 'listen_addresses', 'unix_socket_directories', 'data_checksums'];
    const shown = settings.map((name) => `current_setting('${name}') as ${name}`).join(', ');
    expect(await query(ownerUrl, `select ${shown}`)).toEqual([
      {
        server_encoding: 'UTF8',
        timezone: 'UTC',
        listen_addresses: '127.0.0.1',
        unix_socket_directories: '',
        data_checksums: 'on',
      },
    ]);
    expect(
      await query(ownerUrl, 'select datlocprovider, datlocale from pg_database where datname = current_database()'),
    ).toEqual([{ datlocprovider: 'b', datlocale: 'C.UTF-8' }]);
    expect(await query(ownerUrl, "select upper('ä') as upper")).toEqual([{ upper: 'Ä' }]);
    const wrong = new URL(ownerUrl);
    wrong.password = 'guessed';
    await expect(query(wrong.href, 'select 1')).rejects.toMatchObject({ code: '28P01' });
  });

  test('nothing is left running when the starter is killed', async () => {
    const { child, ownerUrl } = await hold();
    await query(ownerUrl, 'create table kept as select 7 as x');
    const [watchdog] = watchdogs();
    await ended(child, 'SIGKILL');
    expect(await until(() => runningServer(cluster) === undefined, 20_000)).toBe(true);
    expect(await until(() => !isAlive(watchdog ?? 0), 5000)).toBe(true);
    const again = await startEmbedded({ dataDir: folder, durable: false });
    expect(await query(again.ownerUrl, 'select x from kept')).toEqual([{ x: 7 }]);
    await again.stop();
  });

  test('two processes that start at the same moment share one server', async () => {
    const both = await Promise.all([hold(), hold()]);
    expect(both[0].ownerUrl).toBe(both[1].ownerUrl);
    const owners = both.filter(({ note }) => note === undefined);
    expect(owners).toHaveLength(1);
    const guest = both.find(({ note }) => note !== undefined);
    if (guest === undefined || owners[0] === undefined) throw new Error('no guest');
    await ended(guest.child, 'SIGKILL');
    await query(owners[0].ownerUrl, 'select 1');
    await ended(owners[0].child, 'SIGTERM');
    expect(await until(() => runningServer(cluster) === undefined, 20_000)).toBe(true);
  });

  test('a server whose starter and watchdog were both killed is adopted', async () => {
    const { child, ownerUrl } = await hold();
    for (const watchdog of watchdogs()) process.kill(watchdog, 'SIGKILL');
    await ended(child, 'SIGKILL');
    expect(runningServer(cluster)).toMatchObject({ ready: true });
    const adopted = await startEmbedded({ dataDir: folder, durable: false });
    expect(adopted.ownerUrl).toBe(ownerUrl);
    expect(adopted.note).toBeUndefined();
    await adopted.stop();
    expect(runningServer(cluster)).toBeUndefined();
  });

  test('a lock file with the number of some other living process is no obstacle, and that process is left alone', async () => {
    const first = await startEmbedded({ dataDir: folder, durable: false });
    const lock = readFileSync(join(cluster, 'postmaster.pid'), 'utf8');
    await first.stop();
    const bystander = spawn('sleep', ['60'], { stdio: 'ignore' });
    children.push(bystander);
    writeFileSync(join(cluster, 'postmaster.pid'), lock.replace(/^\d+/, String(bystander.pid)), { mode: 0o600 });
    expect(runningServer(cluster)).toBeUndefined();
    const second = await startEmbedded({ dataDir: folder, durable: false });
    await query(second.ownerUrl, 'select 1');
    await second.stop();
    expect(bystander.exitCode ?? bystander.signalCode).toBeNull();
  });
});

function isAlive(pid: number): boolean {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8') !== '';
  } catch {
    return false;
  }
}
