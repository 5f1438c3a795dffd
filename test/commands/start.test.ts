import { afterEach, describe, expect, it } from '@jest/globals';
import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import pg from 'pg';
import { createTestDatabase } from '../support/database.ts';
import { command, descendants, isAlive, pause, temporaryFolder, until } from './support/command.ts';
import type { Command } from './support/command.ts';

const cleanUp: (() => Promise<void> | void)[] = [];
afterEach(async () => {
  for (const step of cleanUp.splice(0).reverse()) await step();
});

function folder(): string {
  const temporary = temporaryFolder();
  cleanUp.push(() => temporary.remove());
  return temporary.path;
}

function start(env: Record<string, string>): Command {
  const started = command('src/commands/start.js', [], { PORT: '0', ...env });
  cleanUp.push(async () => {
    for (const pid of [started.pid, ...descendants(started.pid)]) if (isAlive(pid)) process.kill(pid, 'SIGKILL');
    await started.finished;
  });
  return started;
}

describe('npm start', () => {
  it('answers the request under way at SIGTERM, then ends with everything it started', async () => {
    const database = await createTestDatabase();
    cleanUp.push(() => database.drop());
    const DATA_DIR = folder();
    const running = start({ DATABASE_URL: database.ownerUrl, DATABASE_APP_URL: database.appUrl, DATA_DIR });
    const [, url] = await running.says(/listens at (http:\S+)/);
    await running.says(/Ctrl-C/);
    const keyFile = join(DATA_DIR, 'operator-key');
    expect(running.output()).toContain(keyFile);
    expect(running.output()).toContain(`${url}/docs`);
    expect(statSync(keyFile).mode & 0o777).toBe(0o600);
    const processes = descendants(running.pid);
    expect(processes.length).toBeGreaterThanOrEqual(2);
    expect((await fetch(`${url}/health/ready`)).status).toBe(200);

    const client = new pg.Client({ connectionString: database.ownerUrl });
    await client.connect();
    await client.query('begin; lock table club in access exclusive mode');
    const answer = fetch(`${url}/v1/clubs`, {
      method: 'POST',
      headers: { authorization: `Bearer ${readFileSync(keyFile, 'utf8').trim()}`, 'content-type': 'application/json' },
      body: JSON.stringify({ name: 'Late', admin: { name: 'Ada', email: 'ada@example.org' } }),
    });
    await until(async () => (await waiting(client)) === 1);
    running.signal('SIGTERM');
    await running.says(/answered first/);
    await pause(300);
    await client.query('commit');
    expect((await answer).status).toBe(201);
    expect(await running.finished).toMatchObject({ code: 0, signal: null });
    expect(processes.filter(isAlive)).toEqual([]);
    const { rows } = await client.query<{ name: string }>('select name from club');
    await client.end();
    expect(rows).toEqual([{ name: 'Late' }]);
  });

  it('leaves nothing running when it is killed, the embedded database included', async () => {
    const DATA_DIR = folder();
    const running = start({ DATA_DIR, LOADWEIR_OPERATOR_KEY: 'a key of twenty-four characters' });
    const [, url] = await running.says(/listens at (http:\S+)/);
    await running.says(/Ctrl-C/);
    expect(running.output()).not.toContain('operator-key');
    expect((await fetch(`${url}/health/live`)).status).toBe(200);
    const processes = [...descendants(running.pid), databaseServer(DATA_DIR)];
    expect(processes.filter(isAlive).length).toBeGreaterThanOrEqual(4);
    running.signal('SIGKILL');
    await running.finished;
    await until(() => !processes.some(isAlive), 25_000);
    await expect(fetch(`${url}/health/live`)).rejects.toThrow();
  });

  it('names every variable that is wrong and starts nothing', async () => {
    const running = start({
      PORT: 'many',
      LOG_LEVEL: 'loud',
      DATABASE_URL: 'mysql://x',
      LOADWEIR_OPERATOR_KEY: 'short',
    });
    const { code, stderr, stdout } = await running.finished;
    expect(code).toBe(1);
    for (const name of ['PORT', 'LOG_LEVEL', 'DATABASE_URL', 'LOADWEIR_OPERATOR_KEY']) expect(stderr).toContain(name);
    expect(stdout).toBe('');
  });

  it('explains itself and refuses arguments it does not know', async () => {
    const help = await command('src/commands/start.js', ['--help'], {}).finished;
    expect(help).toMatchObject({ code: 0, stderr: '' });
    expect(help.stdout).toContain('DATABASE_URL');
    expect(await command('src/commands/start.js', ['--fast'], {}).finished).toMatchObject({ code: 2, stdout: '' });
  });
});

async function waiting(client: pg.Client): Promise<number> {
  const { rows } = await client.query<{ count: string }>(
    `select count(*) from pg_locks where not granted and database = (select oid from pg_database where datname = current_database())`,
  );
  return Number(rows[0]!.count);
}

/** The server is a daemon: its number stands in its own folder. */
function databaseServer(dataDir: string): number {
  const cluster = readdirSync(dataDir).find((name) => name.startsWith('postgresql-'))!;
  return Number(readFileSync(join(dataDir, cluster, 'postmaster.pid'), 'utf8').split('\n')[0]);
}
