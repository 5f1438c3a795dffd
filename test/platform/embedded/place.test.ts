import { chmodSync, mkdirSync, mkdtempSync, rmSync, symlinkSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterEach, beforeEach, expect, test } from '@jest/globals';
import { runAs, serverAccount } from '../../../src/platform/embedded/account.ts';
import { findBinaries } from '../../../src/platform/embedded/binaries.ts';
import { findPlace } from '../../../src/platform/embedded/place.ts';

let base: string;
const account = serverAccount();

beforeEach(() => {
  base = mkdtempSync(join(tmpdir(), 'place-'));
  chmodSync(base, 0o755);
  mkdirSync(join(base, 'closed'), { mode: 0o700 });
});

afterEach(() => rmSync(base, { recursive: true }));

test('the cluster lies in the data folder, which is made', async () => {
  const place = await findPlace(join(base, 'open', 'var'), account, 18, join(base, 'shared'));
  expect(place).toEqual({ cluster: join(base, 'open', 'var', 'postgresql-18') });
});

test("where the server's account may not enter, it lies in the shared home, for good", async () => {
  const folder = join(base, 'closed', 'var');
  const place = await findPlace(folder, account, 18, join(base, 'shared'));
  if (account === undefined) {
    // Only root needs another account; everyone else enters their own folders.
    expect(place).toEqual({ cluster: join(folder, 'postgresql-18') });
    return;
  }
  expect(place.cluster).toMatch(new RegExp(`^${base}/shared/[0-9a-f]{12}/postgresql-18$`));
  expect(place.note).toContain(place.cluster);
  chmodSync(join(base, 'closed'), 0o755);
  expect((await findPlace(folder, account, 18, join(base, 'shared'))).cluster).toBe(place.cluster);
  rmSync(join(base, 'shared'), { recursive: true });
  await expect(findPlace(folder, account, 18, join(base, 'shared'))).rejects.toThrow(/which is gone/);
});

test('a cluster that is there but can no longer be entered is not silently replaced by an empty one', async () => {
  const folder = join(base, 'closed', 'var');
  mkdirSync(join(folder, 'postgresql-18'), { recursive: true });
  const place = findPlace(folder, account, 18, join(base, 'shared'));
  if (account === undefined) await expect(place).resolves.toEqual({ cluster: join(folder, 'postgresql-18') });
  else await expect(place).rejects.toThrow(/may not enter/);
});

test('the programs are copied where the account cannot run them in place', async () => {
  const installed = await findBinaries(undefined, join(base, 'copy'));
  const home = join(base, 'closed', 'native');
  mkdirSync(home);
  const source = dirname(dirname(installed.postgres));
  for (const part of ['bin', 'lib', 'share']) symlinkSync(join(source, part), join(home, part));
  const found = await findBinaries(account, join(base, 'copy'), { home, version: '18.4.0' });
  const expected = account === undefined ? home : join(base, 'copy', 'postgresql-18.4.0');
  expect(found).toEqual({
    initdb: join(expected, 'bin', 'initdb'),
    pgCtl: join(expected, 'bin', 'pg_ctl'),
    postgres: join(expected, 'bin', 'postgres'),
    major: 18,
  });
  expect((await runAs(account, found.postgres, ['--version'])).output).toMatch(/PostgreSQL\) 18/);
});
