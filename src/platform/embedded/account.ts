import { readFileSync } from 'node:fs';
import { spawn } from 'node:child_process';
import { UnavailableError } from '../errors.ts';

/** The account the server runs as where the starting process is root, which PostgreSQL refuses. */
export interface Account {
  name: string;
  uid: number;
  gid: number;
}

/** `postgres`, or else `nobody`; undefined where the process is not root and needs no other account. */
export function serverAccount(): Account | undefined {
  if (process.getuid?.() !== 0) return undefined;
  const lines = readFileSync('/etc/passwd', 'utf8').split('\n');
  for (const name of ['postgres', 'nobody']) {
    const [, , uid, gid] = lines.find((line) => line.startsWith(`${name}:`))?.split(':') ?? [];
    if (uid !== undefined && gid !== undefined) return { name, uid: Number(uid), gid: Number(gid) };
  }
  throw new UnavailableError('As root an account named postgres or nobody is needed to run the embedded PostgreSQL.');
}

export interface Outcome {
  code: number | null;
  output: string;
}

/**
 * Runs a program to its end as that account, with an environment of our own: what the caller's environment says about
 * locale, time zone or PostgreSQL must not matter.
 */
export async function runAs(
  account: Account | undefined,
  file: string,
  args: readonly string[],
  input = '',
): Promise<Outcome> {
  return new Promise((resolve, reject) => {
    const child = spawn(file, args, {
      cwd: '/',
      env: { PATH: '/usr/local/bin:/usr/bin:/bin', LC_ALL: 'C', TZ: 'UTC' },
      stdio: ['pipe', 'pipe', 'pipe'],
      ...(account === undefined ? {} : { uid: account.uid, gid: account.gid }),
    });
    let output = '';
    const collect = (chunk: Buffer) => (output += chunk.toString());
    child.stdout.on('data', collect);
    child.stderr.on('data', collect);
    child.on('error', reject);
    child.on('close', (code) => resolve({ code, output }));
    child.stdin.on('error', () => undefined);
    child.stdin.end(input);
  });
}

/** Whether the account can enter the folder: only trying tells, since every folder above it counts too. */
export async function canEnter(account: Account | undefined, folder: string): Promise<boolean> {
  if (account === undefined) return true;
  return (await runAs(account, '/bin/sh', ['-c', 'cd "$1"', 'sh', folder])).code === 0;
}
