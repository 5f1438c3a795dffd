import { Injectable } from '@nestjs/common';
import { TokensRepository } from '../features/access/tokens.repository.ts';
import type { NewToken } from '../features/access/tokens.repository.ts';
import type { AccessToken } from '../features/access/tokens.types.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';

@Injectable()
export class PrismaTokensRepository extends TokensRepository {
  async insert({ tokenHash, ...token }: NewToken): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().accessToken.create({
      data: { ...token, clubId, tokenHash: new Uint8Array(tokenHash) },
    });
  }

  async list(personId: string): Promise<AccessToken[]> {
    const rows = await currentTransaction().accessToken.findMany({
      where: { personId },
      orderBy: [{ createdAt: 'desc' }, { id: 'desc' }],
    });
    return rows.map((row) => ({
      id: row.id,
      personId: row.personId,
      label: row.label,
      createdAt: row.createdAt.toISOString(),
      expiresAt: row.expiresAt.toISOString(),
      revokedAt: row.revokedAt?.toISOString() ?? null,
    }));
  }

  async revoke(personId: string, id: string, at: Date): Promise<boolean> {
    const tx = currentTransaction();
    const { count } = await tx.accessToken.updateMany({
      where: { personId, id, revokedAt: null },
      data: { revokedAt: at },
    });
    return count > 0 || (await tx.accessToken.count({ where: { personId, id } })) > 0;
  }
}
