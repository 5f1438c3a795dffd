import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { newId } from '../../platform/ids.ts';
import { AuditRepository } from './audit.repository.ts';

@Injectable()
export class AuditService {
  constructor(
    private readonly entries: AuditRepository,
    private readonly clock: Clock,
  ) {}

  /** Notes in the unit of work under way what was done to what. Identifiers and dates only: never a health word. */
  async record(action: string, subject: string, subjectId: string | null, detail: object = {}): Promise<void> {
    const at = this.clock.now();
    await this.entries.insert({ id: newId(at), action, subject, subjectId, detail, at });
  }
}
