import type { Core } from './core.ts';

/** Calls a function of the table by name. */
export function call(core: Core, name: string, args: readonly unknown[]): unknown {
  const found = core[name];
  if (found === undefined) throw new Error(`no function ${name} among the functions under check`);
  return found(...args);
}

/** Follows keys and indexes into a result; negative indexes count from the end. */
export function pick(result: unknown, path: readonly (string | number)[]): unknown {
  return path.reduce<unknown>((part, key) => {
    if (Array.isArray(part)) return part.at(Number(key)) as unknown;
    return (part as Record<string, unknown>)[String(key)];
  }, result);
}
