import { setTimeout as sleep } from 'node:timers/promises';
import pg from 'pg';
import { UnavailableError } from '../src/platform/errors.ts';
import { QUEUE_SCHEMA } from './queue-schema.ts';

const { escapeIdentifier, escapeLiteral } = pg;

/**
 * Makes sure the role of API and worker can log in with its password and has no power over row-level security. Roles
 * belong to the whole server, so processes that prepare other databases of it may do the same at the same moment. The
 * password of a role that was there already is only set anew where it is the derived one.
 */
export async function ensureAppRole(
  client: pg.Client,
  appUrl: string,
  options: { derived: boolean; log: (line: string) => void },
): Promise<void> {
  const { role, password } = roleOf(appUrl);
  const withPassword = `${escapeIdentifier(role)} login password ${escapeLiteral(password)}`;
  if (!(await exists(client, role))) {
    // 42710 or 23505: another process made it meanwhile.
    const created = await whileOthersDoTheSame(client, `create role ${withPassword}`, ['42710', '23505']);
    if (created) options.log(`Role ${role} created.`);
  }
  await refusePower(client, role);
  if (await canLogIn(appUrl)) return;
  if (!options.derived) throw new UnavailableError(`Role ${role} cannot log in with the password in DATABASE_APP_URL.`);
  await whileOthersDoTheSame(client, `alter role ${withPassword}`, []);
  options.log(`Password of role ${role} set anew.`);
}

/** All that the services do, and nothing else: no TRUNCATE, no changes of tables, nothing with the migrations' history. */
export async function grantAppRole(client: pg.Client, appUrl: string): Promise<void> {
  const role = escapeIdentifier(roleOf(appUrl).role);
  const schemas = `public, ${QUEUE_SCHEMA}`;
  await client.query('begin');
  try {
    await client.query(`
      grant usage on schema ${schemas} to ${role};
      grant select, insert, update, delete on all tables in schema ${schemas} to ${role};
      grant usage, select on all sequences in schema ${schemas} to ${role};
      grant execute on all functions in schema ${schemas} to ${role};
      alter default privileges in schema ${schemas} grant select, insert, update, delete on tables to ${role};
      alter default privileges in schema ${schemas} grant usage, select on sequences to ${role};
      alter default privileges in schema ${schemas} grant execute on functions to ${role};
      revoke all on table public._prisma_migrations from ${role};`);
    await client.query('commit');
  } catch (error) {
    await client.query('rollback');
    throw error;
  }
}

function roleOf(appUrl: string): { role: string; password: string } {
  const url = new URL(appUrl);
  return { role: decodeURIComponent(url.username), password: decodeURIComponent(url.password) };
}

async function exists(client: pg.Client, role: string): Promise<boolean> {
  return (await client.query('select from pg_roles where rolname = $1', [role])).rowCount === 1;
}

/** False where the password is wrong or the role may not log in; other troubles are errors. */
async function canLogIn(appUrl: string): Promise<boolean> {
  const probe = new pg.Client({ connectionString: appUrl });
  probe.on('error', () => undefined);
  try {
    await probe.connect();
    return true;
  } catch (error) {
    if (error instanceof pg.DatabaseError && (error.code === '28P01' || error.code === '28000')) return false;
    throw error;
  } finally {
    await probe.end();
  }
}

async function refusePower(client: pg.Client, role: string): Promise<void> {
  const { rows } = await client.query<{ powerful: boolean }>(
    `select rolsuper or rolbypassrls or pg_has_role(oid, current_user::regrole, 'USAGE') as powerful
     from pg_roles where rolname = $1`,
    [role],
  );
  if (rows[0]?.powerful !== false) {
    throw new UnavailableError(
      `Role ${role} may bypass row-level security or act as the owner: name another in DATABASE_APP_URL.`,
    );
  }
}

/** Runs a statement on the shared catalogue of roles; false when it failed with one of the codes that mean "done". */
async function whileOthersDoTheSame(client: pg.Client, statement: string, done: readonly string[]): Promise<boolean> {
  for (let tries = 1; ; tries += 1) {
    try {
      await client.query(statement);
      return true;
    } catch (error) {
      if (!(error instanceof pg.DatabaseError)) throw error;
      if (done.includes(error.code ?? '')) return false;
      // XX000 here is "tuple concurrently updated".
      if (error.code !== 'XX000' || tries === 20) throw error;
      await sleep(25 * tries);
    }
  }
}
