import { execFileSync } from 'node:child_process';
import { existsSync, readFileSync, renameSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';

/** What the server's own lock file says. */
export interface RunningServer {
  pid: number;
  port: number;
  ready: boolean;
}

/** The command line of a process, or undefined when there is none with that number. */
export function commandLine(pid: number): string | undefined {
  try {
    if (existsSync('/proc/self/cmdline')) return readFileSync(`/proc/${pid}/cmdline`, 'utf8').replaceAll('\0', ' ');
    return execFileSync('ps', ['-p', String(pid), '-o', 'command='], { encoding: 'utf8' });
  } catch {
    return undefined;
  }
}

/** The server that really runs in this cluster; a lock file left behind by one that died says nothing. */
export function runningServer(cluster: string): RunningServer | undefined {
  const lines = readLock(cluster)?.split('\n');
  if (lines === undefined) return undefined;
  const pid = Number(lines[0]);
  if (!isServerOf(pid, cluster)) return undefined;
  return { pid, port: Number(lines[3]), ready: lines[7]?.trim() === 'ready' };
}

/**
 * Removes a lock file whose process is no longer this cluster's server. The server itself would only look whether some
 * process has that number, and refuse to start where numbers are soon used again (containers).
 */
export function removeStaleLock(cluster: string): void {
  const stale = readLock(cluster);
  if (stale === undefined || isServerOf(Number(stale.split('\n')[0]), cluster)) return;
  const lock = join(cluster, 'postmaster.pid');
  const aside = `${lock}.stale-${process.pid}`;
  try {
    renameSync(lock, aside);
  } catch {
    return; // somebody else was faster
  }
  // A server may have started between the reading and the renaming: then this is its lock, and it gets it back.
  if (readFileSync(aside, 'utf8') === stale) rmSync(aside);
  else renameSync(aside, lock);
}

/** Stops the cluster's server, if one runs, and returns when its lock file is gone. */
export async function stopServer(cluster: string): Promise<void> {
  for (const [signal, patienceMs] of [['SIGINT', 20_000] as const, ['SIGQUIT', 10_000] as const]) {
    const server = runningServer(cluster);
    if (server === undefined) return;
    try {
      process.kill(server.pid, signal);
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code !== 'ESRCH') throw error;
    }
    // The process may stay as a zombie where nobody collects orphans, so its lock file is what counts.
    if (await until(() => readLock(cluster) === undefined || !isServerOf(server.pid, cluster), patienceMs)) return;
  }
  throw new Error(`The database server in ${cluster} does not stop.`);
}

/** Looks every 20 ms; false when the time is over. */
export async function until(condition: () => boolean, patienceMs: number): Promise<boolean> {
  for (let waited = 0; !condition(); waited += 20) {
    if (waited >= patienceMs) return false;
    await sleep(20);
  }
  return true;
}

function isServerOf(pid: number, cluster: string): boolean {
  if (!Number.isInteger(pid) || pid <= 1) return false;
  const command = commandLine(pid);
  return command !== undefined && /postgres/.test(command) && command.includes(cluster);
}

function readLock(cluster: string): string | undefined {
  try {
    return readFileSync(join(cluster, 'postmaster.pid'), 'utf8');
  } catch {
    return undefined;
  }
}
