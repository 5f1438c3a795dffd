import { mkdirSync, renameSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';

/** Appears whole, readable by its owner: the files hold what athletes told. */
export function writeWhole(file: string, content: string | Buffer): void {
  mkdirSync(dirname(file), { recursive: true });
  const unfinished = `${file}.${process.pid}.tmp`;
  writeFileSync(unfinished, content, { mode: 0o600 });
  renameSync(unfinished, file);
}
