import { PrismaPg } from '@prisma/adapter-pg';
import type { OnApplicationShutdown, OnModuleInit } from '@nestjs/common';
import pg from 'pg';
import { UnavailableError } from '../platform/errors.ts';
import { PrismaClient } from './generated/client.ts';
import { statementNames } from './statement-names.ts';

export interface PrismaServiceOptions {
  /** Connection of the role that owns nothing. */
  url: string;
  maxConnections?: number;
  /** Told about connections the server closed while they were idle; the pool opens new ones by itself. */
  onConnectionError?: (error: Error) => void;
}

/** The database client of one process. Only the unit of work and repositories see it. */
export class PrismaService implements OnModuleInit, OnApplicationShutdown {
  readonly client: PrismaClient;
  readonly #pool: pg.Pool;
  #closed: Promise<void> | undefined;

  constructor(options: PrismaServiceOptions) {
    const noticed = options.onConnectionError ?? (() => undefined);
    // The driver adapter reads every instant as if the session's zone were UTC, so it has to be.
    this.#pool = new pg.Pool({
      connectionString: options.url,
      max: options.maxConnections ?? 10,
      connectionTimeoutMillis: 10_000,
      application_name: 'loadweir',
      options: '-c TimeZone=UTC',
    });
    this.#pool.on('error', noticed);
    this.client = new PrismaClient({
      adapter: new PrismaPg(this.#pool, {
        onPoolError: noticed,
        onConnectionError: noticed,
        statementNameGenerator: statementNames(),
      }),
    });
  }

  async onModuleInit(): Promise<void> {
    await this.refusePowerfulRole();
  }

  async onApplicationShutdown(): Promise<void> {
    await this.close();
  }

  /** True when the database answers. */
  async isReachable(): Promise<boolean> {
    try {
      await this.#pool.query('select 1');
      return true;
    } catch {
      return false;
    }
  }

  /** Row-level security does not bind owners, superusers and BYPASSRLS roles: with one of them the start is refused. */
  async refusePowerfulRole(): Promise<void> {
    const { rows } = await this.#pool.query<{ role: string; powerful: boolean; owned: string | null }>(`
      select r.rolname as role, r.rolsuper or r.rolbypassrls as powerful,
        (select min(c.oid::regclass::text) from pg_class c
          where pg_has_role(r.oid, c.relowner, 'USAGE') and c.relkind in ('r', 'p', 'v', 'm')
            and c.relnamespace in (select oid from pg_namespace where nspname in ('public', 'pgboss'))) as owned
      from pg_roles r where r.rolname = current_user`);
    const row = rows[0];
    if (row === undefined) throw new UnavailableError('The database does not say which role is connected.');
    if (row.powerful) throw new UnavailableError(`Role ${row.role} may bypass row-level security: use another one.`);
    if (row.owned !== null) {
      throw new UnavailableError(`Role ${row.role} owns or may act as the owner of ${row.owned}: use another one.`);
    }
  }

  async close(): Promise<void> {
    this.#closed ??= this.client.$disconnect().then(() => this.#pool.end());
    await this.#closed;
  }
}
