export interface AuditEntry {
  id: string;
  action: string;
  subject: string;
  subjectId: string | null;
  detail: object;
  at: Date;
}

/** What was done by whom (port and DI token). The person is the one the unit of work runs for. */
export abstract class AuditRepository {
  abstract insert(entry: AuditEntry): Promise<void>;
}
