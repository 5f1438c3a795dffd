import { runInNewContext } from 'node:vm';
import { expect, test } from '@jest/globals';
import { coreExports, coreFiles, coreSource, docBlocks, methodFiles } from './core-files.ts';

/** Every line of a doc block that shows a call and its result. */
const shown = coreFiles().flatMap((file) =>
  [...coreSource(file).matchAll(/^(?:.*@example)? *\*? ?(\S.*?); \/\/ => (.+?)(?: \*\/)?$/gm)].map((match) => ({
    file,
    call: match[1]!,
    result: match[2]!,
  })),
);

const scope: Record<string, unknown> = {};
for (const file of coreFiles()) Object.assign(scope, await coreExports(file));

test.each(shown)('$file: $call', ({ call, result }) => {
  expect(close(runInNewContext(call, { ...scope }), runInNewContext(`(${result})`, {}))).toBe('');
});

test('every documented function has an example that is run', () => {
  for (const file of methodFiles()) {
    for (const { name, text } of docBlocks(file)) {
      if (!text.includes('@see')) continue;
      expect(shown.some((example) => example.file === file && example.call.includes(`${name}(`))).toBe(true);
    }
  }
  expect(shown.length).toBeGreaterThan(60);
});

test('a wrong example would be noticed', () => {
  expect(close([1, NaN, { a: 2 }], [1, NaN, { a: 2.0000001 }])).toBe('');
  expect(close([1, NaN], [1, 2])).not.toBe('');
  expect(close(1.001, 1)).not.toBe('');
  expect(close({ a: 1, b: 2 }, { a: 1 })).not.toBe('');
});

/** Empty if the two agree to 1e-6 of their size, else where they do not. */
function close(actual: unknown, expected: unknown, at = 'result'): string {
  if (typeof actual === 'number' && typeof expected === 'number') {
    if (Number.isNaN(expected)) return Number.isNaN(actual) ? '' : `${at}: ${actual} instead of NaN`;
    const off = Math.abs(actual - expected);
    return off <= 1e-6 * Math.max(1, Math.abs(expected)) ? '' : `${at}: ${actual} instead of ${expected}`;
  }
  if (typeof actual === 'object' && typeof expected === 'object' && actual !== null && expected !== null) {
    const keys = Object.keys(actual);
    if (keys.join() !== Object.keys(expected).join()) return `${at}: holds ${keys.join()}`;
    return keys
      .map((key) => close(valueOf(actual, key), valueOf(expected, key), `${at}.${key}`))
      .filter((part) => part !== '')
      .join('; ');
  }
  return actual === expected ? '' : `${at}: ${String(actual)} instead of ${String(expected)}`;
}

function valueOf(holder: object, key: string): unknown {
  return (holder as Record<string, unknown>)[key];
}
