import { PreconditionRequiredError, ValidationError } from '../../platform/errors.ts';
import type { AppReply, AppRequest } from './request.types.ts';

/** The entity tag of a version: `"v3"`. */
export function etag(version: number): string {
  return `"v${version}"`;
}

/** Puts the version's tag on an answer. */
export function sendEtag(reply: AppReply, version: number): void {
  reply.header('etag', etag(version));
}

/**
 * The version a change is based on, from `If-Match: "v3"`.
 * @throws {PreconditionRequiredError} 428 without the header
 * @throws {ValidationError} 400 for anything but one such tag
 */
export function ifMatch(request: AppRequest): number {
  const given = request.headers['if-match'];
  if (given === undefined || given === '') {
    throw new PreconditionRequiredError('Send the ETag of the version this change is based on as If-Match.');
  }
  const version = /^"v(\d{1,9})"$/.exec(given)?.[1];
  if (version === undefined) {
    throw new ValidationError([{ field: 'If-Match', value: given.slice(0, 100), allowed: 'one ETag such as "v3"' }]);
  }
  return Number(version);
}
