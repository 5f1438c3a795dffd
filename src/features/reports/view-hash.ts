import { createHash } from 'node:crypto';

/** JSON in which the order of an object's fields makes no difference. */
export function canonicalView(value: unknown): string {
  return JSON.stringify(value, (_, inner: unknown) =>
    typeof inner === 'object' && inner !== null && !Array.isArray(inner)
      ? Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)))
      : inner,
  );
}

export function sha256(content: string | Buffer): string {
  return createHash('sha256').update(content).digest('hex');
}
