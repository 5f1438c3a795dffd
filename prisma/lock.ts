import { setTimeout as sleep } from 'node:timers/promises';
import pg from 'pg';
import { UnavailableError } from '../src/platform/errors.ts';

/**
 * Runs `work` while this database's advisory lock of that name is held, on a connection of its own. It asks again and
 * again instead of waiting inside the server: a waiting statement holds a snapshot, and an index built concurrently by
 * the holder would wait for that.
 */
export async function withLock<T>(url: string, name: string, work: (client: pg.Client) => Promise<T>): Promise<T> {
  const client = new pg.Client({ connectionString: url, application_name: name, options: '-c TimeZone=UTC' });
  // The loss of this connection shows in the statements; without a listener it would end the process.
  client.on('error', () => undefined);
  await connect(client);
  try {
    while (!(await tryLock(client, name))) await sleep(100);
    return await work(client);
  } finally {
    await client.end();
  }
}

async function connect(client: pg.Client): Promise<void> {
  try {
    await client.connect();
  } catch (error) {
    const { code, message } = error as NodeJS.ErrnoException;
    // Where every address of a host fails, the error has a code and no message.
    const reason = message === '' ? (code ?? 'no reason given') : message;
    throw new UnavailableError(`The database cannot be reached: ${reason}`, { cause: error });
  }
}

async function tryLock(client: pg.Client, name: string): Promise<boolean> {
  const { rows } = await client.query<{ held: boolean }>(
    'select pg_try_advisory_lock(hashtextextended($1, 0)) as held',
    [name],
  );
  return rows[0]?.held === true;
}
