import { prepareDatabase } from '../../prisma/prepare.ts';
import { readEnv } from '../platform/env.ts';
import { runCommand } from './support/run-command.ts';
import { UsageError } from './support/usage-error.ts';

const HELP = `Brings the database in DATABASE_URL up to date: migrations, the queue's tables, the services' role and its grants.
Does nothing where all is there, and can be run from several machines at once.

  npm run migrate              needs DATABASE_URL, the connection of the owner of the tables
  npm run migrate -- --help    this text

The services connect as a role that owns nothing: DATABASE_APP_URL where it is set, otherwise loadweir_app with a
password computed from the owner's. The role is made here if it is missing, which needs CREATEROLE. "npm start" does
all this by itself; the command is for installations that give the services no owner's connection.
`;

await runCommand(async (args) => {
  if (args.includes('--help')) {
    process.stdout.write(HELP);
    return 0;
  }
  if (args.length > 0) throw new UsageError(`unknown argument ${args[0]}; allowed: --help`);
  const { DATABASE_URL, DATABASE_APP_URL } = readEnv();
  if (DATABASE_URL === undefined) {
    throw new UsageError('DATABASE_URL is not set. The embedded database needs no command: "npm start" migrates it.');
  }
  let said = 0;
  const say = (line: string) => {
    said += 1;
    process.stdout.write(`${line}\n`);
  };
  const { appUrl } = await prepareDatabase({ ownerUrl: DATABASE_URL, appUrl: DATABASE_APP_URL, log: say });
  if (said === 0) say('Nothing to do.');
  say(`The database is ready for role ${decodeURIComponent(new URL(appUrl).username)}.`);
  return 0;
});
