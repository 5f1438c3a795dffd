import { pino, stdSerializers } from 'pino';
import type { DestinationStream, Logger, LoggerOptions } from 'pino';
import type { Env } from './env.ts';

/**
 * What may be written about a request: never its body, headers, query or parameters beyond the path, because all of
 * them can carry health data or access keys.
 */
export const requestSerializers = {
  req: (request: { id?: unknown; method?: unknown; url?: unknown }) => ({
    id: request.id,
    method: request.method,
    path: typeof request.url === 'string' ? request.url.split('?', 1)[0] : undefined,
  }),
  res: (response: { statusCode?: unknown }) => ({ status: response.statusCode }),
  err: (error: Error) => withoutData({ ...stdSerializers.err(error) }),
};

const kept = new Set(['type', 'message', 'stack', 'code', 'status']);

/** Database errors repeat the statement and its values in their message: only their kind, code and place are kept. */
function withoutData(error: Record<string, unknown>): Record<string, unknown> {
  const entries = Object.entries(error).filter(([key]) => kept.has(key));
  const quiet = Object.fromEntries(entries);
  if (!/^(Prisma|DatabaseError|DriverAdapterError)/.test(String(error.type))) return quiet;
  const places = String(error.stack)
    .split('\n')
    .filter((line) => /^\s+at /.test(line));
  return { ...quiet, message: 'database error', stack: places.join('\n') };
}

/** Options shared by the process logger and the one of the HTTP server. */
export function loggerOptions(env: Pick<Env, 'LOG_LEVEL'>): LoggerOptions {
  return {
    level: env.LOG_LEVEL,
    base: { pid: process.pid },
    timestamp: () => `,"time":"${new Date().toISOString()}"`,
    serializers: requestSerializers,
    redact: { paths: ['body', '*.body', 'password', '*.password', '*.authorization', 'headers', '*.headers'] },
  };
}

export function createLogger(env: Pick<Env, 'LOG_LEVEL'>, destination?: DestinationStream): Logger {
  return destination === undefined ? pino(loggerOptions(env)) : pino(loggerOptions(env), destination);
}
