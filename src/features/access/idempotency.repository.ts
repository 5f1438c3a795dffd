import type { StoredAnswer } from './idempotency.types.ts';

/** Answers by key of the club and person of the unit of work (port and DI token). */
export abstract class IdempotencyRepository {
  /** Waits until no other unit of work holds the key, then holds it until this one ends. */
  abstract hold(key: string): Promise<void>;
  abstract find(key: string): Promise<StoredAnswer | null>;
  abstract insert(key: string, answer: StoredAnswer, at: Date): Promise<void>;
}
