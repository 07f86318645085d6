import type { PlatePhoto } from './flat-photo';
import type { PhotoPoint } from './photo-homography';

/** A photo of a plate as the api gives it. */
export type StoredPhoto = {
  urls: { large: string; small: string } | null;
  corners: readonly PhotoPoint[] | null;
  widthPx: number | null;
  heightPx: number | null;
};

/** A photo that can be laid flat: ready, with its corners found. */
export function platePhotoOf(photo: StoredPhoto | null, size: 'small' | 'large'): PlatePhoto | undefined {
  if (photo === null || photo.urls === null || photo.corners === null || photo.widthPx === null || photo.heightPx === null)
    return undefined;
  return { url: photo.urls[size], widthPx: photo.widthPx, heightPx: photo.heightPx, corners: photo.corners };
}
