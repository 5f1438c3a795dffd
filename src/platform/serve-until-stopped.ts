/** What a service process tells the process that started it. */
export interface ReadyMessage {
  ready: true;
  /** Where it listens, if it does. */
  url?: string;
}

/**
 * Says that the service is ready and closes it once: on SIGTERM or SIGINT, and when the process that started it is gone.
 * The process ends when `close` has ended, or after `patienceMs`.
 */
export function serveUntilStopped(close: () => Promise<void>, url?: string, patienceMs = 30_000): void {
  let closing = false;
  const stop = (): void => {
    if (closing) return;
    closing = true;
    setTimeout(() => process.exit(1), patienceMs).unref();
    close().then(
      () => process.exit(0),
      (error: unknown) => {
        process.stderr.write(`stopping failed: ${error instanceof Error ? String(error.stack) : String(error)}\n`);
        process.exit(1);
      },
    );
  };
  for (const signal of ['SIGTERM', 'SIGINT', 'disconnect'] as const) process.on(signal as 'SIGTERM', stop);
  // The process that started it may have gone while it was starting.
  if (process.send !== undefined && !process.connected) stop();
  else process.send?.({ ready: true, ...(url === undefined ? {} : { url }) } satisfies ReadyMessage);
}
