import { PrismaPg } from '@prisma/adapter-pg';
import { DriverAdapterError } from '@prisma/driver-adapter-utils';
import type { SqlDriverAdapter, SqlMigrationAwareDriverAdapterFactory } from '@prisma/driver-adapter-utils';
import pg from 'pg';

/** What a migration's own transaction writes into its row: after a crash it tells "done" from "not done". */
export const COMMITTED = 'committed with its script';

const markCommitted = `
;update _prisma_migrations set logs = '${COMMITTED}' where finished_at is null and rolled_back_at is null`;

/**
 * The driver adapter for migrations. The stock one cuts a script at every semicolon, also inside functions and
 * comments, runs the pieces without a transaction and would take the real database for the shadow one. Here a script
 * goes to the server whole, which makes it one transaction, over the one connection the engine's lock hangs on.
 */
export class MigrationAdapterFactory implements SqlMigrationAwareDriverAdapterFactory {
  readonly provider = 'postgres';
  readonly adapterName = 'loadweir-migrations';
  readonly #pool: pg.Pool;
  readonly #stock: PrismaPg;

  constructor(url: string) {
    this.#pool = new pg.Pool({ connectionString: url, max: 1, application_name: 'loadweir migrations' });
    this.#pool.on('error', () => undefined);
    this.#stock = new PrismaPg(this.#pool);
  }

  async connect(): Promise<SqlDriverAdapter> {
    const adapter = await this.#stock.connect();
    adapter.executeScript = (script) => this.#runWhole(script);
    return adapter;
  }

  async connectToShadowDb(): Promise<never> {
    throw new Error('Migrations are applied without a shadow database.');
  }

  async close(): Promise<void> {
    await this.#pool.end();
  }

  async #runWhole(script: string): Promise<void> {
    const bookkeeping = script.includes('_prisma_migrations');
    try {
      await this.#pool.query(bookkeeping ? script : script + markCommitted);
    } catch (error) {
      throw asAdapterError(error, script);
    }
  }
}

function asAdapterError(error: unknown, script: string): unknown {
  if (!(error instanceof pg.DatabaseError)) return error;
  const { code = 'N/A', severity = 'N/A', message, detail, column, hint, position } = error;
  const line = position === undefined ? '' : ` (line ${script.slice(0, Number(position)).split('\n').length})`;
  return new DriverAdapterError({ kind: 'postgres', code, severity, message: message + line, detail, column, hint });
}
