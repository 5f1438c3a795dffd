import { spawn } from 'node:child_process';
import { readdirSync, rmSync, writeFileSync } from 'node:fs';
import { extname, join } from 'node:path';
import type { Socket } from 'node:net';
import { fileURLToPath } from 'node:url';
import { commandLine } from './server-process.ts';

// A file of this name and the watchdog's number lies in the cluster for as long as that watchdog may be there.
const prefix = 'loadweir-watchdog.';
const entry = fileURLToPath(new URL(`./watchdog-main${extname(import.meta.url)}`, import.meta.url));

export interface Watchdog {
  /** From now on a server is there to be stopped. */
  serverStarted(): void;
  /** Ends the watchdog without touching the server. */
  dismiss(): Promise<void>;
}

/**
 * A process of its own, outside the starter's process group, that waits for its standard input to close and then stops
 * the cluster's server. However the starter ends (also by SIGKILL), the system closes that pipe.
 */
export function startWatchdog(cluster: string): Watchdog {
  const child = spawn(process.execPath, [entry, cluster], {
    cwd: '/',
    detached: true,
    env: {},
    stdio: ['pipe', 'ignore', 'ignore'],
  });
  const ended = new Promise<void>((resolve) => {
    child.once('exit', () => resolve());
    child.once('error', () => resolve());
  });
  child.stdin.on('error', () => undefined);
  child.unref();
  (child.stdin as Socket).unref();
  const mark = join(cluster, `${prefix}${child.pid}`);
  writeFileSync(mark, '', { mode: 0o600 });
  return {
    serverStarted: () => child.stdin.write('started\n'),
    dismiss: async () => {
      child.ref();
      child.stdin.end('dismissed\n');
      await ended;
      rmSync(mark, { force: true });
    },
  };
}

/** Whether some watchdog looks after this cluster. Several may: two processes that start at the same moment. */
export function isWatched(cluster: string): boolean {
  const pids = readdirSync(cluster)
    .filter((name) => name.startsWith(prefix))
    .map((name) => Number(name.slice(prefix.length)));
  return pids.some((pid) => {
    const command = commandLine(pid);
    const alive = command !== undefined && command.includes('watchdog-main') && command.includes(cluster);
    if (!alive) rmSync(join(cluster, `${prefix}${pid}`), { force: true });
    return alive;
  });
}
