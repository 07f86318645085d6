import { ADDRESS_LIFE_S, isSignedPhotoUrl, type PhotoAddress, signedPhotoUrl } from './photo-urls';

const SECRET = 's'.repeat(40);
const NOW_S = 1_800_000_010;
const ADDRESS: PhotoAddress = {
  shopId: '01900000-0000-7000-8000-000000000001',
  photoId: '01900000-0000-7000-8000-000000000002',
  size: 'large',
  sha256: 'a'.repeat(64),
};

function given(nowS = NOW_S) {
  const query = new URL(signedPhotoUrl(ADDRESS, SECRET, nowS), 'http://x').searchParams;
  return { expires: Number(query.get('expires')), signature: query.get('signature') ?? '' };
}

describe('the address of a photo', () => {
  it('opens its photo until it expires, within five minutes', () => {
    const { expires, signature } = given();
    expect(expires - NOW_S).toBeGreaterThan(ADDRESS_LIFE_S / 2 - 1);
    expect(expires - NOW_S).toBeLessThanOrEqual(ADDRESS_LIFE_S);
    expect(isSignedPhotoUrl(ADDRESS, { expires, signature }, { secret: SECRET, nowS: NOW_S })).toBe(true);
    expect(isSignedPhotoUrl(ADDRESS, { expires, signature }, { secret: SECRET, nowS: expires })).toBe(false);
  });

  it('stays the same for a while, so that a browser can keep the picture', () => {
    expect(given(NOW_S + 1)).toEqual(given(NOW_S));
  });

  it.each([
    ['shop', { shopId: ADDRESS.photoId }],
    ['photo', { photoId: ADDRESS.shopId }],
    ['size', { size: 'master' as const }],
    ['object', { sha256: 'b'.repeat(64) }],
  ])('opens no other %s', (_, change) => {
    expect(isSignedPhotoUrl({ ...ADDRESS, ...change }, given(), { secret: SECRET, nowS: NOW_S })).toBe(false);
  });

  it('takes no other time, signature or secret', () => {
    const { expires, signature } = given();
    const now = { secret: SECRET, nowS: NOW_S };
    expect(isSignedPhotoUrl(ADDRESS, { expires: expires + 1, signature }, now)).toBe(false);
    expect(isSignedPhotoUrl(ADDRESS, { expires: Number.NaN, signature }, now)).toBe(false);
    expect(isSignedPhotoUrl(ADDRESS, { expires, signature: '' }, now)).toBe(false);
    expect(isSignedPhotoUrl(ADDRESS, { expires, signature: `${signature}=` }, now)).toBe(false);
    expect(isSignedPhotoUrl(ADDRESS, { expires, signature }, { secret: 'x'.repeat(40), nowS: NOW_S })).toBe(false);
  });
});
