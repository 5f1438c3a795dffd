import { Injectable } from '@nestjs/common';
import { z } from 'zod';
import { IdempotencyRepository } from '../features/access/idempotency.repository.ts';
import type { StoredAnswer } from '../features/access/idempotency.types.ts';
import { Prisma } from './generated/client.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';
import { holdName } from './sql/hold-name.sql.ts';

const headersSchema = z.record(z.string(), z.string());

@Injectable()
export class PrismaIdempotencyRepository extends IdempotencyRepository {
  async hold(key: string): Promise<void> {
    const { clubId, personId } = person();
    await holdName(currentTransaction(), `idempotency|${clubId}|${personId}|${key}`);
  }

  async find(key: string): Promise<StoredAnswer | null> {
    const { personId } = person();
    const row = await currentTransaction().idempotencyKey.findFirst({ where: { personId, key } });
    if (row === null) return null;
    const { requestHash, status, body, headers } = row;
    return { requestHash, status, body, headers: headersSchema.parse(headers) };
  }

  async insert(key: string, { requestHash, status, body, headers }: StoredAnswer, at: Date): Promise<void> {
    const stored = body === null || body === undefined ? Prisma.JsonNull : (body as Prisma.InputJsonValue);
    await currentTransaction().idempotencyKey.create({
      data: { ...person(), key, requestHash, status, body: stored, headers, createdAt: at },
    });
  }
}

function person(): { clubId: string; personId: string } {
  const { clubId, personId } = currentScope();
  if (personId === null) throw new Error('an idempotency key belongs to a person');
  return { clubId, personId };
}
