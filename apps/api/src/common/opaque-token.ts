import { createHash, randomBytes } from 'node:crypto';

const TOKEN_BYTES = 32;
const UUID_BYTES = 16;

/** 256 random bits, as text for cookies and links. */
export const newOpaqueToken = () => randomBytes(TOKEN_BYTES).toString('base64url');

/** What the database keeps of a token. */
export const tokenHash = (token: string) => createHash('sha256').update(token, 'utf8').digest('hex');

/** A token that also says which shop it belongs to: nothing of a shop can be read before the transaction knows which one. */
export function newShopToken(shopId: string): string {
  return Buffer.concat([Buffer.from(shopId.replaceAll('-', ''), 'hex'), randomBytes(TOKEN_BYTES)]).toString('base64url');
}

/** The shop named in a token; undefined for text that is no token of ours. */
export function shopOfToken(token: string): string | undefined {
  const bytes = Buffer.from(token, 'base64url');
  if (bytes.length !== UUID_BYTES + TOKEN_BYTES) return undefined;
  const hex = bytes.subarray(0, UUID_BYTES).toString('hex');
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-');
}
