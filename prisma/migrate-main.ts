import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { bindMigrationAwareSqlAdapterFactory } from '@prisma/driver-adapter-utils';
import type { ErrorRegistry } from '@prisma/driver-adapter-utils';
import { SchemaEngine } from '@prisma/schema-engine-wasm';
import type { ApplyMigrationsInput, MigrationList } from '@prisma/schema-engine-wasm';
import type pg from 'pg';
import { withLock } from './lock.ts';
import { COMMITTED, MigrationAdapterFactory } from './migration-adapter.ts';

// Entry of the migration process: see migrate.ts. One order comes in, one answer goes out.
export interface MigrateOrder {
  url: string;
  migrationsDir: string;
}

export interface MigrateAnswer {
  applied: string[];
  notes: string[];
  error?: string;
}

async function migrate(order: MigrateOrder): Promise<MigrateAnswer> {
  const factory = new MigrationAdapterFactory(order.url);
  const bound = bindMigrationAwareSqlAdapterFactory(factory);
  const notes: string[] = [];
  try {
    const input = {
      migrationsList: readMigrations(order.migrationsDir),
      filters: { externalTables: [], externalEnums: [] },
    };
    // The engine itself gives up waiting for its lock after 10 s; this one waits for as long as migrations take.
    return await withLock(order.url, 'loadweir migrations', async (client) => {
      const engine = await SchemaEngine.new({ datamodels: undefined }, () => undefined, bound);
      notes.push(...(await settleUnfinished(engine, client, input)));
      await refuseForeignHistory(engine, input);
      try {
        const { appliedMigrationNames } = await engine.applyMigrations(input);
        return { applied: appliedMigrationNames, notes };
      } catch (error) {
        const detail = explain(error, bound.errorRegistry);
        notes.push(...(await settleUnfinished(engine, client, input)));
        return { applied: [], notes, error: detail };
      }
    });
  } catch (error) {
    return { applied: [], notes, error: explain(error, bound.errorRegistry) };
  } finally {
    await factory.close();
  }
}

/** A migration's script is one transaction, so one that was cut short or failed is either wholly there or not at all. */
async function settleUnfinished(
  engine: SchemaEngine,
  client: pg.Client,
  input: ApplyMigrationsInput,
): Promise<string[]> {
  const { failedMigrationNames } = await engine.diagnoseMigrationHistory({ ...input, optInToShadowDatabase: false });
  const notes: string[] = [];
  for (const migrationName of failedMigrationNames) {
    const { rows } = await client.query<{ logs: string | null }>(
      'select logs from _prisma_migrations where migration_name = $1 and finished_at is null and rolled_back_at is null',
      [migrationName],
    );
    if (rows[0]?.logs === COMMITTED) {
      await engine.markMigrationApplied({ migrationName, migrationsList: input.migrationsList });
      notes.push(`Migration ${migrationName} was applied, but its end was not recorded: now it is.`);
    } else {
      await engine.markMigrationRolledBack({ migrationName });
      notes.push(`Migration ${migrationName} did not come to its end; nothing of it is left.`);
    }
  }
  return notes;
}

async function refuseForeignHistory(engine: SchemaEngine, input: ApplyMigrationsInput): Promise<void> {
  const found = await engine.diagnoseMigrationHistory({ ...input, optInToShadowDatabase: false });
  if (found.editedMigrationNames.length > 0) {
    throw new Error(`Changed after it was applied: ${found.editedMigrationNames.join(', ')}.`);
  }
  if (found.history === null || found.history.diagnostic === 'databaseIsBehind') return;
  const unknown = found.history.unpersistedMigrationNames.join(', ');
  throw new Error(`The database was migrated by another version of this project: ${unknown} is not known here.`);
}

function readMigrations(folder: string): MigrationList {
  const baseDir = resolve(folder);
  const names = readdirSync(baseDir, { withFileTypes: true }).filter((entry) => entry.isDirectory());
  return {
    baseDir,
    lockfile: { path: 'migration_lock.toml', content: 'provider = "postgresql"\n' },
    shadowDbInitScript: '',
    migrationDirectories: names
      .map(({ name }) => name)
      .filter((name) => existsSync(join(baseDir, name, 'migration.sql')))
      .sort()
      .map((name) => ({
        path: name,
        migrationFile: {
          path: 'migration.sql',
          content: { tag: 'ok', value: readFileSync(join(baseDir, name, 'migration.sql'), 'utf8') },
        },
      })),
  };
}

/** What went wrong in words, without the engine's own trace; the adapter's errors arrive as a number to be looked up. */
function explain(error: unknown, registry: ErrorRegistry): string {
  const text = error instanceof Error ? error.message : String(error);
  const migration = /migration_name="([^"]+)"/.exec(text)?.[1];
  const id = /External error id#(\d+)/.exec(text)?.[1];
  const inner = id === undefined ? undefined : registry.consumeError(Number(id))?.error;
  const reason = inner instanceof Error ? inner.message : (text.split(/\n\s+0: /)[0] ?? text);
  return migration === undefined ? reason : `Migration ${migration} failed: ${reason.replace(/^.*\n(?=Error)/, '')}`;
}

process.once('message', (order) => {
  void migrate(order as MigrateOrder).then((answer) => {
    // The engine's timers would keep the process for another ten seconds.
    process.send?.(answer, () => process.exit(0));
  });
});
// Without the one who asked there is nobody to answer; the transaction under way is undone by the server.
process.once('disconnect', () => process.exit(1));
