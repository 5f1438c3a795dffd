import { setTimeout as sleep } from 'node:timers/promises';

/** What the service answered when it did not do what was asked. */
export class ApiError extends Error {
  readonly status: number;
  readonly code: string;

  constructor(request: string, status: number, problem: Problem) {
    const errors = (problem.errors ?? []).map(
      ({ field, value, allowed }) => `\n  ${field}: ${JSON.stringify(value)}, allowed: ${allowed}`,
    );
    super(
      `${request} was answered ${status}: ${problem.detail ?? problem.title ?? 'no reason given'}${errors.join('')}`,
    );
    this.name = 'ApiError';
    this.status = status;
    this.code = (problem.type ?? '').split(':').at(-1)!;
  }
}

interface Problem {
  type?: string;
  title?: string;
  detail?: string;
  errors?: { field: string; value?: unknown; allowed: string }[];
}

export interface Call {
  token: string;
  body?: unknown;
  /** Repeating the call with the same key gives the same answer and does nothing twice. */
  key?: string;
}

const tries = 4;

/** The service as anybody reaches it: JSON over HTTP with a bearer token. */
export class ApiClient {
  readonly url: string;
  readonly #signal: AbortSignal | undefined;
  requests = 0;

  constructor(url: string, signal?: AbortSignal) {
    this.url = url;
    this.#signal = signal;
  }

  async get<T>(path: string, token: string): Promise<T> {
    return (await (await this.#send('GET', path, { token })).json()) as T;
  }

  async bytes(path: string, token: string): Promise<Buffer> {
    return Buffer.from(await (await this.#send('GET', path, { token })).arrayBuffer());
  }

  /** @throws {ApiError} */
  async post<T>(path: string, call: Call): Promise<T> {
    return (await (await this.#send('POST', path, call)).json()) as T;
  }

  /** A call that may be repeated is repeated when the line breaks or the service is busy. */
  async #send(method: 'GET' | 'POST', path: string, { token, body, key }: Call): Promise<Response> {
    for (let attempt = 1; ; attempt += 1) {
      const last = attempt === tries || (method === 'POST' && key === undefined);
      const response = await this.#once(method, path, { token, body, ...(key === undefined ? {} : { key }) }, last);
      if (response?.ok === true) return response;
      if (response !== null && (last || response.status < 500)) throw await refusal(`${method} ${path}`, response);
      await sleep(100 * 4 ** (attempt - 1), undefined, this.#signal === undefined ? {} : { signal: this.#signal });
    }
  }

  async #once(method: string, path: string, { token, body, key }: Call, last: boolean): Promise<Response | null> {
    this.requests += 1;
    try {
      return await fetch(`${this.url}${path}`, {
        method,
        headers: {
          authorization: `Bearer ${token}`,
          ...(body === undefined ? {} : { 'content-type': 'application/json' }),
          ...(key === undefined ? {} : { 'idempotency-key': key }),
        },
        ...(body === undefined ? {} : { body: JSON.stringify(body) }),
        ...(this.#signal === undefined ? {} : { signal: this.#signal }),
      });
    } catch (error) {
      if (last || this.#signal?.aborted === true) throw error;
      return null;
    }
  }
}

async function refusal(request: string, response: Response): Promise<ApiError> {
  const problem = (await response.json().catch(() => ({}))) as Problem;
  return new ApiError(request, response.status, problem);
}
