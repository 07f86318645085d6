import { BadRequestError, ConflictError, ForbiddenError, InvalidError } from './domain-error';

export class IdempotencyKeyRequiredError extends BadRequestError {
  override readonly code = 'idempotency-key-required';
  override readonly title = 'This call needs an Idempotency-Key';

  constructor() {
    super('Send the header Idempotency-Key with 8 to 128 visible characters, new for each act and the same for each retry of it.');
  }
}

export class IdempotencyKeyReusedError extends InvalidError {
  override readonly code = 'idempotency-key-reused';
  override readonly title = 'This Idempotency-Key belongs to another request';

  constructor() {
    super('The key was used with other content. Use a new key for a new act.');
  }
}

export class RequestInFlightError extends ConflictError {
  override readonly code = 'request-in-flight';
  override readonly title = 'The same request is still being worked on';

  constructor() {
    super('Wait a moment and send it again with the same Idempotency-Key: you will get the answer of the first.');
  }

  override get headers() {
    return { 'retry-after': '1' };
  }
}

export class PasswordNotConfirmedError extends ForbiddenError {
  override readonly code = 'password-not-confirmed';
  override readonly title = 'The password is not right';

  constructor() {
    super('Nothing was signed. Type your password again.', { errors: [{ pointer: '#/password', detail: 'This is not your password.' }] });
  }
}
