import { runningServer, stopServer, until } from './server-process.ts';

// Entry of the watchdog process: see watchdog.ts.
const cluster = process.argv[2];
if (cluster === undefined) throw new Error('usage: watchdog-main <cluster folder>');

// Only the end of the input counts; a terminal's Ctrl-C or a stop of the whole group must not end the watch early.
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, () => undefined);

let heard = '';
for await (const chunk of process.stdin) heard += String(chunk);

if (!heard.includes('dismissed')) {
  // The starter may have died while the server was coming up.
  if (!heard.includes('started')) await until(() => runningServer(cluster) !== undefined, 10_000);
  await stopServer(cluster);
}
