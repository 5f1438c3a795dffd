import { createHash, timingSafeEqual } from 'node:crypto';
import { ValidationError } from '../../platform/errors.ts';
import type { AppRequest } from './request.types.ts';

/** What stands behind `Authorization: Bearer`; null without it. */
export function bearerOf(request: AppRequest): string | null {
  return /^Bearer ([\x21-\x7e]{1,512})$/i.exec(request.headers.authorization ?? '')?.[1] ?? null;
}

/** Compares secrets in a time that tells nothing about where they differ. */
export function sameSecret(a: string, b: string): boolean {
  const digest = (text: string) => createHash('sha256').update(text).digest();
  return timingSafeEqual(digest(a), digest(b));
}

/** The `Idempotency-Key` of a POST; null without one. @throws {ValidationError} */
export function idempotencyKeyOf(request: AppRequest): string | null {
  const given = request.headers['idempotency-key'];
  if (request.method !== 'POST' || given === undefined) return null;
  if (typeof given === 'string' && /^[\x21-\x7e]{1,200}$/.test(given)) return given;
  throw new ValidationError([{ field: 'Idempotency-Key', allowed: '1 to 200 visible ASCII characters' }]);
}
