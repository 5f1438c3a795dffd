import { ConflictError, RuleError } from '../../platform/errors.ts';
import type { FieldError } from '../../platform/errors.ts';

/** Why one of several sessions cannot be stored. */
export interface SessionFault extends FieldError {
  /** Its place among the sessions. */
  index: number;
  kind: 'rule' | 'conflict';
}

/** What a request calls a field of the session at a place. */
export type NameField = (index: number, field: string) => string;

/** Refuses all together, with every fault: 409 where each of them is a double entry, else 422. */
export function refuseFaults(faults: readonly SessionFault[], name: NameField): void {
  if (faults.length === 0) return;
  const fields = faults.map(({ index, kind: _, ...fault }) => ({ ...fault, field: name(index, fault.field) }));
  if (faults.every(({ kind }) => kind === 'conflict')) {
    throw new ConflictError('A session with this source and externalId is there already.', { fields });
  }
  throw new RuleError('A rule refuses the session; nothing was stored.', fields);
}
