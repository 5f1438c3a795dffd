import { resolve } from 'node:path';
import { LostKeysError } from '../demo/found-club.ts';
import { readEnvAs } from '../platform/env.ts';
import { parseArguments } from './demo/arguments.ts';
import type { DemoArguments } from './demo/arguments.ts';
import { demoEnvironment } from './demo/demo-environment.ts';
import { runDemo } from './demo/run-demo.ts';
import { throwAwayDatabase } from './demo/throw-away-database.ts';
import type { ThrowAwayDatabase } from './demo/throw-away-database.ts';
import { startServices } from './start/start-services.ts';
import type { RunningServices } from './start/start-services.ts';
import { runCommand } from './support/run-command.ts';
import { UsageError } from './support/usage-error.ts';

const HELP = `Shows the service with an invented rowing squad: sixteen athletes, twelve weeks.

  npm run demo                       starts database, API and worker, logs the squad over HTTP, has the report of
                                     the last complete week made, tells who is flagged and stays up until Ctrl-C
  npm run demo -- --exit --out DIR   the same with a database that is thrown away; writes the files and ends

  --exit            end when the files are written: workbook, mail, summary.json, log.csv, policy.json, thresholds.csv
  --out DIR         folder of the files (otherwise OUTBOX_DIR, var/outbox)
  --scenario N      1 to 20: other names, loads and gaps, the same cast of roles (otherwise 1)
  --today DATE      the service's clock starts at noon UTC of this date (otherwise it is today)
  --help            this text

The embedded database under DATA_DIR and the outbox folder are used whatever DATABASE_URL and SMTP_URL say. PORT is the
API's port; without it a free one is taken. Running it again with the same date and number logs and sends nothing twice.
`;

/** A service ended by itself. */
class ServiceFailure extends Error {}

await runCommand(async (given) => {
  const args = parseArguments(given);
  if (args.help) {
    process.stdout.write(HELP);
    return 0;
  }
  const stop = new AbortController();
  let services: RunningServices | undefined;
  for (const signal of ['SIGINT', 'SIGTERM'] as const) {
    process.on(signal, () => (stop.signal.aborted ? services?.kill() : stop.abort(new Error('stopped'))));
  }
  let database: ThrowAwayDatabase | undefined;
  try {
    if (args.exit) database = await throwAwayDatabase(note);
    const env = readEnvAs((given) => environmentOf(given, args, database));
    services = await startServices(env, { log: note, signal: stop.signal });
    const run = { url: services.url, operatorKey: services.operator.key, env, signal: stop.signal, say };
    const club = await orFailed(runDemo(args, run), services, stop);
    if (args.exit) return 0;
    say(`The API listens at ${services.url}; its description and a page to try it: ${services.url}/docs`);
    say(`Access key of the head coach: ${club.tokens.get('coach')!}`);
    say(`Access key of the manager:    ${club.tokens.get('manager')!}`);
    say('Ctrl-C stops it.');
    await orFailed(new Promise<void>((done) => stop.signal.addEventListener('abort', () => done())), services, stop);
    return 0;
  } catch (error) {
    if (stop.signal.aborted && !(error instanceof ServiceFailure)) {
      note('Stopped before it was finished.');
      return 130;
    }
    throw error instanceof LostKeysError ? new UsageError(error.message) : error;
  } finally {
    await services?.stop();
    await database?.remove();
  }
});

/** The work, unless a service ends by itself before: then nothing more can be expected of it. */
async function orFailed<T>(work: Promise<T>, services: RunningServices, stop: AbortController): Promise<T> {
  const failed = services.failed.then((how) => {
    const failure = new ServiceFailure(how);
    stop.abort(failure);
    throw failure;
  });
  work.catch(() => undefined);
  return Promise.race([work, failed]);
}

function environmentOf(
  given: NodeJS.ProcessEnv,
  args: DemoArguments,
  database: ThrowAwayDatabase | undefined,
): NodeJS.ProcessEnv {
  const environment = demoEnvironment(given, args, {
    ...(database === undefined ? {} : { data: database.folder }),
    ...(args.out === undefined ? {} : { outbox: resolve(args.out) }),
  });
  return database === undefined ? environment : { ...environment, DATABASE_URL: database.ownerUrl };
}

function say(line: string): void {
  process.stdout.write(`${line}\n`);
}

function note(line: string): void {
  process.stderr.write(`${line}\n`);
}
