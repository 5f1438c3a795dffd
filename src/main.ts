import { runApi } from './http-app.ts';
import { EnvError, readEnv } from './platform/env.ts';
import { serveUntilStopped } from './platform/serve-until-stopped.ts';

// The API process.
try {
  const api = await runApi(readEnv());
  serveUntilStopped(() => api.close(), api.url);
} catch (error) {
  process.stderr.write(`${error instanceof EnvError ? error.message : String((error as Error).stack)}\n`);
  process.exit(1);
}
