import { NumericInputError } from '../numeric-input-error.ts';
import type { FieldKind, MethodInput } from './method.ts';

/** Reads the named inputs of a method from plain data; throws NumericInputError naming field, value and what is allowed. */
export function readInput(id: string, inputs: readonly MethodInput[], given: object): Map<string, unknown> {
  if (Array.isArray(given)) throw new NumericInputError(id, 'input', given, 'an object with named inputs');
  const names = inputs.map((input) => input.name);
  for (const key of Object.keys(given)) {
    if (!names.includes(key)) throw new NumericInputError(id, key, valueOf(given, key), `only ${names.join(', ')}`);
  }
  const read = new Map<string, unknown>();
  for (const input of inputs) {
    const value = valueOf(given, input.name);
    if (value === undefined && input.optional === true) continue;
    read.set(input.name, readOne(id, input, value));
  }
  return read;
}

function readOne(id: string, input: MethodInput, value: unknown): unknown {
  const { name, unit, fields = {} } = input;
  switch (input.kind) {
    case 'number':
      if (typeof value !== 'number') throw new NumericInputError(id, name, value, `a number [${unit}]`);
      return value;
    case 'text':
      if (typeof value !== 'string') throw new NumericInputError(id, name, value, `text: ${unit}`);
      return value;
    case 'numbers':
      return list(id, input, value).map((one, index) => number(id, `${name}[${index}]`, one, true));
    case 'table':
      return list(id, input, value).map((row, index) => {
        const name = `${input.name}[${index}]`;
        return list(id, { ...input, name }, row).map((one, place) => number(id, `${name}[${place}]`, one, true));
      });
    case 'rows':
      return list(id, input, value).map((row, index) => record(id, `${name}[${index}]`, fields, row));
    case 'record':
      return record(id, name, fields, value);
    case 'flexible':
      return value;
  }
}

function list(id: string, { name, unit }: MethodInput, value: unknown): readonly unknown[] {
  if (!Array.isArray(value)) throw new NumericInputError(id, name, value, `a list [${unit}]`);
  return value as unknown[];
}

function record(id: string, name: string, fields: Readonly<Record<string, FieldKind>>, value: unknown): object {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    throw new NumericInputError(id, name, value, `an object with ${Object.keys(fields).join(', ')}`);
  }
  for (const key of Object.keys(value)) {
    if (!(key in fields)) {
      throw new NumericInputError(id, `${name}.${key}`, valueOf(value, key), `only ${Object.keys(fields).join(', ')}`);
    }
  }
  const entries = Object.entries(fields).map(([key, kind]) => [
    key,
    field(id, `${name}.${key}`, kind, valueOf(value, key)),
  ]);
  return Object.fromEntries(entries.filter(([, one]) => one !== undefined)) as object;
}

function field(id: string, name: string, kind: FieldKind, value: unknown): unknown {
  switch (kind) {
    case 'number':
      return number(id, name, value, true);
    case 'maybe-number':
      return value === undefined ? undefined : number(id, name, value, false);
    case 'state':
      if (value === 'known' || value === 'partial' || value === 'unknown') return value;
      throw new NumericInputError(id, name, value, 'known, partial or unknown');
    case 'flag':
      if (typeof value !== 'boolean') throw new NumericInputError(id, name, value, 'true or false');
      return value;
    case 'any':
      return value ?? null;
  }
}

/** JSON has no NaN: null stands for an unknown value in a series. */
function number(id: string, name: string, value: unknown, nullable: boolean): number {
  if (nullable && value === null) return NaN;
  if (typeof value !== 'number') {
    throw new NumericInputError(id, name, value, nullable ? 'a number, or null for unknown' : 'a number');
  }
  return value;
}

function valueOf(given: object, key: string): unknown {
  return (given as Record<string, unknown>)[key];
}
