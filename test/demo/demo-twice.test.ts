import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, expect, test } from '@jest/globals';
import pg from 'pg';
import { dayNumber } from '../../src/core/series/day.ts';
import { scenario } from '../../src/demo/scenario.ts';
import { startEmbedded } from '../../src/platform/embedded/start-embedded.ts';
import { command, descendants, isAlive, temporaryFolder } from '../commands/support/command.ts';
import { scenarioDays } from './support/scenario-days.ts';
import { viewOn } from './support/scenario-flags.ts';

/** The clocks go back in the squad's zone in the night before; the last complete week ended a week ago. */
const clockChange = '2026-10-25';
const lastSunday = '2026-10-18';

const cleanUp: (() => Promise<void> | void)[] = [];
afterEach(async () => {
  for (const step of cleanUp.splice(0).reverse()) await step();
});

/** Runs the demo until it stands, then presses Ctrl-C. */
async function runOnce(env: Record<string, string>): Promise<string> {
  const demo = command('src/commands/demo.js', ['--today', clockChange], env);
  cleanUp.push(async () => {
    for (const pid of [demo.pid, ...descendants(demo.pid)]) if (isAlive(pid)) process.kill(pid, 'SIGKILL');
    await demo.finished;
  });
  const [, url] = await demo.says(/The API listens at (http:\S+);/, 150_000);
  await demo.says(/Ctrl-C stops it/);
  const coach = /key of the head coach: (\S+)/.exec(demo.output())![1]!;
  const me = await fetch(`${url}/v1/me`, { headers: { authorization: `Bearer ${coach}` } });
  expect(await me.json()).toMatchObject({ roles: [{ role: 'coach' }] });
  expect((await fetch(`${url}/docs`)).status).toBe(200);
  const processes = descendants(demo.pid);
  expect(processes.length).toBeGreaterThanOrEqual(2);
  demo.signal('SIGINT');
  const { code, signal } = await demo.finished;
  expect({ code, signal }).toEqual({ code: 0, signal: null });
  expect(processes.filter(isAlive)).toEqual([]);
  return demo.output();
}

/** Rows of every table of the service; the queue's own tables keep a diary. */
async function rowCounts(dataDir: string): Promise<Record<string, number>> {
  const database = await startEmbedded({ dataDir, durable: false });
  const client = new pg.Client({ connectionString: database.ownerUrl });
  await client.connect();
  try {
    const tables = await client.query<{ name: string }>(
      "select table_name as name from information_schema.tables where table_schema = 'public' order by 1",
    );
    const counts: Record<string, number> = {};
    for (const { name } of tables.rows) {
      const { rows } = await client.query<{ n: number }>(`select count(*)::int as n from "${name}"`);
      counts[name] = rows[0]!.n;
    }
    return counts;
  } finally {
    await client.end();
    await database.stop();
  }
}

/** "name: kind days" of each flag told, counted back from the last Sunday. */
function toldFlags(output: string): string[] {
  const lines = output.matchAll(/^ {2}note +(.+?) {2,}([a-z-]+) since (\d{4}-\d{2}-\d{2}): /gm);
  return [...lines]
    .map(([, name, kind, since]) => `${name}: ${kind} ${dayNumber(lastSunday) - dayNumber(since!)}`)
    .sort();
}

/** What the core's rules say of the scenario laid out for another day, a Tuesday. */
function expectedFlags(): string[] {
  const one = scenario(1, '2026-12-01');
  const flags = one.athletes.flatMap(({ key, name }) =>
    viewOn(one, key, scenarioDays(one, key), 84).flags.map(({ kind, sinceDaysAgo }) => {
      return `${name}: ${kind === 'within' ? 'planned-overload' : kind} ${sinceDaysAgo}`;
    }),
  );
  return flags.sort();
}

test('a second run on the same day logs nothing twice and sends nothing twice', async () => {
  const folder = temporaryFolder();
  cleanUp.push(() => folder.remove());
  const env = { DATA_DIR: join(folder.path, 'data'), OUTBOX_DIR: join(folder.path, 'outbox') };
  const first = await runOnce(env);
  const mails = () => readdirSync(env.OUTBOX_DIR).filter((name) => name.endsWith('.eml'));
  const sent = mails().map((name) => ({ name, content: readFileSync(join(env.OUTBOX_DIR, name)) }));
  expect(sent).toHaveLength(1);
  expect(first).not.toContain('already sent');
  expect(expectedFlags().length).toBeGreaterThan(4);
  expect(toldFlags(first)).toEqual(expectedFlags());
  expect(statSync(join(env.DATA_DIR, 'demo', 'tokens.json')).mode & 0o777).toBe(0o600);
  const before = await rowCounts(env.DATA_DIR);
  expect(before.training_session).toBeGreaterThan(1000);

  const second = await runOnce(env);
  expect(second).toContain('already sent');
  expect(mails()).toEqual(sent.map(({ name }) => name));
  for (const { name, content } of sent) expect(readFileSync(join(env.OUTBOX_DIR, name)).equals(content)).toBe(true);
  expect(await rowCounts(env.DATA_DIR)).toEqual(before);
}, 400_000);
