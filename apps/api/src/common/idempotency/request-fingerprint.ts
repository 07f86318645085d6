import { createHash } from 'node:crypto';

/** Field names whose values must leave no trace, not even a hash that could be guessed at. */
const SECRET = /password|token/i;

/**
 * Tells whether two requests with the same key ask for the same thing. Passwords stay out of it: the fingerprint is stored, and a
 * fast hash of a body that is known but for the password would let whoever reads the table try passwords at leisure.
 */
export function requestFingerprint(request: { readonly method: string; readonly url: string; readonly body?: unknown }): string {
  const body = JSON.stringify(request.body ?? null, (name, value: unknown) => (SECRET.test(name) ? undefined : value));
  return createHash('sha256').update(`${request.method} ${request.url}\n${body}`).digest('hex');
}
