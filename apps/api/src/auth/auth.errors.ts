import { ConflictError, ForbiddenError, UnauthenticatedError } from '../common/errors/domain-error';

/** One text for an unknown address, a wrong password and a missing account, so that nobody learns which addresses have one. */
export class WrongCredentialsError extends UnauthenticatedError {
  override readonly code = 'wrong-credentials';
  override readonly title = 'E-mail or password is not right';

  constructor() {
    super('Check both and try again. A forgotten password can be reset by mail.');
  }
}

export class SessionOverError extends UnauthenticatedError {
  override readonly code = 'session-over';
  override readonly title = 'This session is over';

  constructor() {
    super('Sign in again.');
  }
}

export class WrongOriginError extends ForbiddenError {
  override readonly code = 'wrong-origin';
  override readonly title = 'The request came from another site';

  constructor() {
    super('Session calls need the header X-Requested-By and come from the pages of this server.');
  }
}

export class NoShopError extends ForbiddenError {
  override readonly code = 'no-shop';
  override readonly title = 'You are in no shop';

  constructor() {
    super('Ask an owner of your shop for an invitation, or sign up a shop of your own.');
  }
}

export class AddressTakenError extends ConflictError {
  override readonly code = 'address-taken';
  override readonly title = 'The address cannot be used for a new shop';

  constructor() {
    super('If it is yours: use the password that belongs to it, or reset that password first.', {
      errors: [{ pointer: '#/email', detail: 'Use your existing password with this address, or another address.' }],
    });
  }
}

export class ResetNotUsableError extends ConflictError {
  override readonly code = 'reset-not-usable';
  override readonly title = 'This link cannot be used';

  constructor() {
    super('It was used or has run out. Ask for a new one.');
  }
}
