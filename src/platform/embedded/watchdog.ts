import { spawn } from 'node:child_process';
import { readFileSync, writeFileSync } from 'node:fs';
import { extname, join } from 'node:path';
import type { Socket } from 'node:net';
import { fileURLToPath } from 'node:url';
import { commandLine } from './server-process.ts';

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
  writeFileSync(pidFile(cluster), String(child.pid), { mode: 0o600 });
  return {
    serverStarted: () => child.stdin.write('started\n'),
    dismiss: async () => {
      child.ref();
      child.stdin.end('dismissed\n');
      await ended;
    },
  };
}

/** Whether some watchdog still looks after this cluster. */
export function isWatched(cluster: string): boolean {
  try {
    const command = commandLine(Number(readFileSync(pidFile(cluster), 'utf8')));
    return command !== undefined && command.includes('watchdog-main') && command.includes(cluster);
  } catch {
    return false;
  }
}

function pidFile(cluster: string): string {
  return join(cluster, 'loadweir-watchdog.pid');
}
