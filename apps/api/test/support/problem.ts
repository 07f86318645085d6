/** What `app.inject` answers, as far as these checks need it. */
type Answer = { readonly statusCode: number; readonly headers: Readonly<Record<string, unknown>>; readonly body: string; json<T>(): T };

export type ProblemBody = {
  readonly type: string;
  readonly title: string;
  readonly status: number;
  readonly detail: string;
  readonly instance: string;
  readonly errors?: readonly { readonly pointer: string; readonly detail: string }[];
  readonly current?: unknown;
};

/** Asserts that an answer is this problem, in the form of RFC 9457, and gives its body. */
export function expectProblem(answer: Answer, status: number, code: string): ProblemBody {
  const seen = { status: answer.statusCode, contentType: answer.headers['content-type'], type: typeOf(answer.body) };
  expect(seen).toEqual({ status, contentType: 'application/problem+json; charset=utf-8', type: `/problems/${code}` });
  const body = answer.json<ProblemBody>();
  expect(body).toMatchObject({
    status,
    title: expect.any(String),
    detail: expect.any(String),
    instance: expect.stringMatching(/^urn:uuid:/),
  });
  return body;
}

/** The pointers of a validation problem, sorted. */
export const pointersOf = (problem: ProblemBody) => (problem.errors ?? []).map((error) => error.pointer).sort();

function typeOf(body: string): unknown {
  try {
    return (JSON.parse(body) as { type?: unknown }).type;
  } catch {
    return body;
  }
}
