import { scenarioNumbers } from '../../demo/scenario.ts';
import { UsageError } from '../support/usage-error.ts';

export interface DemoArguments {
  help: boolean;
  /** Make the files and end, with a database that is thrown away. */
  exit: boolean;
  out?: string;
  scenario: number;
  today?: string;
}

const { first, last } = scenarioNumbers;
const days = { first: '1990-01-01', last: '2100-12-31' };

/** @throws {UsageError} naming the argument, what was given and what is allowed */
export function parseArguments(args: readonly string[]): DemoArguments {
  const parsed: DemoArguments = { help: false, exit: false, scenario: first };
  const seen = new Set<string>();
  for (let index = 0; index < args.length; index += 1) {
    const [name, inline] = split(args[index]!);
    if (seen.has(name)) throw new UsageError(`${name} is given twice`);
    seen.add(name);
    if (name === '--help' || name === '-h' || name === '--exit') {
      if (inline !== undefined) throw new UsageError(`${name} takes no value`);
      if (name === '--exit') parsed.exit = true;
      else parsed.help = true;
      continue;
    }
    if (name !== '--out' && name !== '--scenario' && name !== '--today') {
      throw new UsageError(`unknown argument ${name}; allowed: --exit, --out DIR, --scenario N, --today DATE, --help`);
    }
    const value = inline ?? args[(index += 1)];
    if (value === undefined || value === '' || (inline === undefined && value.startsWith('--'))) {
      throw new UsageError(`${name} needs a value`);
    }
    if (name === '--out') parsed.out = value;
    else if (name === '--scenario') parsed.scenario = scenarioNumber(value);
    else parsed.today = calendarDay(value);
  }
  return parsed;
}

function split(argument: string): [string, string | undefined] {
  const at = argument.startsWith('--') ? argument.indexOf('=') : -1;
  return at < 0 ? [argument, undefined] : [argument.slice(0, at), argument.slice(at + 1)];
}

function scenarioNumber(value: string): number {
  const number = Number(value);
  if (/^\d+$/.test(value) && number >= first && number <= last) return number;
  throw new UsageError(`--scenario ${value}: allowed is a whole number from ${first} to ${last}`);
}

function calendarDay(value: string): string {
  const time = /^\d{4}-\d{2}-\d{2}$/.test(value) ? Date.parse(`${value}T00:00:00Z`) : NaN;
  const exists = !Number.isNaN(time) && new Date(time).toISOString().startsWith(value);
  if (exists && value >= days.first && value <= days.last) return value;
  throw new UsageError(`--today ${value}: allowed is a date like 2026-11-30, from ${days.first} to ${days.last}`);
}
