const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/;
const SHA256 = /^[0-9a-f]{64}$/;

/** Everything that is kept. A key names its content, so an object is written once and never replaced. */
export const KEPT_PREFIX = 'shop/';
/** Bytes as they were received, until they are processed. */
export const RECEIVED_PREFIX = 'received/';

export function keptObjectKey(shopId: string, sha256: string): string {
  if (!UUID.test(shopId) || !SHA256.test(sha256)) throw new RangeError('an object key is made of a shop id and a SHA-256');
  return `${KEPT_PREFIX}${shopId}/${sha256}`;
}

export function receivedObjectKey(shopId: string, uploadId: string): string {
  if (!UUID.test(shopId) || !UUID.test(uploadId)) throw new RangeError('a received object is named by a shop id and an upload id');
  return `${RECEIVED_PREFIX}${shopId}/${uploadId}`;
}

/** The shop and the last part of a key that one of the functions above made; undefined for any other name. */
export function parseObjectKey(key: string): { shopId: string; name: string } | undefined {
  const [, shopId = '', name = '', ...rest] = key.split('/');
  return UUID.test(shopId) && name !== '' && rest.length === 0 ? { shopId, name } : undefined;
}
