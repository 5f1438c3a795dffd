/** One field that is wrong, what was given (where it may be shown) and what is allowed. */
export interface FieldError {
  field: string;
  value?: unknown;
  allowed: string;
  hint?: string;
}

export type ErrorLevel = 'debug' | 'info' | 'warn' | 'error';

export interface AppErrorOptions {
  /** Stable kebab-case word for clients; each class has its own default. */
  code?: string;
  fields?: readonly FieldError[];
  cause?: unknown;
}

interface Kind {
  code: string;
  status: number;
  level: ErrorLevel;
  title: string;
}

/** The one family of expected failures. Anything else that is thrown is a defect and is answered as 500. */
export abstract class AppError extends Error {
  readonly code: string;
  readonly status: number;
  readonly level: ErrorLevel;
  readonly title: string;
  readonly fields?: readonly FieldError[];

  protected constructor(kind: Kind, detail: string, options: AppErrorOptions = {}) {
    super(detail, options.cause === undefined ? undefined : { cause: options.cause });
    this.name = new.target.name;
    this.code = options.code ?? kind.code;
    this.status = kind.status;
    this.level = kind.level;
    this.title = kind.title;
    if (options.fields !== undefined) this.fields = options.fields;
  }
}

/** 400: the input breaks its schema. */
export class ValidationError extends AppError {
  declare readonly fields: readonly FieldError[];

  constructor(
    fields: readonly FieldError[],
    detail = 'The input does not fit its schema.',
    options: AppErrorOptions = {},
  ) {
    super({ code: 'invalid-input', status: 400, level: 'info', title: 'Invalid input' }, detail, {
      ...options,
      fields,
    });
  }
}

/** 401: nobody, or nobody known, is asking. */
export class UnauthenticatedError extends AppError {
  constructor(detail = 'A valid access key is needed.', options: AppErrorOptions = {}) {
    super({ code: 'unauthenticated', status: 401, level: 'info', title: 'Not signed in' }, detail, options);
  }
}

/** 403: known, but not allowed. */
export class ForbiddenError extends AppError {
  constructor(detail = 'This access does not allow it.', options: AppErrorOptions = {}) {
    super({ code: 'forbidden', status: 403, level: 'warn', title: 'Not allowed' }, detail, options);
  }
}

/** 404: not there, or not there for the one asking. */
export class NotFoundError extends AppError {
  constructor(detail = 'There is no such thing here.', options: AppErrorOptions = {}) {
    super({ code: 'not-found', status: 404, level: 'info', title: 'Not found' }, detail, options);
  }
}

/** 409: the state it would change has changed, or the same thing is there already. */
export class ConflictError extends AppError {
  constructor(detail: string, options: AppErrorOptions = {}) {
    super({ code: 'conflict', status: 409, level: 'info', title: 'Conflict' }, detail, options);
  }
}

/** 412: the version named by the client is no longer the current one. */
export class PreconditionFailedError extends AppError {
  constructor(detail = 'It was changed since it was read.', options: AppErrorOptions = {}) {
    super({ code: 'precondition-failed', status: 412, level: 'info', title: 'Changed meanwhile' }, detail, options);
  }
}

/** 413: more than is accepted at once. */
export class TooLargeError extends AppError {
  constructor(detail: string, options: AppErrorOptions = {}) {
    super({ code: 'too-large', status: 413, level: 'info', title: 'Too large' }, detail, options);
  }
}

/** 422: well-formed, but a rule of the domain refuses it. */
export class RuleError extends AppError {
  constructor(detail: string, fields?: readonly FieldError[], options: AppErrorOptions = {}) {
    super(
      { code: 'rule-broken', status: 422, level: 'info', title: 'Refused by a rule' },
      detail,
      fields === undefined ? options : { ...options, fields },
    );
  }
}

/** 428: the version the change is based on has to be named. */
export class PreconditionRequiredError extends AppError {
  constructor(detail = 'Name the version this change is based on.', options: AppErrorOptions = {}) {
    super({ code: 'precondition-required', status: 428, level: 'info', title: 'Version needed' }, detail, options);
  }
}

/** 503: right now it cannot be done; the same request may work later. */
export class UnavailableError extends AppError {
  constructor(detail = 'The service cannot answer right now.', options: AppErrorOptions = {}) {
    super({ code: 'unavailable', status: 503, level: 'error', title: 'Not available' }, detail, options);
  }
}
