import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { bindMigrationAwareSqlAdapterFactory } from '@prisma/driver-adapter-utils';
import { SchemaEngine } from '@prisma/schema-engine-wasm';
import { startEmbedded } from '../src/platform/embedded/start-embedded.ts';
import { MigrationAdapterFactory } from './migration-adapter.ts';

const HELP = `Prints the SQL that leads from the last commit's schema.prisma to the one in the working tree, to start a new
migration from: npm run -s draft > prisma/migrations/NNNN_what/migration.sql

Checks, exclusions, foreign keys with club_id, functions and policies are written by hand: Prisma does not know them.
`;

/** A throw-away server, because the engine asks for a connection even where it only compares two texts. */
async function draft(before: string, after: string): Promise<string> {
  const dataDir = mkdtempSync(join(tmpdir(), 'loadweir-draft-'));
  const server = await startEmbedded({ dataDir, durable: false });
  const factory = new MigrationAdapterFactory(server.ownerUrl);
  try {
    const bound = bindMigrationAwareSqlAdapterFactory(factory);
    const engine = await SchemaEngine.new({ datamodels: [['schema.prisma', after]] }, () => undefined, bound);
    const { stdout } = await engine.diff({
      from: { tag: 'schemaDatamodel', files: [{ path: 'schema.prisma', content: before }] },
      to: { tag: 'schemaDatamodel', files: [{ path: 'schema.prisma', content: after }] },
      script: true,
      exitCode: null,
      filters: { externalTables: [], externalEnums: [] },
    });
    return stdout ?? '';
  } finally {
    await factory.close();
    await server.stop();
    rmSync(dataDir, { recursive: true, force: true });
  }
}

if (process.argv.includes('--help')) {
  process.stdout.write(HELP);
} else {
  const schema = fileURLToPath(new URL('./schema.prisma', import.meta.url));
  const committed = execFileSync('git', ['show', 'HEAD:./schema.prisma'], {
    cwd: fileURLToPath(new URL('.', import.meta.url)),
    encoding: 'utf8',
  });
  process.stdout.write(await draft(committed, readFileSync(schema, 'utf8')));
}
// The engine's timers would keep the process for another ten seconds.
process.exit(0);
