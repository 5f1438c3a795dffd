import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { NotFoundError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import { AuditService } from './audit.service.ts';
import { hashToken, newToken } from './token.ts';
import { TokensRepository } from './tokens.repository.ts';
import type { TokenInput } from './tokens.schema.ts';
import type { AccessToken, IssuedToken } from './tokens.types.ts';

const dayMs = 86_400_000;

@Injectable()
export class TokensService {
  constructor(
    private readonly tokens: TokensRepository,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  /** The secret is in this answer and nowhere else; stored is its hash. */
  async issue(clubId: string, personId: string, { label, validDays }: TokenInput): Promise<IssuedToken> {
    const createdAt = this.clock.now();
    const expiresAt = new Date(createdAt.getTime() + validDays * dayMs);
    const id = newId(createdAt);
    const secret = newToken(clubId);
    await this.tokens.insert({ id, personId, label, tokenHash: hashToken(secret), createdAt, expiresAt });
    await this.audit.record('tokens.write', 'token', id, { personId, validDays });
    return { id, label, secret, expiresAt: expiresAt.toISOString() };
  }

  async list(personId: string): Promise<AccessToken[]> {
    return this.tokens.list(personId);
  }

  /** @throws {NotFoundError} */
  async revoke(personId: string, id: string): Promise<void> {
    const known = await this.tokens.revoke(personId, id, this.clock.now());
    if (!known) throw new NotFoundError();
    await this.audit.record('tokens.revoke', 'token', id, { personId });
  }
}
