import type { FieldKind, InputKind, Method, MethodInput } from './method.ts';
import { readInput } from './read-input.ts';

interface Definition extends Omit<Method, 'id' | 'from' | 'run'> {
  /** File under src/core. */
  readonly file: string;
  readonly fn: (...args: never[]) => unknown;
  /** True where the function takes all inputs as one object. */
  readonly asObject?: boolean;
}

/** A method from its function: the id is the function's name in kebab case, the inputs are its parameters in order. */
export function define({ file, fn, asObject = false, ...described }: Definition): Method {
  const id = fn.name.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`);
  const callable = fn as (...args: unknown[]) => unknown;
  return {
    ...described,
    id,
    from: `src/core/${file}#${fn.name}`,
    run: (given) => {
      const read = readInput(id, described.inputs, given);
      return asObject
        ? callable(Object.fromEntries(read))
        : callable(...described.inputs.map(({ name }) => read.get(name)));
    },
  };
}

/** A required input without fields. */
export function input(name: string, unit: string, kind: InputKind = 'number'): MethodInput {
  return { name, unit, kind };
}

/** A list of rows or one record with these fields. */
export function fields(
  name: string,
  unit: string,
  kind: 'rows' | 'record',
  held: Readonly<Record<string, FieldKind>>,
): MethodInput {
  return { name, unit, kind, fields: held };
}

/** An optional record of numbers. */
export function options(unit: string, ...names: string[]): MethodInput {
  const held = Object.fromEntries(names.map((name) => [name, 'maybe-number' as const]));
  return { name: 'options', unit: `${unit}; ${names.join(', ')}`, kind: 'record', optional: true, fields: held };
}
