import { createCipheriv, createDecipheriv, hkdfSync, randomBytes } from 'node:crypto';

const CIPHER = 'aes-256-gcm';
const KEY_BYTES = 32;
const IV_BYTES = 12;
const TAG_BYTES = 16;

/** Encrypts `token` so that only whoever holds `opener` (and this server's secret) gets it back. */
export function sealToken(token: string, opener: string, secret: string): string {
  const iv = randomBytes(IV_BYTES);
  const cipher = createCipheriv(CIPHER, keyOf(opener, secret), iv);
  const sealed = Buffer.concat([cipher.update(token, 'utf8'), cipher.final()]);
  return Buffer.concat([iv, cipher.getAuthTag(), sealed]).toString('base64url');
}

/** @throws Error when opener or secret do not belong to the sealed text */
export function openToken(sealed: string, opener: string, secret: string): string {
  const bytes = Buffer.from(sealed, 'base64url');
  const decipher = createDecipheriv(CIPHER, keyOf(opener, secret), bytes.subarray(0, IV_BYTES));
  decipher.setAuthTag(bytes.subarray(IV_BYTES, IV_BYTES + TAG_BYTES));
  return Buffer.concat([decipher.update(bytes.subarray(IV_BYTES + TAG_BYTES)), decipher.final()]).toString('utf8');
}

const keyOf = (opener: string, secret: string) =>
  Buffer.from(hkdfSync('sha256', secret, opener, 'proofplate refresh successor', KEY_BYTES));
