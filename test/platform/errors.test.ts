import { expect, test } from '@jest/globals';
import * as errors from '../../src/platform/errors.ts';

const { AppError } = errors;

test.each([
  [new errors.ValidationError([]), 400, 'invalid-input', 'info'],
  [new errors.UnauthenticatedError(), 401, 'unauthenticated', 'info'],
  [new errors.ForbiddenError(), 403, 'forbidden', 'warn'],
  [new errors.NotFoundError(), 404, 'not-found', 'info'],
  [new errors.ConflictError('x'), 409, 'conflict', 'info'],
  [new errors.PreconditionFailedError(), 412, 'precondition-failed', 'info'],
  [new errors.TooLargeError('x'), 413, 'too-large', 'info'],
  [new errors.RuleError('x'), 422, 'rule-broken', 'info'],
  [new errors.PreconditionRequiredError(), 428, 'precondition-required', 'info'],
  [new errors.UnavailableError(), 503, 'unavailable', 'error'],
])('%s', (error, status, code, level) => {
  expect(error).toBeInstanceOf(AppError);
  expect(error).toMatchObject({ status, code, level });
  expect(error.title).not.toBe('');
  expect(error.message).not.toBe('');
});

test('a feature names its own error, with code, fields and cause', () => {
  class SquadClosedError extends errors.ConflictError {}
  const cause = new Error('below');
  const fields = [{ field: 'squad', allowed: 'an open squad' }];
  const error = new SquadClosedError('The squad is closed.', { code: 'squad-closed', fields, cause });
  expect(error).toMatchObject({ name: 'SquadClosedError', code: 'squad-closed', fields, cause, status: 409 });
  expect(new errors.ConflictError('x').fields).toBeUndefined();
  expect(new errors.ValidationError(fields).fields).toEqual(fields);
  expect(new errors.RuleError('x', fields, { code: 'own' })).toMatchObject({ fields, code: 'own' });
});
