import { Writable } from 'node:stream';
import { expect, test } from '@jest/globals';
import pg from 'pg';
import { ConflictError, RuleError } from '../../src/platform/errors.ts';
import { createLogger } from '../../src/platform/logger.ts';

function logged(write: (logger: ReturnType<typeof createLogger>) => void, level: 'info' | 'warn' = 'info') {
  const lines: string[] = [];
  const sink = new Writable({
    write: (chunk: Buffer, _encoding, done) => {
      lines.push(chunk.toString());
      done();
    },
  });
  write(createLogger({ LOG_LEVEL: level }, sink));
  return lines.map((line) => JSON.parse(line) as Record<string, unknown>);
}

test('a request is its id, method and path; an answer is its status', () => {
  const req = {
    id: 'r-1',
    method: 'POST',
    url: '/athletes/7/responses?day=2026-03-02&name=Frieda',
    headers: { authorization: 'Bearer key' },
    body: { sleep: 'bad' },
    query: { name: 'Frieda' },
  };
  const [line] = logged((logger) =>
    logger.info({ req, res: { statusCode: 201, headers: { 'set-cookie': 'x' } } }, 'done'),
  );
  expect(line).toMatchObject({ level: 30, msg: 'done' });
  expect(line?.req).toEqual({ id: 'r-1', method: 'POST', path: '/athletes/7/responses' });
  expect(line?.res).toEqual({ status: 201 });
  expect(new Date(String(line?.time)).toISOString()).toBe(line?.time);
});

test('bodies, passwords and keys that reach the logger all the same are blotted out', () => {
  const [line] = logged((logger) =>
    logger.info({ body: { sleep: 'bad' }, request: { password: 'p', authorization: 'a' } }),
  );
  expect(JSON.stringify(line)).not.toMatch(/"bad"|"p"|"a"/);
});

test('an expected error is logged without its fields', () => {
  const error = new RuleError('LT1 must lie below the bound.', [{ field: 'lt1', value: 1.9, allowed: '< 4' }]);
  const [line] = logged((logger) => logger.warn({ err: error }));
  expect(line?.err).toMatchObject({ type: 'RuleError', code: 'rule-broken', status: 422 });
  expect(line?.err).not.toHaveProperty('fields');
});

test('an error of the database keeps code and place, not the values it repeats', () => {
  const error = new pg.DatabaseError('invalid input syntax for type date: "pregnant"', 1, 'error');
  error.code = '22007';
  error.detail = 'Key (name)=(Frieda) exists';
  const wrapped = new ConflictError('It is there already.', { cause: error });
  const lines = logged((logger) => {
    logger.warn({ err: error });
    logger.warn(error);
    logger.warn({ err: error }, 'told in words');
    logger.warn({ err: wrapped });
  });
  expect(JSON.stringify(lines)).not.toMatch(/pregnant|Frieda/);
  const kept = { type: 'DatabaseError', code: '22007', message: 'database error' };
  expect(lines.slice(0, 3)).toMatchObject([
    { err: kept, msg: 'database error' },
    { err: kept, msg: 'database error' },
    { err: kept, msg: 'told in words' },
  ]);
  expect(lines[3]).toMatchObject({ msg: 'It is there already.', err: { type: 'ConflictError', cause: kept } });
  expect((lines[0]?.err as { stack: string }).stack).toMatch(/logger\.test/);
});

test('what is thrown without being an error is not written down', () => {
  const [line] = logged((logger) => logger.warn({ err: { name: 'Frieda' } }, 'odd'));
  expect(JSON.stringify(line)).not.toMatch(/Frieda/);
});

test('the level is that of the environment', () => {
  expect(logged((logger) => logger.info('quiet'), 'warn')).toEqual([]);
});
