import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { InvalidError, NotFoundError, StaleError } from '../common/errors/domain-error';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { Env } from '../config/env.validation';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { JobsService } from '../jobs/jobs.service';
import { LedgerService } from '../ledger/ledger.service';
import { cornersFault } from './corners';
import type { ListPhotosQuery } from './dto/list-photos.query.dto';
import type { PhotoDto, PhotoUrlsDto, PlatePhotoDto } from './dto/photo.dto';
import type { SetCornersDto } from './dto/set-corners.dto';
import { CouponSealedError, PhotoNotReadyError } from './photos.errors';
import { photoUrls, type StoredPhoto, toPhotoDto } from './photos.mapper';
import { isStuck } from './photos.policy';
import { type PhotoRow, PhotosRepository } from './photos.repository';

@Injectable()
export class PhotosService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly photos: PhotosRepository,
    private readonly ledger: LedgerService,
    private readonly jobs: JobsService,
    private readonly env: Env,
  ) {}

  async list(actor: Actor, couponId: string, query: ListPhotosQuery): Promise<Page<PhotoDto>> {
    const [beforeId] = decodeCursor(query.cursor, ['id']) ?? [];
    const page = beforeId === undefined ? {} : { beforeId: String(beforeId) };
    return this.unitOfWork.read(actor, async (tx) => {
      if ((await this.photos.findCoupon(tx, actor.shopId, couponId)) === undefined) throw new NotFoundError();
      const rows = await this.photos.list(tx, actor.shopId, { couponId, limit: query.limit + 1, ...page });
      return pageOf(rows, query.limit, { item: (row) => this.toDto(row.photo, row.couponState, actor), cursor: (row) => [row.photo.id] });
    });
  }

  async get(actor: Actor, photoId: string): Promise<PhotoDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const { photo, couponState } = await this.getRow(tx, actor.shopId, photoId);
      return this.toDto(photo, couponState, actor);
    });
  }

  async setCorners(actor: Actor, photoId: string, version: number, { corners, foundBy }: SetCornersDto): Promise<PhotoDto> {
    const fault = cornersFault(corners);
    if (fault !== undefined) throw new InvalidError('The corners do not outline a plate.', [{ pointer: '#/corners', detail: fault }]);
    return this.unitOfWork.run(actor, async (tx) => {
      const { before, coupon } = await this.lockForChange(tx, actor, photoId);
      if (before.version !== version) throw new StaleError(this.toDto(before, coupon.state, actor));
      if (before.state !== 'ready') throw new PhotoNotReadyError();
      const points = corners.map(({ x, y }) => ({ x, y }));
      const row = await this.photos.setCorners(tx, actor.shopId, photoId, { corners: points, foundBy });
      if (row === undefined) throw new NotFoundError();
      await this.ledger.record(tx, {
        actor,
        action: 'photo.corners-set',
        subjectType: 'photo',
        subjectId: photoId,
        subjectCode: coupon.code,
        before: { corners: before.corners, foundBy: before.cornersFoundBy },
        after: { corners: points, foundBy },
      });
      return this.toDto(row, coupon.state, actor);
    });
  }

  /** Pushes a photo that is stuck; one that is not stuck is answered as it stands. */
  async retry(actor: Actor, photoId: string): Promise<PhotoDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const { before, coupon } = await this.lockForChange(tx, actor, photoId);
      if (isStuck(before, new Date())) await this.jobs.add(tx, 'photos.develop', { photoId }, { key: photoId });
      return this.toDto(before, coupon.state, actor);
    });
  }

  toDto(row: PhotoRow, couponState: string, actor: Pick<Actor, 'role'>): PhotoDto {
    return toPhotoDto(row, { actor, couponState, secret: this.env.URL_SIGNING_SECRET, now: new Date() });
  }

  /** For other modules that show a photo to somebody who may see it there: the finder shows reference cells to trainees. */
  urlsOf(photo: StoredPhoto): PhotoUrlsDto | null {
    return photoUrls(photo, this.env.URL_SIGNING_SECRET, new Date());
  }

  /** For a list of coupons: of each the newest photo that can be laid flat, by coupon. */
  async platePhotos(tx: Tx, shopId: string, couponIds: readonly string[]): Promise<Map<string, PlatePhotoDto>> {
    const rows = await this.photos.newestFlat(tx, shopId, couponIds);
    return new Map(
      rows.map((row) => {
        const { id, couponId, corners, widthPx, heightPx } = row;
        return [couponId, { id, urls: this.urlsOf(row), corners, widthPx, heightPx }];
      }),
    );
  }

  private async getRow(tx: Tx, shopId: string, photoId: string) {
    const row = await this.photos.find(tx, shopId, photoId);
    if (row === undefined) throw new NotFoundError();
    return row;
  }

  /** Locks in the order coupon, photo: the same as sealing a coupon does. */
  private async lockForChange(tx: Tx, actor: Actor, photoId: string) {
    const { photo } = await this.getRow(tx, actor.shopId, photoId);
    const coupon = await this.photos.holdCoupon(tx, actor.shopId, photo.couponId);
    const before = await this.photos.lock(tx, actor.shopId, photoId);
    if (before === undefined || coupon === undefined) throw new NotFoundError();
    if (coupon.state === 'sealed') throw new CouponSealedError();
    return { before, coupon };
  }
}
