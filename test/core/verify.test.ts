import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { expect, test } from '@jest/globals';
import { catalogue } from '../../src/core/catalogue.ts';
import { core } from '../verify/core.ts';
import { readPublished } from '../verify/published.ts';
import type { Row } from '../verify/rows.ts';
import { buildRows } from '../verify/rows.ts';
import { coreExports } from './core-files.ts';

const works = readPublished();
const rows = buildRows(core, works);
const script = fileURLToPath(new URL('../verify.ts', import.meta.url));

function verify(...args: string[]): { status: number | null; stdout: string; stderr: string } {
  return spawnSync(process.execPath, [script, ...args], { encoding: 'utf8', maxBuffer: 64 * 1024 * 1024 });
}

test.each(rows)('$id $method agrees with $source', (row) => {
  expect(row.computed).toEqual(row.ok ? row.computed : row.expected);
  expect(row.ok).toBe(true);
});

test('every owned check is there, and no two rows are the same', () => {
  const ids = new Set(rows.map((row) => row.id));
  const owned = [
    ...series('SR', 1, 2, 3, 4, 5, 6, 7, 10, 11, 12, 13, 14, 15),
    ...series('BA', 1, 2, 3, 4, 5, 6, 7),
    ...series('ED', 1, 2, 3, 4),
    ...series('LU', 1, 2, 5, 6),
    ...series('AC', 1, 2, 3, 4, 5, 6, 7, 9, 10, 11),
    ...series('BAN', 1, 2, 3, 4, 5, 7, 8, 9, 10, 11, 12, 13, 14, 16, 17),
    ...series('ST', 3),
    ...series('RJ', 1, 2, 3),
    ...series('LOAD', 3),
  ];
  for (const id of owned) expect(ids).toContain(id);
  const written = rows.map((row) => JSON.stringify([row.id, row.from, row.input, row.expected, row.source]));
  expect(new Set(written).size).toBe(written.length);
  expect(rows.length).toBeGreaterThanOrEqual(45);
});

test('no input holds the number that is expected', () => {
  const holding = rows.filter((row) => typeof row.expected === 'number' && row.expected !== 0 && holds(row.input, row));
  expect(holding.map((row) => row.id)).toEqual([]);
});

test('every row names a function that exists, and a method that names the row', async () => {
  for (const row of rows) {
    const [file, name] = row.from.replace('src/core/', '').split('#') as [string, string];
    expect(typeof (await coreExports(file))[name]).toBe('function');
    const method = catalogue.find((one) => one.from === row.from);
    expect([row.method, method!.checkedAgainst]).toEqual([method!.id, expect.arrayContaining([row.id])]);
    expect(row.source.length * row.provenance.length).toBeGreaterThan(0);
  }
  // ED-04 counts minutes in zones on its way to the load.
  const also = ['edwards-zone-minutes ED-04'];
  for (const { id, checkedAgainst } of catalogue) {
    for (const check of checkedAgainst.filter((one) => !also.includes(`${id} ${one}`))) {
      expect(rows.map((row) => `${row.method} ${row.id}`)).toContain(`${id} ${check}`);
    }
  }
});

test('the command prints the counted rows as JSON, or a table that ends with the counts', () => {
  const json = verify('--json');
  expect(json.status).toBe(0);
  expect(JSON.parse(json.stdout)).toEqual(JSON.parse(JSON.stringify(rows)));
  const table = verify();
  expect(table.status).toBe(0);
  expect(table.stdout.trimEnd().split('\n').at(-1)).toBe(`${rows.length} checks, ${rows.length} pass, 0 off`);
  for (const id of ['SR-16', 'BA-09', 'BA-10', 'LU-07', 'AC-12', 'AC-13', 'BAN-18', 'BAN-19']) {
    expect(table.stdout).toContain(`\n${id}  `);
    expect(rows.map((row) => row.id)).not.toContain(id);
  }
});

test('the command explains itself and refuses what it does not know', () => {
  expect(verify('--help').stdout).toContain('verify');
  const refused = verify('--xml');
  expect(refused.status).toBe(1);
  expect(refused.stderr).toContain('--xml');
});

function series(prefix: string, ...numbers: number[]): string[] {
  return numbers.map((number) => `${prefix}-${String(number).padStart(2, '0')}`);
}

function holds(input: unknown, row: Row): boolean {
  if (typeof input === 'number') return Math.abs(input - (row.expected as number)) <= row.tolerance;
  return typeof input === 'object' && input !== null && Object.values(input).some((one) => holds(one, row));
}
