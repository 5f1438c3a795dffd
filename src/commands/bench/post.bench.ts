import { randomBytes, randomUUID } from 'node:crypto';
import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { extname, join } from 'node:path';
import pg from 'pg';
import { prepareDatabase } from '../../../prisma/prepare.ts';
import { readEnv, serviceEnvironment } from '../../platform/env.ts';
import { startEmbedded } from '../../platform/embedded/start-embedded.ts';
import { ServiceProcess } from '../start/service-process.ts';
import type { Bench } from './bench.types.ts';
import { RowWriter } from './row-writer.ts';

/** Own convention: 5 to 10 were measured on two shared cores, depending on what else ran on them. */
const LIMIT = 15;
const WARM_UP = 40;
const ROUNDS = 10;
const EACH = 30;

interface Place {
  url: string;
  clubId: string;
  token: string;
  /** One for the API, one for the bare inserts. */
  athletes: [string, string];
}

/**
 * How many times longer one session takes through the API than the bare inserts of the same rows, one transaction each,
 * with every commit flushed to the disk. Both take turns on one connection, so that the machine's mood hits both alike.
 */
export const postBench: Bench = {
  name: 'post',
  description: 'POST of one session through the API against bare inserts of the same rows, both with fsync on',
  async run(log) {
    const folder = mkdtempSync(join(tmpdir(), 'loadweir-bench-'));
    chmodSync(folder, 0o755);
    const database = await startEmbedded({ dataDir: folder, durable: true, log });
    const key = randomBytes(24).toString('base64url');
    try {
      const { appUrl } = await prepareDatabase({ ownerUrl: database.ownerUrl });
      const changes = { PORT: '0', LOG_LEVEL: 'warn', DATABASE_APP_URL: appUrl, LOADWEIR_OPERATOR_KEY: key };
      const entry = new URL(`../../main${extname(import.meta.url)}`, import.meta.url);
      const api = new ServiceProcess('API', entry, serviceEnvironment(readEnv(), changes));
      try {
        const { url } = await api.ready();
        return await measure(await setUp(url!, key), appUrl, log);
      } finally {
        await api.stop();
      }
    } finally {
      await database.stop();
      for (const left of [database.dataDir, folder]) rmSync(left, { recursive: true, force: true });
    }
  },
};

async function measure(place: Place, appUrl: string, log: (line: string) => void) {
  const client = new pg.Client({ connectionString: appUrl, options: '-c TimeZone=UTC' });
  await client.connect();
  try {
    let day = 0;
    const post = () => request(place, `/v1/athletes/${place.athletes[0]}/sessions`, session((day += 1)));
    const rows = new RowWriter(client, place.clubId, place.athletes);
    await rows.learn(post);
    log(`Rows of one session: ${rows.tables.join(', ')}`);
    const insert = () => rows.write();
    const times: Record<'api' | 'sql', number[]> = { api: [], sql: [] };
    for (let i = 0; i < WARM_UP; i += 1) await Promise.resolve(post()).then(insert);
    for (let round = 0; round < ROUNDS; round += 1) {
      for (let i = 0; i < EACH; i += 1) times.api.push(await timed(post));
      for (let i = 0; i < EACH; i += 1) times.sql.push(await timed(insert));
    }
    const [api, sql] = [lowerQuartile(times.api), lowerQuartile(times.sql)];
    const value = Number((api / sql).toFixed(2));
    const note = `lower quartile of ${ROUNDS * EACH}: ${api.toFixed(2)} ms through the API, ${sql.toFixed(2)} ms bare`;
    return { name: 'post', value, limit: LIMIT, unit: 'times the bare inserts', ok: value <= LIMIT, note };
  } finally {
    await client.end();
  }
}

async function setUp(url: string, operatorKey: string): Promise<Place> {
  const admin = { name: 'Bench', email: `${randomUUID()}@example.org` };
  const made = await request<{ club: { id: string }; token: { secret: string } }>(
    { url, token: operatorKey },
    '/v1/clubs',
    { name: 'Bench', admin },
  );
  const first = { url, token: made.token.secret };
  const person = { name: 'Manager', email: `${randomUUID()}@example.org`, roles: [{ role: 'manager' }] };
  const { id: personId } = await request<{ id: string }>(first, '/v1/people', person);
  const { secret } = await request<{ secret: string }>(first, `/v1/people/${personId}/tokens`, {
    label: 'bench',
    validDays: 1,
  });
  const asked = { url, token: secret };
  const { id: squadId } = await request<{ id: string }>(asked, '/v1/squads', { name: 'Bench', zone: 'UTC' });
  const athlete = async (name: string) => {
    const { id } = await request<{ id: string }>(asked, '/v1/athletes', { name, squadId, memberFrom: '2000-01-01' });
    const values = [
      { quantity: 'lt1-power', modality: 'cycling', value: 210, method: 'own', validFrom: '2000-01-01' },
      { quantity: 'critical-power', modality: 'cycling', value: 280, method: 'own', validFrom: '2000-01-01' },
    ];
    await request(asked, `/v1/athletes/${id}/thresholds`, { values });
    return id;
  };
  return { ...asked, clubId: made.club.id, athletes: [await athlete('A'), await athlete('B')] };
}

/** One session with intervals, on a day of its own. */
function session(day: number): object {
  const startedAt = new Date(Date.UTC(2010, 0, 1, 9) + day * 86_400_000).toISOString();
  const lines = [{ repetitions: 6, durationS: 240, powerW: 300, recoveryS: 180, recoveryPowerW: 120 }];
  return { startedAt, durationMin: 75, modality: 'cycling', rating: 6, content: { kind: 'intervals', lines } };
}

async function request<T>(place: { url: string; token: string }, path: string, body: object): Promise<T> {
  const response = await fetch(`${place.url}${path}`, {
    method: 'POST',
    headers: { authorization: `Bearer ${place.token}`, 'content-type': 'application/json' },
    body: JSON.stringify(body),
  });
  const text = await response.text();
  if (response.status !== 201) throw new Error(`POST ${path} answered ${response.status}: ${text}`);
  return JSON.parse(text) as T;
}

async function timed(work: () => Promise<unknown>): Promise<number> {
  const start = performance.now();
  await work();
  return performance.now() - start;
}

/** A busy machine only ever adds time: the fastest quarter says most about the work itself. */
function lowerQuartile(values: readonly number[]): number {
  return values.toSorted((a, b) => a - b)[Math.floor(values.length / 4)]!;
}
