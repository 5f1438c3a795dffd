import { NumericInputError } from '../../src/core/numeric-input-error.ts';
import { resolve } from './arguments.ts';
import { call, pick } from './call.ts';
import { composed } from './composed.ts';
import type { Core } from './core.ts';
import { home } from './core.ts';
import type { PublishedCheck, PublishedWork } from './published.ts';

/** A number, true or false, 'undefined', 'rejected', or what went wrong. */
export type Outcome = number | boolean | string;

/** One counted check: what a function under src gave, beside what was expected. */
export interface Row {
  readonly id: string;
  readonly method: string;
  readonly from: string;
  readonly source: string;
  readonly provenance: string;
  readonly input: unknown;
  readonly expected: Outcome;
  readonly computed: Outcome;
  readonly tolerance: number;
  readonly ok: boolean;
}

/** All counted rows in the order of their ids, computed with the given functions. */
export function buildRows(core: Core, works: readonly PublishedWork[]): Row[] {
  return works
    .flatMap((work) => (work.checks ?? []).map((check) => rowOf(core, work, check)))
    .sort((a, b) => a.id.localeCompare(b.id, 'en'));
}

function rowOf(core: Core, work: PublishedWork, check: PublishedCheck): Row {
  const { id, provenance, expected, tolerance } = check;
  const computed = outcomeOf(core, check);
  return {
    id,
    method: kebab(check.function),
    from: home(check.function),
    source: check.note === undefined ? work.source : `${work.source}; ${check.note}`,
    provenance,
    input: shown(check.composed === undefined ? inputOf(core, check) : check.input),
    expected,
    computed,
    tolerance,
    ok: agrees(computed, expected, tolerance),
  };
}

/** The id a function's method has in the catalogue. */
export function kebab(name: string): string {
  return name.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`);
}

function outcomeOf(core: Core, check: PublishedCheck): Outcome {
  try {
    const result = resultOf(core, check);
    if (typeof result === 'number') return Number.isNaN(result) ? 'undefined' : result;
    return typeof result === 'boolean' ? result : `not a number: ${JSON.stringify(result)}`;
  } catch (error) {
    if (error instanceof NumericInputError) return 'rejected';
    return `failed: ${error instanceof Error ? error.message : String(error)}`;
  }
}

function resultOf(core: Core, check: PublishedCheck): unknown {
  if (check.composed === undefined) {
    const args = (check.args ?? []).map((argument) => resolve(core, argument));
    return pick(call(core, check.function, args), check.pick ?? []);
  }
  const computation = composed[check.composed];
  if (computation === undefined) throw new Error(`no computation ${check.composed}`);
  return computation(core, check.input ?? {});
}

/** The arguments as the function got them; where another function refused to give one, the check as it was written. */
function inputOf(core: Core, check: PublishedCheck): unknown {
  try {
    return (check.args ?? []).map((argument) => resolve(core, argument));
  } catch {
    return check.args;
  }
}

function agrees(computed: Outcome, expected: Outcome, tolerance: number): boolean {
  if (typeof computed === 'number' && typeof expected === 'number') {
    return Math.abs(computed - expected) <= tolerance;
  }
  return computed === expected;
}

/** JSON has no NaN: it is written as a word. */
function shown(value: unknown): unknown {
  if (typeof value === 'number') return Number.isFinite(value) ? value : String(value);
  if (Array.isArray(value)) return value.map(shown);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([key, one]) => [key, shown(one)]));
}
