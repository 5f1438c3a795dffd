import { readEnv } from '../platform/env.ts';
import { startServices } from './start/start-services.ts';
import { runCommand } from './support/run-command.ts';
import { UsageError } from './support/usage-error.ts';

const HELP = `Runs the service: database, API and worker.

  npm start                 with the database in DATABASE_URL, or with the embedded one under DATA_DIR
  npm start -- --help       this text

The environment is read once; the README lists its variables. PORT=0 takes a free port. Ctrl-C or SIGTERM stops it after
what is under way has been answered; a second one stops it at once.
`;

await runCommand(async (args) => {
  if (args.includes('--help')) {
    process.stdout.write(HELP);
    return 0;
  }
  if (args.length > 0) throw new UsageError(`unknown argument ${args[0]}; allowed: --help`);
  const env = readEnv();
  const stopAsked = new AbortController();
  const asked = new Promise<void>((resolve) => stopAsked.signal.addEventListener('abort', () => resolve()));
  let hurry: () => void = () => undefined;
  for (const signal of ['SIGINT', 'SIGTERM'] as const) {
    process.on(signal, () => (stopAsked.signal.aborted ? hurry() : stopAsked.abort(new UsageError('Stopped.'))));
  }
  try {
    const services = await startServices(env, { log: say, signal: stopAsked.signal });
    hurry = () => services.kill();
    say(`The API listens at ${services.url}`);
    say(`Its description and a page to try it: ${services.url}/docs`);
    if (services.operator.file !== undefined) say(`The key that may create clubs is in ${services.operator.file}`);
    say('Ctrl-C stops it.');
    const failure = await Promise.race([services.failed, asked]);
    say(failure ?? 'Stopping: what is under way is answered first.');
    await services.stop();
    say('Stopped.');
    return failure === undefined ? 0 : 1;
  } catch (error) {
    if (stopAsked.signal.aborted) return 0;
    throw error;
  }
});

function say(line: string): void {
  process.stdout.write(`${line}\n`);
}
