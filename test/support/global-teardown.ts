import type { StopTestServer } from './global-setup.ts';

export default async function globalTeardown(): Promise<void> {
  await (globalThis as { stopTestServer?: StopTestServer }).stopTestServer?.();
}
