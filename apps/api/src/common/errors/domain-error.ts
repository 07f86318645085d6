/** One wrong field of a request: a JSON pointer as URI fragment and a sentence for people. */
export type FieldProblem = { readonly pointer: string; readonly detail: string };

/**
 * A refusal that the caller can understand and act on. `code` names the problem type (`/problems/<code>`, listed in docs/problems.md),
 * `detail` is for people and names the way out, `extensions` are extra members of the answer.
 */
export abstract class DomainError extends Error {
  abstract readonly code: string;
  abstract readonly status: number;
  abstract readonly title: string;
  readonly extensions: Readonly<Record<string, unknown>>;

  constructor(
    readonly detail: string,
    extensions: Readonly<Record<string, unknown>> = {},
  ) {
    super(detail);
    this.name = new.target.name;
    this.extensions = extensions;
  }

  /** Header fields that belong to the answer. */
  get headers(): Readonly<Record<string, string>> {
    return {};
  }
}

export class BadRequestError extends DomainError {
  readonly code: string = 'bad-request';
  readonly status = 400;
  readonly title: string = 'The request cannot be read';
}

export class UnauthenticatedError extends DomainError {
  readonly code: string = 'not-signed-in';
  readonly status = 401;
  readonly title: string = 'Sign in first';

  override get headers() {
    return { 'www-authenticate': 'Bearer' };
  }
}

export class ForbiddenError extends DomainError {
  readonly code: string = 'not-permitted';
  readonly status = 403;
  readonly title: string = 'Your role does not allow this';
}

export class NotFoundError extends DomainError {
  readonly code: string = 'not-found';
  readonly status = 404;
  readonly title: string = 'There is no such thing here';

  constructor(detail = 'It does not exist in this shop, or no longer. Go back to the list and choose again.', extensions = {}) {
    super(detail, extensions);
  }
}

export class ConflictError extends DomainError {
  readonly code: string = 'conflict';
  readonly status = 409;
  readonly title: string = 'This clashes with what is stored';
}

/** The caller edited an older version. Carries the present state, so that the difference can be shown without another call. */
export class StaleError extends DomainError {
  readonly code: string = 'stale-version';
  readonly status = 412;
  readonly title: string = 'Somebody changed this in the meantime';

  constructor(current: unknown, detail = 'Look at the present state, then make your change again.') {
    super(detail, { current });
  }
}

/** A well-formed request whose content is refused; names the fields where it can. */
export class InvalidError extends DomainError {
  readonly code: string = 'invalid-fields';
  readonly status = 422;
  readonly title: string = 'Some fields need another look';

  constructor(detail: string, errors: readonly FieldProblem[] = [], extensions: Readonly<Record<string, unknown>> = {}) {
    super(detail, errors.length > 0 ? { errors, ...extensions } : extensions);
  }
}

export class PreconditionRequiredError extends DomainError {
  readonly code: string = 'version-required';
  readonly status = 428;
  readonly title: string = 'Say which version you are changing';
}

export class TooManyError extends DomainError {
  readonly code: string = 'too-many-tries';
  readonly status = 429;
  readonly title: string = 'Too many tries';

  constructor(
    detail: string,
    readonly retryAfterSeconds: number,
  ) {
    super(detail);
  }

  override get headers() {
    return { 'retry-after': String(Math.max(1, Math.ceil(this.retryAfterSeconds))) };
  }
}

export class UnavailableError extends DomainError {
  readonly code: string = 'try-again';
  readonly status = 503;
  readonly title: string = 'Too busy at the moment';

  constructor(
    detail = 'Nothing was changed. Try again in a moment.',
    readonly retryAfterSeconds = 1,
  ) {
    super(detail);
  }

  override get headers() {
    return { 'retry-after': String(this.retryAfterSeconds) };
  }
}
