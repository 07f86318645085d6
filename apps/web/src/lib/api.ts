import { type ApiClient, createApiClient, type FieldProblem, ProblemError } from '@proofplate/api-client';
import { currentAccessToken, refreshSession } from './session';

export { type FieldProblem, ProblemError };

export type Query = Readonly<Record<string, string | number | boolean | readonly string[] | null | undefined>>;
export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';
export type RequestOptions = {
  query?: Query | undefined;
  body?: unknown;
  /** Version of the record that the change starts from, as it was read. */
  version?: number | undefined;
  /** One per submitted form, so that a repeated request is carried out once. */
  idempotencyKey?: string | undefined;
  headers?: Readonly<Record<string, string>> | undefined;
  signal?: AbortSignal | undefined;
};

/** Typed client of all operations: `api.POST('/api/…', { body })`. */
export const api: ApiClient = createApiClient({ baseUrl: globalThis.location.origin, fetch: fetchWithSession });

/** One request by method and path; throws `ProblemError`. The type of the answer is the caller's claim, as with the api's own DTOs. */
export async function request<T>(method: Method, path: string, options: RequestOptions = {}): Promise<T> {
  const { data } = await untyped.request(method, path, {
    params: { query: definedOnly(options.query) },
    headers: requestHeaders(options),
    ...(options.body === undefined ? {} : { body: options.body }),
    ...(options.body instanceof FormData ? { bodySerializer: (body: unknown) => body } : {}),
    ...(options.signal === undefined ? {} : { signal: options.signal }),
  });
  // The server's DTO types end at the wire; the caller names the one it asked for.
  return data as T;
}

// The typed client takes literal paths only; SWR keys and hooks hold them as strings.
const untyped = api as unknown as {
  request(method: Method, path: string, init: Record<string, unknown>): Promise<{ data?: unknown }>;
};

async function fetchWithSession(original: Request): Promise<Response> {
  const retry = original.clone();
  const token = currentAccessToken();
  const response = await fetch(withToken(original, token));
  if (response.status !== 401 || token === undefined) return response;
  // Another request may have renewed the token meanwhile; then the new one is simply used.
  const isRenewed = currentAccessToken() !== token || (await refreshSession());
  return isRenewed ? fetch(withToken(retry, currentAccessToken())) : response;
}

function withToken(request: Request, token: string | undefined): Request {
  if (token !== undefined) request.headers.set('Authorization', `Bearer ${token}`);
  return request;
}

function requestHeaders({ version, idempotencyKey, headers }: RequestOptions): Record<string, string> {
  return {
    ...(version === undefined ? {} : { 'If-Match': `"v${version}"` }),
    ...(idempotencyKey === undefined ? {} : { 'Idempotency-Key': idempotencyKey }),
    ...headers,
  };
}

function definedOnly(query: Query = {}): Record<string, unknown> {
  return Object.fromEntries(Object.entries(query).filter(([, value]) => value !== undefined && value !== null && value !== ''));
}
