import { EnvError } from '../../platform/env.ts';
import { endWithoutReader } from '../../platform/end-without-reader.ts';
import { AppError } from '../../platform/errors.ts';
import { UsageError } from './usage-error.ts';

/** Runs a command to its end. What the caller can mend is said in one line; anything else with its stack. */
export async function runCommand(main: (args: readonly string[]) => Promise<number>): Promise<void> {
  endWithoutReader();
  try {
    process.exitCode = await main(process.argv.slice(2));
  } catch (error) {
    process.stderr.write(`${told(error)}\n`);
    process.exitCode = error instanceof UsageError ? 2 : 1;
  }
}

function told(error: unknown): string {
  if (error instanceof UsageError || error instanceof EnvError || error instanceof AppError) return error.message;
  return error instanceof Error ? String(error.stack) : String(error);
}
