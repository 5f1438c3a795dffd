import { describe, expect, test } from '@jest/globals';
import { z } from 'zod';
import { fieldErrors } from '../../src/platform/field-errors.ts';

function faults(schema: z.ZodType, input: unknown) {
  const result = schema.safeParse(input, { reportInput: true });
  return result.success ? [] : fieldErrors(result.error);
}
const one = (schema: z.ZodType, value: unknown) => faults(z.strictObject({ x: schema.optional() }), { x: value })[0];

describe('what is allowed, in words', () => {
  test.each([
    [z.number().min(0), -1, 'at least 0'],
    [z.number().gt(0), 0, 'above 0'],
    [z.number().max(10), 11, 'at most 10'],
    [z.number().lt(10), 10, 'below 10'],
    [z.number(), '7', 'a finite number'],
    [z.int(), 1.5, 'a whole number'],
    [z.boolean(), 1, 'true or false'],
    [z.string().min(3), 'ab', 'at least 3 characters'],
    [z.array(z.number()).max(1), [1, 2], 'at most 1 items'],
    [z.enum(['a', 'b']), 'c', 'one of a, b'],
    [z.number({ error: 'watts' }), null, 'watts'],
  ])('%#', (schema, value, allowed) => {
    expect(one(schema, value)?.allowed).toBe(allowed);
  });

  test('a missing field says what is required', () => {
    expect(faults(z.object({ x: z.number() }), {})).toEqual([{ field: 'x', allowed: 'required: a finite number' }]);
  });

  test('every unknown field is named, without its value', () => {
    expect(faults(z.strictObject({}), { a: 'private', b: 2 })).toEqual([
      { field: 'a', allowed: 'nothing: the field is unknown' },
      { field: 'b', allowed: 'nothing: the field is unknown' },
    ]);
  });
});

describe('what was given', () => {
  test('is shown for plain values and cut when long', () => {
    expect(one(z.number().max(1), 2)).toEqual({ field: 'x', value: 2, allowed: 'at most 1' });
    expect(one(z.string().max(5), 'y'.repeat(500))?.value).toBe(`${'y'.repeat(100)}…`);
    expect(one(z.number(), { deep: 'thing' })).not.toHaveProperty('value');
  });

  test('is never shown for a secret', () => {
    const schema = z.strictObject({ token: z.number(), apiKey: z.number() });
    for (const error of faults(schema, { token: 'a', apiKey: 'b' })) expect(error).not.toHaveProperty('value');
  });

  test('of a rule over two fields is that of the field at fault', () => {
    const schema = z
      .strictObject({ from: z.number(), to: z.number() })
      .refine(({ from, to }) => to >= from, { path: ['to'], error: 'not below from' });
    expect(faults(z.array(schema), [{ from: 2, to: 1 }])).toEqual([
      { field: '[0].to', value: 1, allowed: 'not below from' },
    ]);
  });
});

describe('of alternatives', () => {
  const content = z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('minutes'), minutes: z.number().max(10) }),
    z.strictObject({ kind: z.literal('sets'), sets: z.array(z.strictObject({ load: z.number() })) }),
  ]);

  test('the chosen one’s fault is named', () => {
    expect(faults(content, { kind: 'sets', sets: [{ load: 'x' }] })).toEqual([
      { field: 'sets[0].load', value: 'x', allowed: 'a finite number' },
    ]);
  });
  test('an unknown one is refused at its name', () => {
    expect(faults(content, { kind: 'other' })[0]?.field).toBe('kind');
  });
  test('without a name the nearest is meant', () => {
    const either = z.union([z.string(), z.strictObject({ a: z.strictObject({ b: z.number() }) })]);
    expect(faults(either, { a: { b: 'x' } })).toEqual([{ field: 'a.b', value: 'x', allowed: 'a finite number' }]);
  });
});

test('no more than fifty are told', () => {
  expect(faults(z.array(z.number()), Array(200).fill('x')).length).toBe(50);
});
