import { ValidationError } from '../../platform/errors.ts';

export interface Cursor {
  startedAt: Date;
  id: string;
}

/** A place in a list newest first, as text a client hands back unread. */
export function writeCursor({ startedAt, id }: Cursor): string {
  return Buffer.from(`${startedAt.toISOString()} ${id}`).toString('base64url');
}

/** @throws {ValidationError} for text that is not such a place */
export function readCursor(text: string): Cursor {
  const match = /^(\d{4}-\d{2}-\d{2}T[\d:.]+Z) ([0-9a-f-]{36})$/.exec(Buffer.from(text, 'base64url').toString());
  const startedAt = new Date(match?.[1] ?? NaN);
  const id = match?.[2];
  if (id === undefined || !isUuid(id) || Number.isNaN(startedAt.getTime())) {
    throw new ValidationError([{ field: 'cursor', value: text, allowed: 'the nextCursor of an earlier answer' }]);
  }
  return { startedAt, id };
}

function isUuid(text: string): boolean {
  return /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/.test(text);
}
