import { expect, test } from '@jest/globals';
import { judgeResult } from '../../../src/features/tests/judge-result.ts';
import type { TestResult } from '../../../src/features/tests/tests.types.ts';

const result = (value: number, quality: TestResult['quality'] = 'ok') => ({ value, quality }) as TestResult;
const three = [result(90), result(100), result(110)];

test('a fifth from the mean of the own last three is still believed, more has to be confirmed', () => {
  expect(judgeResult({ value: 120 }, three)).toEqual({ quality: 'ok', notes: [] });
  expect(judgeResult({ value: 79 }, three)).toMatchObject({
    quality: 'suspect',
    notes: [expect.stringContaining('21 % from the mean')],
  });
  expect(judgeResult({ value: 79, confirmed: true }, three)).toEqual({
    quality: 'ok',
    notes: ['21 % from the mean of the own last three, confirmed'],
  });
});

test('suspect results are not compared with, and with fewer than three nothing is', () => {
  expect(judgeResult({ value: 500 }, [...three.slice(1), result(500, 'suspect')]).quality).toBe('ok');
  expect(judgeResult({ value: 130 }, [...three, result(500, 'suspect')]).quality).toBe('suspect');
});

test('a bout has no value to be judged', () => {
  expect(judgeResult({}, three)).toEqual({ quality: 'ok', notes: [] });
});
