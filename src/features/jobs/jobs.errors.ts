import { ConflictError } from '../../platform/errors.ts';

/** An attempt at a job found that a later one has taken over, or that the run is done: it must write nothing more. */
export class StaleAttemptError extends ConflictError {
  constructor(run: string, attempt: number) {
    super(`Attempt ${attempt} at ${run} was overtaken by a later one.`, { code: 'attempt-overtaken' });
  }
}
