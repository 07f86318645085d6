import { createReadStream } from 'node:fs';
import { Injectable } from '@nestjs/common';
import { uuidv7 } from 'uuidv7';
import type { Actor } from '../common/actor';
import { NotFoundError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { JobsService } from '../jobs/jobs.service';
import { LedgerService } from '../ledger/ledger.service';
import { receivedObjectKey } from '../storage/object-keys';
import { StorageService } from '../storage/storage.service';
import type { PhotoDto } from './dto/photo.dto';
import { CouponSealedError } from './photos.errors';
import { type NewPhoto, type PhotoRow, PhotosRepository } from './photos.repository';
import { PhotosService } from './photos.service';
import type { ReceivedFile } from './receive-photo-file';

export type TakenPhoto = { readonly photo: PhotoDto; readonly isNew: boolean };

/** Takes a photo in: bytes into the store first, then row, ledger event and job in one transaction. */
@Injectable()
export class PhotoIntakeService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly photos: PhotosRepository,
    private readonly photosService: PhotosService,
    private readonly storage: StorageService,
    private readonly jobs: JobsService,
    private readonly ledger: LedgerService,
  ) {}

  /** Before a byte is read: a coupon that is not ours or sealed needs no upload. */
  async checkCoupon(actor: Actor, couponId: string): Promise<void> {
    const coupon = await this.unitOfWork.read(actor, (tx) => this.photos.findCoupon(tx, actor.shopId, couponId));
    refuseSealed(coupon);
  }

  /**
   * The content is its own key: the same bytes for the same coupon give the photo that is there, so a repeat after a lost answer is safe.
   * A photo that was refused is tried again.
   */
  async take(actor: Actor, couponId: string, file: ReceivedFile): Promise<TakenPhoto> {
    const id = uuidv7();
    const receivedKey = receivedObjectKey(actor.shopId, id);
    const body = () => createReadStream(file.path);
    await this.storage.put(receivedKey, { body, bytes: file.bytes, contentType: 'application/octet-stream' });
    const row = {
      shopId: actor.shopId,
      id,
      couponId,
      receivedKey,
      receivedSha256: file.sha256,
      receivedBytes: file.bytes,
      receivedType: file.contentType,
      createdBy: actor.memberId,
    };
    return this.unitOfWork.run(actor, (tx) => this.enter(tx, actor, row));
  }

  private async enter(tx: Tx, actor: Actor, row: NewPhoto & { receivedKey: string }): Promise<TakenPhoto> {
    const coupon = await this.photos.holdCoupon(tx, row.shopId, row.couponId);
    refuseSealed(coupon);
    const inserted = await this.photos.insert(tx, row);
    const present = inserted ?? (await this.reopen(tx, row));
    if (present.receivedKey === row.receivedKey) {
      await this.jobs.add(tx, 'photos.develop', { photoId: present.id }, { key: present.id });
      await this.recordUpload(tx, actor, present, coupon.code);
    }
    return { photo: this.photosService.toDto(present, coupon.state, actor), isNew: inserted !== undefined };
  }

  /** The bytes just stored stay behind unused when the photo is there already; the sweep removes them. */
  private async reopen(tx: Tx, row: NewPhoto & { receivedKey: string }): Promise<PhotoRow> {
    const present = await this.photos.lockByBytes(tx, row);
    if (present === undefined) throw new NotFoundError();
    if (present.state !== 'refused') return present;
    return (await this.photos.markProcessing(tx, row.shopId, present.id, row.receivedKey)) ?? present;
  }

  private async recordUpload(tx: Tx, actor: Actor, photo: PhotoRow, couponCode: string): Promise<void> {
    const { couponId, receivedSha256, receivedBytes, receivedType } = photo;
    const after = { couponId, receivedSha256, receivedBytes, receivedType };
    await this.ledger.record(tx, {
      actor,
      action: 'photo.uploaded',
      subjectType: 'photo',
      subjectId: photo.id,
      subjectCode: couponCode,
      after,
    });
  }
}

function refuseSealed(coupon: { state: string; code: string } | undefined): asserts coupon is { state: string; code: string } {
  if (coupon === undefined) throw new NotFoundError();
  if (coupon.state === 'sealed') throw new CouponSealedError();
}
