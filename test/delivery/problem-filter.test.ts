import { HttpException } from '@nestjs/common';
import type { ArgumentsHost } from '@nestjs/common';
import type { PinoLogger } from 'nestjs-pino';
import { expect, test } from '@jest/globals';
import { ProblemFilter } from '../../src/delivery/http/problem.filter.ts';
import { RouteTable } from '../../src/delivery/http/route-table.ts';
import { ConflictError, ForbiddenError, NotFoundError, UnavailableError } from '../../src/platform/errors.ts';

interface Line {
  level: string;
  facts: Record<string, unknown>;
}

function answer(error: unknown, sent = false) {
  const lines: Line[] = [];
  const at = (level: string) => (facts: Record<string, unknown>) => lines.push({ level, facts });
  const logger = { debug: at('debug'), info: at('info'), warn: at('warn'), error: at('error') };
  let text: string | undefined;
  const reply = {
    sent,
    status: () => reply,
    header: () => reply,
    send: (body: string) => {
      text = body;
    },
  };
  const request = { id: 'id-1', url: '/v1/things?name=secret', routeOptions: { url: '/v1/things' } };
  const host = { switchToHttp: () => ({ getRequest: () => request, getResponse: () => reply }) };
  new ProblemFilter(logger as unknown as PinoLogger, new RouteTable()).catch(error, host as unknown as ArgumentsHost);
  return { lines, text };
}

test.each([
  [new NotFoundError(), 'info'],
  [new ConflictError('It is there.'), 'info'],
  [new ForbiddenError(), 'warn'],
  [new UnavailableError(), 'error'],
  [new HttpException('Cannot GET', 404), 'info'],
  [new Error('a defect'), 'error'],
  ['not even an error', 'error'],
])('%p is logged once, at its level', (error, level) => {
  const { lines } = answer(error);
  expect(lines.map((line) => line.level)).toEqual([level]);
  expect(lines[0]!.facts.correlationId).toBe('id-1');
});

test('a defect is logged whole and told as nothing', () => {
  const defect = new Error('column "email" of relation "person"');
  const { lines, text } = answer(defect);
  expect(lines[0]!.facts.err).toBe(defect);
  expect(JSON.parse(text!)).toEqual({
    type: 'urn:loadweir:problem:internal',
    title: 'Something went wrong',
    status: 500,
    detail: 'It was noted under the correlation id.',
    instance: '/v1/things',
    correlationId: 'id-1',
  });
});

test('an expected refusal is logged without its stack, and no query is repeated', () => {
  const { lines, text } = answer(new NotFoundError());
  expect(lines[0]!.facts).toEqual({ code: 'not-found', status: 404, correlationId: 'id-1' });
  expect(text).not.toContain('secret');
});

test('an answer that has left is not sent again', () => {
  expect(answer(new NotFoundError(), true).text).toBeUndefined();
});
