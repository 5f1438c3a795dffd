import type { Bench, BenchResult } from './bench/bench.types.ts';
import { postBench } from './bench/post.bench.ts';
import { runCommand } from './support/run-command.ts';
import { UsageError } from './support/usage-error.ts';

const benches: readonly Bench[] = [postBench];

const HELP = `Measures speed as a ratio within one run, so that it means the same on another machine.

  npm run -s bench -- NAME [--json]     one bench; ends with code 1 where the ratio is above its limit
  npm run -s bench -- --help            this text

${benches.map(({ name, description }) => `  ${name.padEnd(8)} ${description}`).join('\n')}
`;

await runCommand(async (args) => {
  if (args.includes('--help') || args.length === 0) {
    process.stdout.write(HELP);
    return 0;
  }
  const names = args.filter((argument) => argument !== '--json');
  const bench = benches.find(({ name }) => name === names[0]);
  if (bench === undefined || names.length > 1) {
    throw new UsageError(`no bench "${names.join(' ')}"; there are: ${benches.map(({ name }) => name).join(', ')}`);
  }
  const result = await bench.run((line) => process.stderr.write(`${line}\n`));
  process.stdout.write(args.includes('--json') ? `${JSON.stringify(result)}\n` : `${sentence(result)}\n`);
  return result.ok ? 0 : 1;
});

function sentence({ name, value, limit, unit, ok, note }: BenchResult): string {
  return `${name}: ${value} ${unit} (limit ${limit}): ${ok ? 'ok' : 'TOO SLOW'} – ${note}`;
}
