import { extname } from 'node:path';
import { serviceEnvironment } from '../../platform/env.ts';
import type { Env } from '../../platform/env.ts';
import { openDatabase } from '../support/open-database.ts';
import { operatorKey } from './operator-key.ts';
import type { OperatorKey } from './operator-key.ts';
import { ServiceProcess } from './service-process.ts';

export interface RunningServices {
  /** Address of the API. */
  url: string;
  operator: OperatorKey;
  /** Resolves with a sentence when a service ended by itself. */
  failed: Promise<string>;
  /** Services first, so that requests and jobs under way end; the database last. */
  stop(): Promise<void>;
  /** Ends the services at once; the database is still stopped properly. */
  kill(): void;
}

export interface StartOptions {
  log: (line: string) => void;
  /** Aborted when it is no longer wanted: what was started by then is stopped. */
  signal?: AbortSignal;
}

/** Database, API and worker, each in a process of its own. */
export async function startServices(env: Env, { log, signal }: StartOptions): Promise<RunningServices> {
  const operator = operatorKey(env);
  const database = await openDatabase(env, log);
  let services: ServiceProcess[] = [];
  const stop = async () => {
    await Promise.all(services.map((service) => service.stop()));
    await database.stop();
  };
  try {
    signal?.throwIfAborted();
    const childEnv = serviceEnvironment(database.env, { LOADWEIR_OPERATOR_KEY: operator.key });
    const api = new ServiceProcess('API', entry('../../main'), childEnv);
    const worker = new ServiceProcess('worker', entry('../../../jobs/main'), childEnv);
    services = [api, worker];
    const aborted = new Promise<never>((_, reject) => {
      signal?.addEventListener('abort', () => reject(signal.reason as Error), { once: true });
    });
    const [{ url }] = await Promise.race([Promise.all([api.ready(), worker.ready()]), aborted]);
    if (url === undefined) throw new Error('The API did not say where it listens.');
    const failed = Promise.race(services.map((service) => service.failed()));
    return { url, operator, failed, stop, kill: () => services.forEach((service) => service.kill()) };
  } catch (error) {
    await stop();
    throw error;
  }
}

/** From source and from the build alike. */
function entry(path: string): URL {
  return new URL(`${path}${extname(import.meta.url)}`, import.meta.url);
}
