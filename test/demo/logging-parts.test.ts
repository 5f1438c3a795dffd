import { mkdtempSync, rmSync, statSync } from 'node:fs';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, describe, expect, test } from '@jest/globals';
import { parse } from 'csv-parse/sync';
import { ApiClient, ApiError } from '../../src/demo/api-client.ts';
import { csv } from '../../src/demo/csv.ts';
import { startOf } from '../../src/demo/days.ts';
import { inParallel } from '../../src/demo/in-parallel.ts';
import { KeyRing } from '../../src/demo/key-ring.ts';
import { logTable } from '../../src/demo/log-table.ts';
import { scenario } from '../../src/demo/scenario.ts';

const closers: (() => void)[] = [];
afterEach(() => closers.splice(0).forEach((close) => close()));

/** A server that answers with these statuses, one after the other, and remembers the keys it was sent. */
async function answering(...statuses: number[]): Promise<{ url: string; keys: unknown[] }> {
  const keys: unknown[] = [];
  const server = createServer((request, response) => {
    keys.push(request.headers['idempotency-key']);
    const status = statuses.shift() ?? 500;
    response.writeHead(status, { 'content-type': 'application/json', connection: 'close' });
    const errors = [{ field: 'rating', value: 11, allowed: 'a number from 0 to 10' }];
    response.end(JSON.stringify(status < 400 ? { ok: true } : { type: 'urn:x:problem:rule-broken', errors }));
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  closers.push(() => server.close());
  return { url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`, keys };
}

describe('the client', () => {
  test('repeats a keyed call with the same key until it is answered', async () => {
    const { url, keys } = await answering(503, 201);
    const answer = await new ApiClient(url).post('/v1/x', { token: 't', key: 'demo-1', body: {} });
    expect(answer).toEqual({ ok: true });
    expect(keys).toEqual(['demo-1', 'demo-1']);
  });

  test('never repeats a call that could be done twice', async () => {
    const { url, keys } = await answering(503, 201);
    await expect(new ApiClient(url).post('/v1/x', { token: 't', body: {} })).rejects.toThrow(/503/);
    expect(keys).toHaveLength(1);
  });

  test('says which field was refused and what is allowed', async () => {
    const { url } = await answering(422);
    const refused = new ApiClient(url).post('/v1/x', { token: 't', key: 'k', body: {} });
    await expect(refused).rejects.toThrow('rating: 11, allowed: a number from 0 to 10');
    await expect(refused).rejects.toBeInstanceOf(ApiError);
    await expect(refused).rejects.toMatchObject({ status: 422, code: 'rule-broken' });
  });
});

describe('working in parallel', () => {
  test('does everything once and never more at a time than allowed', async () => {
    const done: number[] = [];
    let now = 0;
    let most = 0;
    await inParallel([1, 2, 3, 4, 5, 6, 7], 3, async (item) => {
      most = Math.max(most, (now += 1));
      await new Promise((resolve) => setTimeout(resolve, 5));
      now -= 1;
      done.push(item);
    });
    expect(done.sort()).toEqual([1, 2, 3, 4, 5, 6, 7]);
    expect(most).toBe(3);
  });

  test('starts nothing more after a failure and reports it', async () => {
    const begun: number[] = [];
    const work = inParallel([1, 2, 3, 4, 5, 6], 2, async (item) => {
      begun.push(item);
      await new Promise((resolve) => setTimeout(resolve, item));
      if (item === 1) throw new Error('no');
    });
    await expect(work).rejects.toThrow('no');
    expect(begun.length).toBeLessThan(5);
  });
});

test('the key ring keeps the keys of each club, for its owner only', () => {
  const folder = mkdtempSync(join(tmpdir(), 'loadweir-ring-'));
  closers.push(() => rmSync(folder, { recursive: true }));
  const file = join(folder, 'demo', 'tokens.json');
  new KeyRing(file, 'club a').keep('coach', 'secret a');
  new KeyRing(file, 'club b').keep('coach', 'secret b');
  expect(new KeyRing(file, 'club a').get('coach')).toBe('secret a');
  expect(new KeyRing(file, 'club b').get('manager')).toBeUndefined();
  expect(statSync(file).mode & 0o777).toBe(0o600);
});

test('a start is written with its day’s offset, on both sides of a clock change', () => {
  expect(startOf('2026-10-24', '07:00', 'Europe/Oslo')).toBe('2026-10-24T07:00:00+02:00');
  expect(startOf('2026-10-25', '07:00', 'Europe/Oslo')).toBe('2026-10-25T07:00:00+01:00');
  expect(startOf('2026-03-29', '07:00', 'Europe/Oslo')).toBe('2026-03-29T07:00:00+02:00');
  expect(startOf('2026-07-01', '09:30', 'America/St_Johns')).toBe('2026-07-01T09:30:00-02:30');
});

test('a table survives commas, quotes and line breaks', () => {
  const text = csv(['a', 'b'], [{ a: 'x, "y"\nz', b: 0.1 + 0.2 }, { b: null }]);
  const read = parse<Record<string, string>>(text, { columns: true });
  expect(read).toEqual([
    { a: 'x, "y"\nz', b: '0.30000000000000004' },
    { a: '', b: '' },
  ]);
});

test('the log table holds every session with its lines and sets, and no health reason', () => {
  const one = scenario(1, '2026-12-01');
  const text = logTable(one, []);
  const rows = parse<Record<string, string>>(text, { columns: true });
  const count = (type: string) => rows.filter((row) => row.type === type).length;
  const inside = one.sessions.map(({ content }) => content);
  expect(count('session')).toBe(one.sessions.length);
  expect(count('interval')).toBe(
    inside.reduce((sum, content) => sum + (content?.kind === 'intervals' ? content.lines.length : 0), 0),
  );
  expect(count('strength-set')).toBe(
    inside.reduce((sum, content) => sum + (content?.kind === 'strength' ? content.sets.length : 0), 0),
  );
  expect(count('closing')).toBe(82);
  for (const { reason, cause } of one.availability) {
    expect(text).not.toContain(reason);
    expect(text).not.toContain(cause);
  }
});
