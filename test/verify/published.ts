import { readdirSync, readFileSync } from 'node:fs';

/** One published or derived number and how it is computed; see `arguments.ts` for the marks inside `args`. */
export interface PublishedCheck {
  readonly id: string;
  readonly function: string;
  readonly provenance: string;
  /** Where in the work, or how derived. */
  readonly note?: string;
  readonly args?: readonly unknown[];
  /** Way into the result: keys and indexes, negative ones from the end. */
  readonly pick?: readonly (string | number)[];
  /** Name of a computation that takes more than one call, with its own input. */
  readonly composed?: string;
  readonly input?: Readonly<Record<string, unknown>>;
  readonly expected: number | boolean | 'undefined' | 'rejected';
  /** Absolute; 0 = exact. */
  readonly tolerance: number;
}

/** A published fact that nothing here computes. */
export interface PublishedFact {
  readonly id: string;
  readonly fact: string;
  readonly value: string;
  readonly provenance: string;
}

export interface PublishedWork {
  readonly source: string;
  readonly checks?: readonly PublishedCheck[];
  readonly facts?: readonly PublishedFact[];
}

const folder = new URL('../published/', import.meta.url);

/** All works in `test/published`, in the order of their file names. */
export function readPublished(): PublishedWork[] {
  return readdirSync(folder)
    .filter((name) => name.endsWith('.json'))
    .sort()
    .map((name) => JSON.parse(readFileSync(new URL(name, folder), 'utf8')) as PublishedWork);
}
