import { defineConfig } from 'prisma/config';

// Generating and validating run as WebAssembly. Without this line the command would download an engine it never uses.
process.env.PRISMA_SCHEMA_ENGINE_BINARY ??= process.execPath;

export default defineConfig({
  schema: './schema.prisma',
  migrations: { path: './migrations' },
  ...(process.env.DATABASE_URL ? { datasource: { url: process.env.DATABASE_URL } } : {}),
});
