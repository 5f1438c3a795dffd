import { randomBytes } from 'node:crypto';
import { existsSync, linkSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import type { Env } from '../../platform/env.ts';

export interface OperatorKey {
  key: string;
  /** The file it is kept in; undefined where the environment gives it. */
  file?: string;
}

/** The key that may create clubs: the environment's, or the one kept under DATA_DIR, made at the first start. */
export function operatorKey(env: Pick<Env, 'LOADWEIR_OPERATOR_KEY' | 'DATA_DIR'>): OperatorKey {
  if (env.LOADWEIR_OPERATOR_KEY !== undefined) return { key: env.LOADWEIR_OPERATOR_KEY };
  const file = resolve(env.DATA_DIR, 'operator-key');
  if (!existsSync(file)) keep(file);
  const key = readFileSync(file, 'utf8').trim();
  if (key.length < 24) throw new Error(`The operator key in ${file} is shorter than 24 characters: delete the file.`);
  return { key, file };
}

/** Appears whole, readable by its owner only; of two that start at the same moment one makes it. */
function keep(file: string): void {
  mkdirSync(join(file, '..'), { recursive: true });
  const unfinished = `${file}.${process.pid}`;
  writeFileSync(unfinished, `${randomBytes(32).toString('base64url')}\n`, { mode: 0o600, flag: 'wx' });
  try {
    linkSync(unfinished, file);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
  } finally {
    rmSync(unfinished);
  }
}
