import { UnavailableError } from '../errors.ts';

/**
 * Does something for each recipient; one whose mail cannot be handed over now does not keep the others waiting.
 * @throws {UnavailableError} the first failure, after all were tried; anything else at once
 */
export async function eachDespiteFailures<T>(recipients: readonly T[], send: (one: T) => Promise<unknown>) {
  let failure: UnavailableError | undefined;
  for (const one of recipients) {
    try {
      await send(one);
    } catch (error) {
      if (!(error instanceof UnavailableError)) throw error;
      failure ??= error;
    }
  }
  if (failure !== undefined) throw failure;
}
