import type { Core } from './core.ts';
import { call } from './call.ts';

/**
 * Turns the arguments of a published check into values. Marks, each an object with one key:
 * `$nan` an unknown value; `$repeat` [[times, value], …] a series; `$call` [function, …args] the result of another function;
 * `$load90` a ninety-day pattern with every seventh day off.
 */
export function resolve(core: Core, argument: unknown): unknown {
  if (Array.isArray(argument)) return argument.map((one) => resolve(core, one));
  if (typeof argument !== 'object' || argument === null) return argument;
  const entries = Object.entries(argument);
  const [mark, value] = entries[0] ?? [];
  if (mark === '$nan') return NaN;
  if (mark === '$load90') return load90();
  if (mark === '$repeat') {
    return (value as [number, number][]).flatMap(([times, load]) => Array<number>(times).fill(load));
  }
  if (mark === '$call') {
    const [name, ...args] = value as [string, ...unknown[]];
    return call(
      core,
      name,
      args.map((one) => resolve(core, one)),
    );
  }
  return Object.fromEntries(entries.map(([key, one]) => [key, resolve(core, one)]));
}

/** w(i) = 50 + 10·((7i) mod 11), every seventh day 0, i = 1 … 90; its sum is 7800. */
export function load90(): number[] {
  return Array.from({ length: 90 }, (_, index) => {
    const i = index + 1;
    return i % 7 === 0 ? 0 : 50 + 10 * ((7 * i) % 11);
  });
}
