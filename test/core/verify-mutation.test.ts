import { expect, test } from '@jest/globals';
import type { Core, CoreFunction } from '../verify/core.ts';
import { core } from '../verify/core.ts';
import { readPublished } from '../verify/published.ts';
import type { Row } from '../verify/rows.ts';
import { buildRows } from '../verify/rows.ts';

const works = readPublished();
const rows = buildRows(core, works);
const numeric = rows.filter((row) => typeof row.expected === 'number');
const tight = numeric.filter((row) => row.expected !== 0 && row.tolerance < 0.01 * Math.abs(Number(row.expected)));
const loose = numeric.filter((row) => !tight.includes(row));

test('the rows fall into kinds that can each be put to the test', () => {
  expect(tight.length).toBeGreaterThan(80);
  expect(loose.length).toBeGreaterThan(3);
  expect(rows.filter((row) => row.expected === true).length).toBeGreaterThan(1);
  expect(rows.filter((row) => row.expected === 'undefined').length).toBeGreaterThan(5);
  expect(rows.filter((row) => row.expected === 'rejected').length).toBeGreaterThan(5);
});

test('with every function 1 % too high, every row that is tighter than that is off', () => {
  const wrong = rebuilt(wrapAll(numbers((value) => value * 1.01)));
  expect(tight.map((row) => wrong[rows.indexOf(row)]!).filter((row) => row.ok)).toEqual([]);
});

test.each(names(tight))('with %s alone 1 % too high, its rows are off', (name) => {
  const wrong = rebuilt(
    wrapOne(
      name,
      numbers((value) => value * 1.01),
    ),
    name,
  );
  expect(wrong.filter((row) => isAmong(tight, row) && row.ok)).toEqual([]);
  expect(wrong.some((row) => isAmong(tight, row))).toBe(true);
});

test.each(loose.map((row) => ({ row, id: row.id, from: row.from, expected: row.expected })))(
  '$id of $from, expected $expected: a shift of twice the tolerance is off',
  ({ row }) => {
    const shift = row.tolerance === 0 ? 1 : 2 * row.tolerance;
    const wrong = rebuilt(
      wrapOne(
        nameOf(row),
        numbers((value) => value + shift),
      ),
      nameOf(row),
    );
    const same = wrong.filter((one) => key(one) === key(row));
    expect(same.length).toBeGreaterThan(0);
    expect(same.filter((one) => one.ok)).toEqual([]);
  },
);

test('true rows fail when the functions turn their results about', () => {
  const wrong = rebuilt(wrapAll(numbers((value) => -value)));
  const truths = rows.flatMap((row, index) => (row.expected === true ? [wrong[index]!] : []));
  expect(truths.filter((row) => row.ok)).toEqual([]);
});

test('undefined rows fail when the functions give 0 for it', () => {
  const wrong = rebuilt(wrapAll(numbers((value) => (Number.isNaN(value) ? 0 : value))));
  const gaps = rows.flatMap((row, index) => (row.expected === 'undefined' ? [wrong[index]!] : []));
  expect(gaps.filter((row) => row.ok)).toEqual([]);
});

test('rejected rows fail when the functions take what they must refuse', () => {
  const wrong = rebuilt(
    wrapAll((fn) => (...args) => {
      try {
        return fn(...args);
      } catch {
        return 0;
      }
    }),
  );
  const refusals = rows.flatMap((row, index) => (row.expected === 'rejected' ? [wrong[index]!] : []));
  expect(refusals.filter((row) => row.ok)).toEqual([]);
});

test('an error that is no refusal does not pass for one', () => {
  const wrong = rebuilt(
    wrapAll(() => () => {
      throw new TypeError('broken');
    }),
  );
  expect(wrong.filter((row) => row.ok)).toEqual([]);
});

type Wrap = (fn: CoreFunction) => CoreFunction;

/** Changes every number in what a function returns. */
function numbers(change: (value: number) => number): Wrap {
  const deep = (value: unknown): unknown => {
    if (typeof value === 'number') return change(value);
    if (Array.isArray(value)) return value.map(deep);
    if (typeof value !== 'object' || value === null) return value;
    return Object.fromEntries(Object.entries(value).map(([name, one]) => [name, deep(one)]));
  };
  return (fn) =>
    (...args) =>
      deep(fn(...args));
}

function wrapAll(wrap: Wrap): Core {
  return Object.fromEntries(Object.entries(core).map(([name, fn]) => [name, wrap(fn)]));
}

function wrapOne(name: string, wrap: Wrap): Core {
  return { ...core, [name]: wrap(core[name]!) };
}

/** The rows computed anew, of one function or of all. */
function rebuilt(wrong: Core, name?: string): Row[] {
  if (name === undefined) return buildRows(wrong, works);
  const some = works.map((work) => ({
    ...work,
    checks: (work.checks ?? []).filter((check) => check.function === name),
  }));
  return buildRows(wrong, some);
}

function isAmong(some: readonly Row[], row: Row): boolean {
  return some.some((one) => key(one) === key(row));
}

/** What of a row does not depend on the functions. */
function key({ id, from, source, expected, tolerance }: Row): string {
  return JSON.stringify([id, from, source, expected, tolerance]);
}

function nameOf(row: Row): string {
  return row.from.split('#')[1]!;
}

function names(some: readonly Row[]): string[] {
  return [...new Set(some.map(nameOf))];
}
