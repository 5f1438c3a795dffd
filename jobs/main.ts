import { SystemClock } from '../src/platform/clock.ts';
import { EnvError, readEnv } from '../src/platform/env.ts';
import { serveUntilStopped } from '../src/platform/serve-until-stopped.ts';
import { runWorker } from './worker.ts';

// The worker process.
try {
  const env = readEnv();
  const context = await runWorker(env, new SystemClock(env.LOADWEIR_CLOCK_OFFSET_MS));
  serveUntilStopped(() => context.close());
} catch (error) {
  process.stderr.write(`${error instanceof EnvError ? error.message : String((error as Error).stack)}\n`);
  process.exit(1);
}
