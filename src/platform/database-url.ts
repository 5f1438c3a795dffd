import { createHmac } from 'node:crypto';
import { EnvError } from './env.ts';
import type { Env } from './env.ts';

/** The role API and worker connect as, unless DATABASE_APP_URL names another. It owns nothing. */
export const APP_ROLE = 'loadweir_app';

/**
 * The connection of API and worker. DATABASE_APP_URL wins. Without it the role is `loadweir_app` on the owner's server
 * and database, its password an HMAC of the owner's: every process that knows the owner's URL computes the same one,
 * nothing has to be stored, and the owner's password cannot be computed back from it.
 */
export function databaseAppUrl(env: Pick<Env, 'DATABASE_URL' | 'DATABASE_APP_URL'>): string {
  if (env.DATABASE_APP_URL !== undefined) return env.DATABASE_APP_URL;
  if (env.DATABASE_URL === undefined) {
    throw new EnvError([{ variable: 'DATABASE_APP_URL', message: 'is needed where DATABASE_URL is not given' }]);
  }
  const url = new URL(env.DATABASE_URL);
  if (url.password === '') {
    throw new EnvError([
      {
        variable: 'DATABASE_APP_URL',
        message: 'is needed because DATABASE_URL carries no password to derive one from',
      },
    ]);
  }
  url.password = derivePassword(decodeURIComponent(url.password));
  url.username = APP_ROLE;
  return url.href;
}

function derivePassword(ownerPassword: string): string {
  return createHmac('sha256', ownerPassword).update('loadweir application role').digest('base64url');
}
