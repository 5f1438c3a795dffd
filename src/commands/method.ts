import { readFileSync } from 'node:fs';
import { catalogue, methodsTable } from '../core/catalogue.ts';
import type { Method } from '../core/catalogue.ts';
import { NumericInputError } from '../core/numeric-input-error.ts';
import { endWithoutReader } from '../platform/end-without-reader.ts';

const HELP = `Lists the numeric methods and runs one of them.

  npm run -s method -- --list [--json]          all methods: id, inputs with units, unit of the result, source
  npm run -s method -- --table                  the methods table of the README
  npm run -s method -- ID                       one method
  npm run -s method -- ID --input FILE.json     its result as JSON
  npm run -s method -- --help                   this text

FILE.json holds one object with the named inputs, such as {"rating": 7, "durationMin": 120}.
In a series null stands for an unknown day, and 0 for rest. In a result null means undefined.
`;

/** A mistake of the caller: its message is all that is shown. */
class UsageError extends Error {}

function main(args: readonly string[]): string {
  const { flags, id, file } = parse(args);
  if (flags.has('--help') || args.length === 0) return HELP;
  if (flags.has('--list')) return flags.has('--json') ? json(catalogue.map(described)) : listing(catalogue);
  if (flags.has('--table')) return `${methodsTable()}\n`;
  const method = find(id);
  if (file === undefined) return flags.has('--json') ? json(described(method)) : listing([method]);
  return json(method.run(readObject(file)));
}

function parse(args: readonly string[]): { flags: Set<string>; id: string | undefined; file: string | undefined } {
  const flags = new Set<string>();
  let id: string | undefined;
  let file: string | undefined;
  for (let i = 0; i < args.length; i += 1) {
    const argument = args[i]!;
    if (argument === '--input') {
      i += 1;
      file = args[i];
      if (file === undefined) throw new UsageError('--input: a file name is missing');
    } else if (['--list', '--table', '--json', '--help'].includes(argument)) {
      flags.add(argument);
    } else if (argument.startsWith('-') || id !== undefined) {
      throw new UsageError(
        `unknown argument ${argument}; allowed: ID, --input FILE.json, --list, --table, --json, --help`,
      );
    } else {
      id = argument;
    }
  }
  return { flags, id, file };
}

function find(id: string | undefined): Method {
  if (id === undefined) throw new UsageError('the id of a method is missing; --list shows them');
  const method = catalogue.find((one) => one.id === id);
  if (method === undefined) throw new UsageError(`no method "${id}"; --list shows the ${catalogue.length} ids`);
  return method;
}

function readObject(file: string): object {
  let text: string;
  try {
    text = readFileSync(file, 'utf8');
  } catch (error) {
    throw new UsageError(`${file}: cannot be read (${error instanceof Error ? error.message : String(error)})`);
  }
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch (error) {
    throw new UsageError(`${file}: is not JSON (${error instanceof Error ? error.message : String(error)})`);
  }
  if (typeof value !== 'object' || value === null) {
    throw new UsageError(`${file}: holds ${JSON.stringify(value)}, allowed: an object with the named inputs`);
  }
  return value;
}

function described({ id, name, from, inputs, unit, source, provenance, checkedAgainst }: Method): object {
  return { id, name, from, inputs, unit, source, provenance, checkedAgainst };
}

function listing(methods: readonly Method[]): string {
  return methods
    .map(({ id, name, inputs, unit, source, provenance }) => {
      const named = inputs.map((input) => `${input.name}${input.optional === true ? '?' : ''} [${input.unit}]`);
      const from = source === provenance ? source : `${source} (${provenance})`;
      return `${id}\n  ${name}\n  inputs: ${named.join(', ')}\n  result: [${unit}]\n  source: ${from}\n`;
    })
    .join('\n');
}

function json(value: unknown): string {
  return `${JSON.stringify(value, null, 2)}\n`;
}

endWithoutReader();
try {
  process.stdout.write(main(process.argv.slice(2)));
} catch (error) {
  if (!(error instanceof UsageError || error instanceof NumericInputError)) throw error;
  process.stderr.write(`method: ${error.message}\n`);
  process.exitCode = 1;
}
