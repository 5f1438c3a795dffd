import { spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { chmodSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** A file of the build; these tests run what the build made, as the npm scripts do. */
export function built(path: string): string {
  const file = fileURLToPath(new URL(`../../../dist/${path}`, import.meta.url));
  if (!existsSync(file)) throw new Error(`${file} is not there: run npm run build first.`);
  return file;
}

export interface Finished {
  code: number | null;
  signal: NodeJS.Signals | null;
  stdout: string;
  stderr: string;
}

export interface Command {
  pid: number;
  /** What it has written so far. */
  output(): string;
  /** Resolves when its output matches. */
  says(pattern: RegExp, withinMs?: number): Promise<RegExpExecArray>;
  signal(signal: NodeJS.Signals): void;
  finished: Promise<Finished>;
}

/** Runs a file of the build with a bare environment and these variables. */
export function command(path: string, args: readonly string[], env: Record<string, string>): Command {
  const child: ChildProcess = spawn(process.execPath, [built(path), ...args], {
    env: { PATH: process.env.PATH, HOME: process.env.HOME, LOG_LEVEL: 'warn', ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let stdout = '';
  let stderr = '';
  child.stdout!.on('data', (part: Buffer) => (stdout += part.toString()));
  child.stderr!.on('data', (part: Buffer) => (stderr += part.toString()));
  const finished = new Promise<Finished>((resolve) => {
    child.once('close', (code, signal) => resolve({ code, signal, stdout, stderr }));
  });
  const output = () => stdout + stderr;
  return {
    pid: child.pid!,
    output,
    async says(pattern, withinMs = 40_000) {
      const end = Date.now() + withinMs;
      for (;;) {
        const found = pattern.exec(output());
        if (found !== null) return found;
        if (Date.now() > end || child.exitCode !== null) throw new Error(`never said ${pattern}:\n${output()}`);
        await pause(25);
      }
    },
    signal: (signal) => void child.kill(signal),
    finished,
  };
}

/** Processes below this one, at any depth. */
export function descendants(pid: number): number[] {
  const parents = new Map<number, number>();
  for (const name of readdirSync('/proc')) {
    if (!/^\d+$/.test(name)) continue;
    const stat = readStat(Number(name));
    if (stat !== null) parents.set(Number(name), stat.parent);
  }
  const found: number[] = [];
  for (const [child] of parents) {
    for (let up = parents.get(child); up !== undefined; up = parents.get(up)) {
      if (up === pid) found.push(child);
    }
  }
  return found;
}

/** A process that is there and not only waiting for its parent to take note of its end. */
export function isAlive(pid: number): boolean {
  const stat = readStat(pid);
  return stat !== null && stat.state !== 'Z';
}

function readStat(pid: number): { parent: number; state: string } | null {
  try {
    const after = readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ').pop()!.split(' ');
    return { state: after[0]!, parent: Number(after[1]) };
  } catch {
    return null;
  }
}

/** A folder that goes away with the test; the database server's account can enter it. */
export function temporaryFolder(): { path: string; remove(): void } {
  const path = mkdtempSync(join(tmpdir(), 'loadweir-command-'));
  chmodSync(path, 0o755);
  return { path, remove: () => rmSync(path, { recursive: true, force: true }) };
}

export const pause = (milliseconds: number) => new Promise<void>((resolve) => setTimeout(resolve, milliseconds));

export async function until(test: () => boolean | Promise<boolean>, withinMs = 20_000): Promise<void> {
  const end = Date.now() + withinMs;
  while (!(await test())) {
    if (Date.now() > end) throw new Error('it did not happen in time');
    await pause(25);
  }
}
