import { Injectable } from '@nestjs/common';
import { AuditRepository } from '../features/access/audit.repository.ts';
import type { AuditEntry } from '../features/access/audit.repository.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';

@Injectable()
export class PrismaAuditRepository extends AuditRepository {
  async insert({ detail, ...entry }: AuditEntry): Promise<void> {
    const { clubId, personId } = currentScope();
    await currentTransaction().auditEntry.create({ data: { ...entry, detail: { ...detail }, clubId, personId } });
  }
}
