import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, expect, test } from '@jest/globals';
import { catalogue, methodsTable } from '../../src/core/catalogue.ts';

const script = fileURLToPath(new URL('../../src/commands/method.ts', import.meta.url));
const verifyScript = fileURLToPath(new URL('../verify.ts', import.meta.url));
const folder = mkdtempSync(join(tmpdir(), 'loadweir-method-'));
afterAll(() => rmSync(folder, { recursive: true }));

/** Runs the command from source, as `npm run method` does. */
function method(...args: string[]): { status: number | null; stdout: string; stderr: string } {
  return spawnSync(process.execPath, [script, ...args], { encoding: 'utf8' });
}

function file(name: string, text: string): string {
  const path = join(folder, name);
  writeFileSync(path, text);
  return path;
}

test('lists every id with inputs, unit and source, also as JSON', () => {
  const listed = method('--list');
  expect(listed.status).toBe(0);
  for (const { id, unit, source } of catalogue) {
    expect(listed.stdout).toMatch(new RegExp(`^${id}$`, 'm'));
    expect(listed.stdout).toContain(`result: [${unit}]`);
    expect(listed.stdout).toContain(source);
  }
  const described = JSON.parse(method('--list', '--json').stdout) as { id: string; inputs: unknown[] }[];
  expect(described.map(({ id }) => id)).toEqual(catalogue.map(({ id }) => id));
  expect(described[0]!.inputs[0]).toEqual({ name: 'rating', unit: 'CR-10 units, 0 to 10', kind: 'number' });
});

test('prints the methods table of the README', () => {
  expect(method('--table').stdout.trim()).toBe(methodsTable().trim());
});

test('runs a method on a file and prints JSON; an undefined result is null', () => {
  const right = method('session-rating-load', '--input', file('a.json', '{"rating": 7, "durationMin": 120}'));
  expect([right.status, right.stdout, right.stderr]).toEqual([0, '840\n', '']);
  const equal = method('monotony-population', '--input', file('b.json', '{"days": [1, 1, 1, 1, 1, 1, 1]}'));
  expect([equal.status, equal.stdout]).toEqual([0, 'null\n']);
});

test.each([
  ['a value out of range', ['session-rating-load', '--input', 'range.json'], /rating = 11, allowed: .* 0 to 10/],
  ['a value of another kind', ['session-rating-load', '--input', 'kind.json'], /rating = "7", allowed: a number/],
  ['no JSON', ['session-rating-load', '--input', 'text.json'], /is not JSON/],
  ['no object', ['session-rating-load', '--input', 'number.json'], /holds 7, allowed: an object/],
  ['no file', ['session-rating-load', '--input', 'absent.json'], /cannot be read/],
  ['no file name', ['session-rating-load', '--input'], /file name is missing/],
  ['an unknown id', ['sesion-rating-load'], /no method "sesion-rating-load"; --list/],
  ['an unknown argument', ['--xml'], /unknown argument --xml/],
])('refuses %s on stderr with exit 1', (_, args, message) => {
  file('range.json', '{"rating": 11, "durationMin": 120}');
  file('kind.json', '{"rating": "7", "durationMin": 120}');
  file('text.json', 'rating 7');
  file('number.json', '7');
  const refused = method(...args.map((one) => (one.endsWith('.json') ? join(folder, one) : one)));
  expect([refused.status, refused.stdout]).toEqual([1, '']);
  expect(refused.stderr).toMatch(message);
  expect(refused.stderr.trimEnd().split('\n')).toHaveLength(1);
});

test('a reader that has enough ends it quietly', () => {
  for (const command of [`"${script}" --list`, `"${verifyScript}" --json`]) {
    const piped = spawnSync('sh', ['-c', `"${process.execPath}" ${command} | head -c 20`], { encoding: 'utf8' });
    expect([piped.status, piped.stdout.length, piped.stderr]).toEqual([0, 20, '']);
  }
});

test('explains itself', () => {
  for (const help of [method('--help'), method()]) {
    expect(help.status).toBe(0);
    expect(help.stdout).toContain('--list');
  }
  expect(method('strain').stdout).toContain('weekLoad [load units]');
});
