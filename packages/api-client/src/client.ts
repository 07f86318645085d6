import createFetchClient, { type Client, type Middleware } from 'openapi-fetch';
import type { paths } from './generated/api';
import { ProblemError, problemFromResponse } from './problem';

export type ApiClient = Client<paths>;

export type ApiClientOptions = {
  /** Origin of the api, for example `https://plates.example`. */
  baseUrl: string;
  /** Does the request; the caller adds tokens and retries here. */
  fetch: (request: Request) => Promise<Response>;
};

/** Typed client of every operation. A refusal throws `ProblemError`, and so does a request without an answer. */
export function createApiClient({ baseUrl, fetch }: ApiClientOptions): ApiClient {
  const client = createFetchClient<paths>({ baseUrl, fetch });
  client.use(refusalsThrow);
  return client;
}

const refusalsThrow: Middleware = {
  async onResponse({ response }) {
    if (!response.ok) throw await problemFromResponse(response);
    return undefined;
  },
  onError({ error }) {
    // A caller that gave up is no lost connection.
    if (error instanceof DOMException && error.name === 'AbortError') return error;
    return error instanceof ProblemError ? error : ProblemError.unreachable();
  },
};
