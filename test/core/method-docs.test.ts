import { expect, test } from '@jest/globals';
import { catalogue } from '../../src/core/catalogue.ts';
import { coreExports, coreFiles, coreSource, docBlocks, HELPERS, methodFiles, PARTS } from './core-files.ts';

const documented = methodFiles().flatMap(docBlocks);

test('the doc blocks are found', () => {
  expect(documented.length).toBeGreaterThan(55);
  for (const file of methodFiles()) expect([file, docBlocks(file).length]).not.toEqual([file, 0]);
});

test.each(documented.filter(({ name }) => name !== 'checkBounds'))(
  '$file: $name says its unit, equation or range, limits and source',
  ({ text }) => {
    expect(text).toMatch(/@param/);
    expect(text).toMatch(/@returns/);
    expect(text).toMatch(/\[[^\]]+\]|name of|the domain|'reference'|in words|stretches|episodes|null or/);
    expect(text).toMatch(/@remarks (Equation|Range): |\[unit of the values\]/);
    expect(text).toMatch(/@see \S+/);
    expect(text).toMatch(/@example/);
  },
);

test.each(documented.filter(({ text }) => text.includes('@remarks')))(
  '$file: $name keeps the order of its doc block',
  ({ text }) => {
    const marks = ['@param', '@returns', '@throws', '@remarks', '@see', '@example'];
    const places = marks.map((mark) => text.indexOf(mark)).filter((place) => place >= 0);
    expect(places).toEqual([...places].sort((a, b) => a - b));
  },
);

test('every exported function of a method file stands in the catalogue, and nothing else does', async () => {
  const exported: string[] = [];
  for (const file of methodFiles()) {
    for (const [name, value] of Object.entries(await coreExports(file))) {
      if (typeof value === 'function' && !PARTS.includes(name)) exported.push(`src/core/${file}#${name}`);
    }
  }
  expect(catalogue.map((method) => method.from).sort()).toEqual(exported.sort());
});

test('the source of the catalogue is one the doc block names', () => {
  for (const { from, source } of catalogue) {
    const block = documented.find(({ file, name }) => from === `src/core/${file}#${name}`);
    const see = block!.text.slice(block!.text.indexOf('@see'));
    const key = /^.*?\d{4}/.exec(source)?.[0] ?? source.split(',')[0]!;
    expect(`${from}: ${see}`).toContain(key);
  }
});

test('files stay short and helpers exist', () => {
  for (const file of coreFiles()) expect([file, coreSource(file).split('\n').length <= 121]).toEqual([file, true]);
  for (const file of Object.keys(HELPERS)) expect(coreFiles()).toContain(file);
});
