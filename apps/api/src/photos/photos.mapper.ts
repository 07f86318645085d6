import type { Actor } from '../common/actor';
import type { PhotoDto, PhotoUrlsDto } from './dto/photo.dto';
import { signedPhotoUrl } from './photo-urls';
import { photoActions } from './photos.policy';
import type { PhotoRow } from './photos.repository';

export type MappingContext = {
  readonly actor: Pick<Actor, 'role'>;
  readonly couponState: string;
  readonly secret: string;
  readonly now: Date;
};

export function toPhotoDto(row: PhotoRow, { actor, couponState, secret, now }: MappingContext): PhotoDto {
  return {
    id: row.id,
    couponId: row.couponId,
    state: row.state,
    refusedReason: row.refusedReason,
    widthPx: row.widthPx,
    heightPx: row.heightPx,
    capturedAt: row.capturedAt?.toISOString() ?? null,
    colourProfile: row.colourProfile,
    corners: row.corners,
    cornersFoundBy: row.cornersFoundBy,
    lightNotes: row.lightNotes,
    flags: row.flags,
    receivedSha256: row.receivedSha256,
    masterSha256: row.masterSha256,
    urls: photoUrls(row, secret, now),
    createdAt: row.createdAt.toISOString(),
    createdBy: row.createdBy,
    version: row.version,
    allowedActions: photoActions(actor, { ...row, couponState }, now),
  };
}

export type StoredPhoto = Pick<PhotoRow, 'shopId' | 'id' | 'masterSha256' | 'largeSha256' | 'smallSha256'>;

/** Signed addresses of a photo's three sizes; null until it is ready. */
export function photoUrls(
  { shopId, id, masterSha256, largeSha256, smallSha256 }: StoredPhoto,
  secret: string,
  now: Date,
): PhotoUrlsDto | null {
  if (masterSha256 === null || largeSha256 === null || smallSha256 === null) return null;
  const nowS = Math.floor(now.getTime() / 1000);
  const url = (size: 'master' | 'large' | 'small', sha256: string) => signedPhotoUrl({ shopId, photoId: id, size, sha256 }, secret, nowS);
  return { master: url('master', masterSha256), large: url('large', largeSha256), small: url('small', smallSha256) };
}
