import { createHash } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { RuleError } from '../../platform/errors.ts';
import { canonicalJson, withoutSecrets } from './canonical-json.ts';
import { IdempotencyRepository } from './idempotency.repository.ts';
import type { StoredAnswer } from './idempotency.types.ts';

/** Gives the same answer to the same request, once it was done: in the transaction of the work itself. */
@Injectable()
export class IdempotencyService {
  constructor(
    private readonly answers: IdempotencyRepository,
    private readonly clock: Clock,
  ) {}

  hash(method: string, url: string, body: unknown): string {
    return createHash('sha256')
      .update(`${method} ${url}\n${canonicalJson(body)}`)
      .digest('hex');
  }

  /**
   * Holds the key until the unit of work ends and answers what was stored for it, or null: then the work is still to be
   * done. A second request with the same key waits here for the first.
   * @throws {RuleError} if the key belongs to another request
   */
  async begin(key: string, requestHash: string): Promise<StoredAnswer | null> {
    await this.answers.hold(key);
    const stored = await this.answers.find(key);
    if (stored !== null && stored.requestHash !== requestHash) {
      throw new RuleError('The key was used for another request.', undefined, { code: 'idempotency-key-reused' });
    }
    return stored;
  }

  /** Keeps the answer, without the secrets that are shown only once. */
  async keep(key: string, answer: StoredAnswer): Promise<void> {
    await this.answers.insert(key, { ...answer, body: withoutSecrets(answer.body) }, this.clock.now());
  }
}
