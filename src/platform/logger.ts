import { types } from 'node:util';
import { pino } from 'pino';
import type { DestinationStream, Logger, LoggerOptions } from 'pino';
import type { Env } from './env.ts';

interface LoggedRequest {
  id?: unknown;
  method?: unknown;
  originalUrl?: unknown;
  url?: unknown;
}

/**
 * What may be written about a request: never its body, headers, query or parameters beyond the path, because all of
 * them can carry health data or access keys.
 */
export const requestSerializers = {
  req: ({ id, method, originalUrl, url }: LoggedRequest) => {
    // Middleware sees a shortened url and the whole one beside it.
    const whole = originalUrl ?? url;
    return { id, method, path: typeof whole === 'string' ? whole.split('?', 1)[0] : undefined };
  },
  res: (response: { statusCode?: unknown }) => ({ status: response.statusCode }),
  err: (error: unknown) => errorForLog(error),
};

/** Options shared by the process logger and the one of the HTTP server. */
export function loggerOptions(env: Pick<Env, 'LOG_LEVEL'>): LoggerOptions {
  return {
    level: env.LOG_LEVEL,
    base: { pid: process.pid },
    timestamp: () => `,"time":"${new Date().toISOString()}"`,
    serializers: requestSerializers,
    redact: { paths: ['body', '*.body', 'password', '*.password', '*.authorization', 'headers', '*.headers'] },
    hooks: {
      // Without a message of its own, a line about an error would take the error's, past the serializer.
      logMethod(args, method) {
        const first: unknown = args[0];
        const error = types.isNativeError(first) ? first : (first as { err?: unknown } | null | undefined)?.err;
        if (types.isNativeError(error) && args.length === 1)
          method.call(this, first as object, errorForLog(error).message);
        else method.apply(this, args);
      },
    },
  };
}

/** For pino-http, which otherwise hands the serializers copies it has made itself: an error would be none any more. */
export function httpLoggerOptions(env: Pick<Env, 'LOG_LEVEL'>): LoggerOptions & { wrapSerializers: false } {
  return { ...loggerOptions(env), wrapSerializers: false };
}

export function createLogger(env: Pick<Env, 'LOG_LEVEL'>, destination?: DestinationStream): Logger {
  return destination === undefined ? pino(loggerOptions(env)) : pino(loggerOptions(env), destination);
}

interface ErrorForLog {
  type: string;
  message: string;
  code?: unknown;
  status?: unknown;
  stack?: string;
  cause?: ErrorForLog;
}

/** Kind, code and place. Errors of the database repeat statement and values in their message: that is left out. */
function errorForLog(error: unknown, depth = 0): ErrorForLog {
  if (!types.isNativeError(error)) return { type: typeof error, message: 'something else than an error was thrown' };
  const { code, status } = error as Error & { code?: unknown; status?: unknown };
  const type = error.constructor.name;
  const places = (error.stack ?? '').split('\n').filter((line) => /^\s+at /.test(line));
  return {
    type,
    message: isOfDatabase(error) ? 'database error' : error.message,
    ...(code === undefined ? {} : { code }),
    ...(status === undefined ? {} : { status }),
    stack: places.join('\n'),
    ...(error.cause === undefined || depth === 4 ? {} : { cause: errorForLog(error.cause, depth + 1) }),
  };
}

function isOfDatabase(error: Error): boolean {
  return [error.name, error.constructor.name].some((name) => /^(Prisma|DatabaseError|DriverAdapterError)/.test(name));
}
