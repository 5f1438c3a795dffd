import { readFileSync } from 'node:fs';
import { describe, expect, test } from '@jest/globals';
import { readEnv } from '../../src/platform/env.ts';

const root = new URL('../../', import.meta.url);
const readme = readFileSync(new URL('README.md', root), 'utf8');
const source = readFileSync(new URL('src/platform/env.ts', root), 'utf8');
const table = readme.slice(readme.indexOf('<!-- environment:begin -->'), readme.indexOf('<!-- environment:end -->'));
const rows = [...table.matchAll(/^\| `([A-Z_]+)` \| (?:`([^`]*)`|–) \|/gm)].map(([, name, fallback]) => ({
  name,
  fallback,
}));

describe('README environment table', () => {
  test('names each variable the service reads, once and in its order', () => {
    const read = [...source.matchAll(/^ {2}([A-Z][A-Z_]+):/gm)].map(([, name]) => name);
    expect(read.length).toBeGreaterThan(10);
    expect(rows.map(({ name }) => name)).toEqual(read);
  });

  test('gives the defaults of an empty environment', () => {
    const defaults = readEnv({}) as Readonly<Record<string, unknown>>;
    for (const { name, fallback } of rows.filter((row) => row.name !== 'LOADWEIR_CLOCK_OFFSET_MS')) {
      expect([name, defaults[name!] === undefined ? undefined : String(defaults[name!])]).toEqual([name, fallback]);
    }
  });
});
