import { createHmac, timingSafeEqual } from 'node:crypto';

export const PHOTO_SIZES = ['master', 'large', 'small'] as const;
export type PhotoSize = (typeof PHOTO_SIZES)[number];

/** What an address stands for. */
export type PhotoAddress = { readonly shopId: string; readonly photoId: string; readonly size: PhotoSize; readonly sha256: string };

/** Addresses live between half of this and all of it: they change only now and then, so that a browser can keep the picture. */
export const ADDRESS_LIFE_S = 300;
const STEP_S = ADDRESS_LIFE_S / 2;
/** Keeps this key apart from other uses of the same secret. */
const PURPOSE = 'photo-address-v1';

/**
 * Address of a picture for an `<img>`, which sends no token. It opens this one size of this one photo for a few minutes, for whoever
 * was allowed to read the photo when it was made.
 */
export function signedPhotoUrl(address: PhotoAddress, secret: string, nowS: number): string {
  const expires = (Math.ceil(nowS / STEP_S) + 1) * STEP_S;
  const query = new URLSearchParams({
    shop: address.shopId,
    object: address.sha256,
    expires: String(expires),
    signature: sign(address, expires, secret),
  });
  return `/api/photos/${address.photoId}/${address.size}?${query}`;
}

export function isSignedPhotoUrl(
  address: PhotoAddress,
  given: { expires: number; signature: string },
  { secret, nowS }: { secret: string; nowS: number },
): boolean {
  const expected = Buffer.from(sign(address, given.expires, secret));
  const actual = Buffer.from(given.signature);
  const isGenuine = expected.length === actual.length && timingSafeEqual(expected, actual);
  return isGenuine && given.expires > nowS && given.expires <= nowS + ADDRESS_LIFE_S + STEP_S;
}

function sign({ shopId, photoId, size, sha256 }: PhotoAddress, expires: number, secret: string): string {
  const key = createHmac('sha256', secret).update(PURPOSE).digest();
  return createHmac('sha256', key).update([shopId, photoId, size, sha256, expires].join('\n')).digest('base64url');
}
