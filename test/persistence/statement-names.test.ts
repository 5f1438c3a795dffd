import { expect, test } from '@jest/globals';
import { statementNames } from '../../src/persistence/statement-names.ts';

const statement = (sql: string, args = 1) => ({ sql, args: Array.from({ length: args }) });

test('a text has one name, another text another, and another process’s names are its own', () => {
  const name = statementNames();
  expect(name(statement('select 1'))).toBe(name(statement('select 1', 2)));
  expect(name(statement('select 1'))).not.toBe(name(statement('select 2')));
  expect(statementNames()(statement('select 3'))).toBe(name(statement('select 1')));
});

test('long lists, and every new text once there are 500, have none', () => {
  const name = statementNames();
  expect(name(statement('select 1', 60))).not.toBe('');
  expect(name(statement('insert many', 61))).toBe('');
  const names = Array.from({ length: 600 }, (_, index) => name(statement(`select ${index}`)));
  expect(new Set(names).size).toBe(501);
  expect(name(statement('select 0'))).toBe(names[0]);
  expect(name(statement('select 599'))).toBe('');
});
