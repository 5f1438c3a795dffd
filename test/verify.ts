import { endWithoutReader } from '../src/platform/end-without-reader.ts';
import { core } from './verify/core.ts';
import { readPublished } from './verify/published.ts';
import type { Row } from './verify/rows.ts';
import { buildRows } from './verify/rows.ts';
import { report } from './verify/table.ts';

const HELP = `Checks the numeric functions against published numbers and exact cases.

  npm run -s verify              readable table; exit 1 if a check is off
  npm run -s verify -- --json    the counted checks as a JSON array
  npm run -s verify -- --help    this text

The numbers, their sources and how each is known stand in test/published.
`;

function main(args: readonly string[]): number {
  const unknown = args.filter((argument) => argument !== '--json' && argument !== '--help');
  if (unknown.length > 0) {
    process.stderr.write(`verify: unknown argument ${unknown.join(' ')}; allowed: --json, --help\n`);
    return 1;
  }
  if (args.includes('--help')) {
    process.stdout.write(HELP);
    return 0;
  }
  const works = readPublished();
  const rows = buildRows(core, works);
  process.stdout.write(args.includes('--json') ? json(rows) : report(rows, works));
  return rows.every((row) => row.ok) ? 0 : 1;
}

/** One row a line. */
function json(rows: readonly Row[]): string {
  return `[\n${rows.map((row) => JSON.stringify(row)).join(',\n')}\n]\n`;
}

endWithoutReader();
process.exitCode = main(process.argv.slice(2));
