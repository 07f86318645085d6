/** One field of a request that was refused: where it is (JSON pointer into the body) and what to do about it. */
export type FieldProblem = { pointer: string; detail: string; code?: string };

export type ProblemBody = {
  type: string;
  title: string;
  status: number;
  code: string;
  detail: string;
  errors: readonly FieldProblem[];
};

/** Code of a request that never got an answer: nobody knows whether it was carried out. */
export const UNREACHABLE = 'unreachable';

/** A refusal as the api words it (RFC 9457), or the lack of an answer (status 0, code `unreachable`). */
export class ProblemError extends Error {
  override readonly name = 'ProblemError';
  readonly status: number;
  readonly type: string;
  readonly code: string;
  readonly title: string;
  readonly detail: string;
  readonly errors: readonly FieldProblem[];
  /** The whole answer: some problems carry more members, such as the current version of a record. */
  readonly body: Readonly<Record<string, unknown>>;

  constructor(problem: ProblemBody, body: Readonly<Record<string, unknown>> = {}) {
    super(`${problem.title}: ${problem.detail}`);
    this.status = problem.status;
    this.type = problem.type;
    this.code = problem.code;
    this.title = problem.title;
    this.detail = problem.detail;
    this.errors = problem.errors;
    this.body = body;
  }

  static unreachable(): ProblemError {
    return new ProblemError({
      type: 'about:blank',
      status: 0,
      code: UNREACHABLE,
      title: 'No answer from the server',
      detail: 'The connection was lost before an answer came.',
      errors: [],
    });
  }
}

/** Reads a refusal from an answer; an answer that is no problem document still becomes one with its status. */
export async function problemFromResponse(response: Response): Promise<ProblemError> {
  const body = await response
    .json()
    .then(asRecord)
    .catch((): Record<string, unknown> => ({}));
  return new ProblemError(
    {
      type: text(body.type, 'about:blank'),
      status: response.status,
      code: text(body.code, `http-${response.status}`),
      title: text(body.title, 'The server refused the request'),
      detail: text(body.detail, `The answer was ${response.status}.`),
      errors: Array.isArray(body.errors) ? body.errors.flatMap(fieldProblem) : [],
    },
    body,
  );
}

function fieldProblem(value: unknown): FieldProblem[] {
  const { pointer, detail, code } = asRecord(value);
  if (typeof pointer !== 'string' || typeof detail !== 'string') return [];
  return [typeof code === 'string' ? { pointer, detail, code } : { pointer, detail }];
}

function asRecord(value: unknown): Record<string, unknown> {
  return typeof value === 'object' && value !== null ? { ...value } : {};
}

function text(value: unknown, fallback: string): string {
  return typeof value === 'string' && value !== '' ? value : fallback;
}
