import type { DemoArguments } from './arguments.ts';

/** Where this run keeps its things; undefined folders are the installation's own. */
export interface DemoFolders {
  /** A folder that is thrown away, for --exit. */
  data?: string;
  outbox?: string;
}

/**
 * The environment of the demo's services. It never reaches a database or a mail server of the installation: the embedded
 * database and the outbox folder are used whatever else is set.
 */
export function demoEnvironment(
  given: NodeJS.ProcessEnv,
  { exit, today }: DemoArguments,
  { data, outbox }: DemoFolders,
): NodeJS.ProcessEnv {
  const { DATABASE_URL: _, DATABASE_APP_URL: __, SMTP_URL: ___, ...rest } = given;
  const { LOADWEIR_FIXED_TODAY: fixedToday, LOADWEIR_CLOCK_OFFSET_MS: offset, ...kept } = rest;
  return {
    ...kept,
    LOADWEIR_MODE: 'demo',
    LOG_LEVEL: given.LOG_LEVEL || 'warn',
    PORT: exit ? '0' : given.PORT || '0',
    ...(today === undefined
      ? { LOADWEIR_FIXED_TODAY: fixedToday, LOADWEIR_CLOCK_OFFSET_MS: offset }
      : { LOADWEIR_FIXED_TODAY: today }),
    ...(data === undefined ? {} : { DATA_DIR: data }),
    ...(outbox === undefined ? {} : { OUTBOX_DIR: outbox }),
  };
}
