/** JSON in which the order of an object's fields makes no difference. */
export function canonicalJson(value: unknown): string {
  return JSON.stringify(value ?? null, (_, inner: unknown) =>
    isPlain(inner) ? Object.fromEntries(Object.entries(inner).toSorted(([a], [b]) => (a < b ? -1 : 1))) : inner,
  );
}

/** A copy in which every field named `secret` is null. */
export function withoutSecrets(value: unknown): unknown {
  const text = JSON.stringify(value ?? null, (key, inner: unknown) => (key === 'secret' ? null : inner));
  return JSON.parse(text) as unknown;
}

function isPlain(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
