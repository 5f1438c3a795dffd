import { HttpException } from '@nestjs/common';
import { AppError } from '../../platform/errors.ts';
import type { ErrorLevel, FieldError } from '../../platform/errors.ts';
import type { AppReply, AppRequest } from './request.types.ts';

/** A problem document (RFC 9457). */
export interface Problem {
  type: string;
  title: string;
  status: number;
  detail: string;
  instance: string;
  correlationId: string;
  errors?: readonly FieldError[];
}

/** What is told of an error, and how loudly it is logged. */
export interface Told {
  code: string;
  title: string;
  status: number;
  detail: string;
  level: ErrorLevel;
  fields?: readonly FieldError[];
}

const byStatus: Readonly<Record<number, Omit<Told, 'status' | 'level'>>> = {
  400: { code: 'malformed-request', title: 'Malformed request', detail: 'The request cannot be read.' },
  404: { code: 'not-found', title: 'Not found', detail: 'There is no such thing here.' },
  405: { code: 'method-not-allowed', title: 'Method not allowed', detail: 'This path does not know the method.' },
  408: { code: 'timeout', title: 'Too slow', detail: 'The request took too long to arrive.' },
  413: { code: 'too-large', title: 'Too large', detail: 'JSON may have 1 MiB, CSV 5 MiB.' },
  414: { code: 'path-too-long', title: 'Path too long', detail: 'The path or a part of it is too long.' },
  415: { code: 'unsupported-media-type', title: 'Unsupported media type', detail: 'Send the media type named for it.' },
  431: { code: 'headers-too-large', title: 'Headers too large', detail: 'The headers are too large.' },
  503: { code: 'unavailable', title: 'Not available', detail: 'The service cannot answer right now.' },
};

const defect: Told = {
  code: 'internal',
  title: 'Something went wrong',
  status: 500,
  detail: 'It was noted under the correlation id.',
  level: 'error',
};

/** What a client is told. Words of the framework, the database and of defects stay inside. */
export function tell(error: unknown): Told {
  if (error instanceof AppError) {
    const { code, title, status, message, level, fields } = error;
    return { code, title, status, detail: message, level, ...(fields === undefined ? {} : { fields }) };
  }
  const status = statusOf(error);
  const known = status === undefined ? undefined : byStatus[status];
  if (status === undefined || known === undefined) return defect;
  return { ...known, status, level: status >= 500 ? 'error' : 'info' };
}

/** Sends what is told as a problem document. */
export function sendProblem(request: AppRequest, reply: AppReply, { code, title, status, detail, fields }: Told): void {
  const problem: Problem = {
    type: `urn:loadweir:problem:${code}`,
    title,
    status,
    detail,
    instance: pathOf(request),
    correlationId: request.id,
    ...(fields === undefined ? {} : { errors: fields }),
  };
  if (status === 401) reply.header('www-authenticate', 'Bearer');
  void reply
    .status(status)
    .header('content-type', 'application/problem+json; charset=utf-8')
    .header('x-request-id', request.id)
    .send(JSON.stringify(problem));
}

/** Without the query, which may hold anything. */
export function pathOf({ url }: AppRequest): string {
  return url.split('?', 1)[0]!;
}

/** The framework's own refusals carry a status; everything else below 400 or without one is a defect. */
function statusOf(error: unknown): number | undefined {
  if (error instanceof HttpException) return error.getStatus();
  const status = (error as { statusCode?: unknown } | null)?.statusCode;
  return error instanceof Error && typeof status === 'number' ? status : undefined;
}
