/** One request as a handler sees it. */
export type FakeRequest = { method: string; path: string; query: URLSearchParams; headers: Headers; body: unknown };
export type FakeAnswer = { status?: number; body?: unknown; headers?: Record<string, string> };
export type FakeHandler = (request: FakeRequest) => FakeAnswer | Promise<FakeAnswer>;

const underWay = new Set<Promise<Response>>();
const MOST_TURNS = 50;

/** Lets answers arrive that a page asked for before it left, so that the next test's page does not wait for them; one that never comes is left. */
export async function settleRequests(): Promise<void> {
  const turn = () => new Promise((resolve) => setTimeout(resolve, 0));
  for (let turns = 0; underWay.size > 0 && turns < MOST_TURNS; turns += 1) await turn();
  // what waits for the answer takes its own turn
  await turn();
}

/**
 * Stands in for the api in a page's test: answers by "METHOD /path" and keeps what was asked.
 * A request that no handler expects fails the test loudly instead of hanging it.
 */
export function fakeServer(handlers: Readonly<Record<string, FakeHandler>>) {
  const requests: FakeRequest[] = [];
  const original = globalThis.fetch;
  const answer = async (input: RequestInfo | URL, init?: RequestInit): Promise<Response> => {
    const asked = await read(new Request(input instanceof Request ? input : new URL(String(input), globalThis.location.origin), init));
    requests.push(asked);
    const handler = handlers[`${asked.method} ${asked.path}`];
    if (handler === undefined) throw new Error(`The fake server has no answer for ${asked.method} ${asked.path}`);
    const { status = 200, body, headers } = await handler(asked);
    return new Response(body === undefined ? null : JSON.stringify(body), {
      status,
      headers: { 'content-type': status >= 400 ? 'application/problem+json' : 'application/json', ...headers },
    });
  };
  globalThis.fetch = (input, init) => {
    const answered = answer(input, init).finally(() => underWay.delete(answered));
    underWay.add(answered);
    return answered;
  };
  return {
    requests,
    /** Bodies sent to one operation. */
    bodies: (operation: string) => requests.filter(({ method, path }) => `${method} ${path}` === operation).map(({ body }) => body),
    restore: () => {
      globalThis.fetch = original;
    },
  };
}

/** A connection that is gone. */
export function lostConnection(): never {
  throw new TypeError('fetch failed');
}

/** A refusal as the api sends it. */
export function problem(status: number, code: string, title: string, rest: Record<string, unknown> = {}): FakeAnswer {
  return { status, body: { type: `/problems/${code}`, status, code, title, detail: title, ...rest } };
}

async function read(request: Request): Promise<FakeRequest> {
  const { pathname, searchParams } = new URL(request.url);
  const text = await request.text();
  return {
    method: request.method,
    path: pathname,
    query: searchParams,
    headers: request.headers,
    body: text === '' ? undefined : JSON.parse(text),
  };
}
