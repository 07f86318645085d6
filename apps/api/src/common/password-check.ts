import type { Actor } from './actor';

/**
 * Confirms that the person at the keyboard is the signed-in member, for signed acts. Implemented by auth, injectable everywhere.
 * Call it before the transaction: hashing takes time and must not hold locks.
 */
export abstract class PasswordCheck {
  /** @throws PasswordNotConfirmedError 403 when it is wrong, TooManyError 429 after too many wrong ones in a row */
  abstract confirm(actor: Actor, password: string): Promise<void>;
}
