import { useCallback, useRef } from 'react';

const KEY_BYTES = 16;

/** 128 random bits in hexadecimal. `crypto.randomUUID` is missing on a plain-http tablet in the shop's own network. */
export function newIdempotencyKey(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(KEY_BYTES));
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
}

/**
 * Key for a form's submits. It stays while nobody knows what became of the request, so that trying again cannot do it twice,
 * and is renewed after an answer.
 */
export function useIdempotencyKey(): { current: () => string; renew: () => void } {
  const key = useRef<string>(undefined);
  const current = useCallback(() => {
    key.current ??= newIdempotencyKey();
    return key.current;
  }, []);
  const renew = useCallback(() => {
    key.current = undefined;
  }, []);
  return { current, renew };
}
