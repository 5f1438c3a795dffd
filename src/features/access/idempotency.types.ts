/** An answer that is given again when the same request comes with the same key. */
export interface StoredAnswer {
  /** sha-256 over method, path, query and body, as hex. */
  requestHash: string;
  status: number;
  body: unknown;
  headers: Record<string, string>;
}
