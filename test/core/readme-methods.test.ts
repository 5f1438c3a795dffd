import { readFileSync } from 'node:fs';
import { expect, test } from '@jest/globals';
import { catalogue, methodsTable } from '../../src/core/catalogue.ts';

const readme = readFileSync(new URL('../../README.md', import.meta.url), 'utf8');

test('the README shows the table of methods as the catalogue has it', () => {
  const begin = '<!-- methods:begin -->';
  const end = '<!-- methods:end -->';
  expect(readme.split(begin)).toHaveLength(2);
  expect(readme.split(end)).toHaveLength(2);
  expect(readme.slice(readme.indexOf(begin) + begin.length, readme.indexOf(end)).trim()).toBe(methodsTable());
});

test('the table has a row per method with unit, source and checks', () => {
  const lines = methodsTable().split('\n');
  expect(lines).toHaveLength(catalogue.length + 2);
  for (const { id, checkedAgainst } of catalogue) {
    const row = lines.find((line) => line.includes(`(\`${id}\`)`));
    const cells = row!.split('|').map((cell) => cell.trim());
    expect(cells).toHaveLength(7);
    expect(cells.slice(1, -1).every((cell) => cell.length > 0)).toBe(true);
    for (const check of checkedAgainst) expect(cells[5]).toContain(check);
  }
});
