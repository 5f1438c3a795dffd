import {
  AppError,
  ConflictError,
  ForbiddenError,
  NotFoundError,
  RuleError,
  UnavailableError,
  ValidationError,
} from '../platform/errors.ts';
import type { FieldError } from '../platform/errors.ts';
import { constraintMessages } from './constraint-messages.ts';
import type { ConstraintMessage } from './constraint-messages.ts';

/** What the server said, whether it came through Prisma or through a bare connection. */
interface Complaint {
  sqlState: string;
  text: string;
  constraint?: string;
}

/**
 * Turns an error of the database into one of the application's family, by the constraint's name where it is known and
 * by its kind otherwise. Everything else, also a defect in a statement, comes back as it was. Values never leave.
 */
export function translateDatabaseError(
  error: unknown,
  messages: Readonly<Record<string, ConstraintMessage>> = constraintMessages,
): unknown {
  if (error instanceof AppError) return error;
  const complaint = complaintOf(error);
  if (complaint === undefined) return isUnreachable(error) ? new UnavailableError(undefined, { cause: error }) : error;
  const known = findMessage(complaint, messages);
  return known === undefined ? byState(complaint, error) : byMessage(known, error);
}

function byMessage(message: ConstraintMessage, cause: unknown): AppError {
  const { kind, code, ...field } = message;
  const fields: FieldError[] = [field];
  const options = { cause, fields, ...(code === undefined ? {} : { code }) };
  const detail = `${message.field}: ${message.allowed}`;
  switch (kind) {
    case 'conflict':
      return new ConflictError(detail, options);
    case 'rule':
      return new RuleError(detail, fields, options);
    case 'validation':
      return new ValidationError(fields, detail, options);
    case 'not-found':
      return new NotFoundError(detail, options);
  }
}

function byState({ sqlState, text }: Complaint, cause: unknown): unknown {
  switch (sqlState) {
    case '23505':
      return new ConflictError('The same thing is there already.', { cause });
    case '23P01':
      return new ConflictError('It overlaps with one that is there already.', { cause });
    case '23514':
      return new RuleError('A value is outside what is allowed.', undefined, { cause });
    case '23503':
    case '23001':
      return /^update or delete/.test(text) || sqlState === '23001'
        ? new ConflictError('It is still used elsewhere.', { code: 'still-used', cause })
        : new RuleError('It names something that is not there.', undefined, { code: 'unknown-reference', cause });
    case '22003':
      return new RuleError('A number is too large to be kept.', undefined, { code: 'number-out-of-range', cause });
    case '40001':
    case '40P01':
      return new ConflictError('It was changed at the same moment; the same request can be sent again.', {
        code: 'concurrent-change',
        cause,
      });
    case '42501':
      // A missing grant has the same state, but is a defect.
      return /row-level security/.test(text) ? new ForbiddenError(undefined, { cause }) : cause;
    default:
      return /^(08|53|57P)/.test(sqlState) ? new UnavailableError(undefined, { cause }) : cause;
  }
}

/** Servers may speak another language than English, so a known name is looked for wherever it stands. */
function findMessage(complaint: Complaint, messages: Readonly<Record<string, ConstraintMessage>>) {
  if (!/^(23|P0001)/.test(complaint.sqlState)) return undefined;
  if (complaint.constraint !== undefined && Object.hasOwn(messages, complaint.constraint)) {
    return messages[complaint.constraint];
  }
  const words = complaint.text.match(/[\p{L}\p{N}_$]+/gu) ?? [];
  const name = words.find((word) => Object.hasOwn(messages, word));
  return name === undefined ? undefined : messages[name];
}

function complaintOf(error: unknown): Complaint | undefined {
  if (!isRecord(error)) return undefined;
  const driverError = isRecord(error.meta) ? error.meta.driverAdapterError : error;
  const cause = isRecord(driverError) ? driverError.cause : undefined;
  if (isRecord(cause) && typeof cause.originalCode === 'string') {
    const { originalCode, originalMessage, constraint } = cause;
    return complaintFrom(originalCode, originalMessage, isRecord(constraint) ? constraint.index : undefined);
  }
  if (typeof error.code === 'string' && typeof error.severity === 'string') {
    return complaintFrom(error.code, error.message, error.constraint);
  }
  return undefined;
}

function complaintFrom(sqlState: string, text: unknown, constraint: unknown): Complaint {
  const complaint = { sqlState, text: typeof text === 'string' ? text : '' };
  return typeof constraint === 'string' ? { ...complaint, constraint } : complaint;
}

// Prisma: P1xxx no connection, P2024 none free in the pool, P2028 transaction not begun in time or taken away.
const unreachableCodes = /^(P1\d{3}|P2024|P2028|P2037|ECONNREFUSED|ECONNRESET|ENOTFOUND|ETIMEDOUT|EPIPE)$/;
const unreachableKinds = new Set(['DatabaseNotReachable', 'ConnectionClosed', 'SocketTimeout', 'TooManyConnections']);

function isUnreachable(error: unknown): boolean {
  if (!isRecord(error)) return false;
  if (typeof error.code === 'string' && unreachableCodes.test(error.code)) return true;
  const driverError = isRecord(error.meta) ? error.meta.driverAdapterError : error;
  const cause = isRecord(driverError) ? driverError.cause : undefined;
  return isRecord(cause) && typeof cause.kind === 'string' && unreachableKinds.has(cause.kind);
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}
