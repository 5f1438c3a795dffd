import type { z } from 'zod';
import type { FieldError } from './errors.ts';

type Issue = z.core.$ZodIssue;

const secret = /secret|token|password|authorization|key$/i;
const maxFields = 50;

/**
 * What a schema found, field by field: the place, what was given (never a secret, never more than a line) and what is
 * allowed in words. Needs `reportInput: true`, else no value is shown.
 */
export function fieldErrors(error: z.ZodError, root = ''): FieldError[] {
  return error.issues.flatMap((issue) => fromIssue(issue, root)).slice(0, maxFields);
}

function fromIssue(issue: Issue, root: string): FieldError[] {
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      field: place([...issue.path, key], root),
      allowed: 'nothing: the field is unknown',
    }));
  }
  if (issue.code === 'invalid_union') {
    const nearest = nearestBranch(issue.errors);
    if (nearest.length > 0) {
      return nearest.flatMap((inner) => fromIssue({ ...inner, path: [...issue.path, ...inner.path] }, root));
    }
  }
  const field = place(issue.path, root);
  const value = shown(field, given(issue));
  const hint = issue.code === 'custom' && typeof issue.params?.hint === 'string' ? issue.params.hint : undefined;
  return [
    {
      field,
      ...(value === undefined ? {} : { value }),
      allowed: allowed(issue),
      ...(hint === undefined ? {} : { hint }),
    },
  ];
}

/** The alternative that got furthest: the one whose fault lies deepest, not at a discriminating field. */
function nearestBranch(branches: readonly Issue[][]): readonly Issue[] {
  const depth = (issues: readonly Issue[]) => Math.max(0, ...issues.map((issue) => issue.path.length));
  const deep = branches.filter((issues) => !issues.some((issue) => issue.code === 'invalid_value'));
  return (deep.length > 0 ? deep : []).toSorted((a, b) => depth(b) - depth(a))[0] ?? [];
}

function place(path: readonly PropertyKey[], root: string): string {
  const text = path.reduce<string>(
    (left, part) =>
      typeof part === 'number' ? `${left}[${part}]` : left === '' ? String(part) : `${left}.${String(part)}`,
    root,
  );
  return text === '' ? '(whole input)' : text.slice(0, 200);
}

/** A rule over several fields reports the object they stand in, and names the one at fault as the end of its path. */
function given({ code, input, path }: Issue): unknown {
  if (code !== 'custom' || typeof input !== 'object' || input === null) return input;
  const name = path.at(-1);
  return name !== undefined && Object.hasOwn(input, name) ? (input as Record<PropertyKey, unknown>)[name] : undefined;
}

function shown(field: string, value: unknown): unknown {
  if (secret.test(field)) return undefined;
  if (typeof value === 'string') return value.length > 100 ? `${value.slice(0, 100)}…` : value;
  return value === null || typeof value === 'number' || typeof value === 'boolean' ? value : undefined;
}

/** The allowed range in words. A schema's own words win; they are written as a noun ("a UUID"). */
function allowed(issue: Issue): string {
  switch (issue.code) {
    case 'invalid_type':
      return own(issue) ?? (issue.input === undefined ? `required: ${noun(issue.expected)}` : noun(issue.expected));
    case 'too_small':
      return own(issue) ?? limit(issue.origin, 'least', Number(issue.minimum), issue.inclusive !== false);
    case 'too_big':
      return own(issue) ?? limit(issue.origin, 'most', Number(issue.maximum), issue.inclusive !== false);
    case 'invalid_value':
      return own(issue) ?? `one of ${issue.values.map(String).join(', ')}`;
    case 'not_multiple_of':
      return own(issue) ?? `a multiple of ${issue.divisor}`;
    case 'invalid_union':
      return own(issue) ?? (issue.discriminator === undefined ? 'another shape' : `a known ${issue.discriminator}`);
    default:
      return issue.message;
  }
}

/** Zod's default messages begin with "Invalid", "Too" or "Unrecognized"; anything else was written in a schema. */
function own({ message }: Issue): string | undefined {
  return /^(Invalid|Too|Unrecognized|Required)\b/.test(message) ? undefined : message;
}

function noun(expected: string): string {
  const known: Record<string, string> = {
    string: 'text',
    number: 'a finite number',
    int: 'a whole number',
    boolean: 'true or false',
    array: 'a list',
    object: 'an object',
    record: 'an object',
  };
  return known[expected] ?? expected;
}

function limit(origin: string, side: 'least' | 'most', bound: number, inclusive: boolean): string {
  if (origin === 'string') return `at ${side} ${bound} characters`;
  if (origin === 'array' || origin === 'set') return `at ${side} ${bound} items`;
  if (inclusive) return `at ${side} ${bound}`;
  return side === 'least' ? `above ${bound}` : `below ${bound}`;
}
