import { Injectable } from '@nestjs/common';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import type { Job } from '../jobs/job-tasks';
import { JobsService } from '../jobs/jobs.service';
import { LedgerService } from '../ledger/ledger.service';
import { keptObjectKey } from '../storage/object-keys';
import { ObjectDamagedError, ObjectMissingError, StorageUnavailableError } from '../storage/storage.errors';
import { StorageService } from '../storage/storage.service';
import { allowThreeDecodersOnly, type DevelopedPhoto, developPhoto, type Rendition } from './photo-pipeline';
import { PhotoRefusedError } from './photo-refusals';
import { type Developed, PhotosRepository, type PhotoWithCoupon } from './photos.repository';

/** A file that ended this process or failed for unknown reasons this often is not tried again. */
const MOST_ATTEMPTS = 3;
const STORE_AWAY_RETRY_S = 20;
const JPEG = 'image/jpeg';
/** The ledger's name for what the server does by itself. */
const SERVER = 'Proofplate';

/** Turns received bytes into stored photos, in the worker process only: decoders are where files from strangers do harm. */
@Injectable()
export class PhotoDeveloperService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly photos: PhotosRepository,
    private readonly storage: StorageService,
    private readonly jobs: JobsService,
    private readonly ledger: LedgerService,
  ) {
    allowThreeDecodersOnly();
  }

  /** Safe to repeat at any point: results are stored under their own hash before the row tells of them. */
  async develop({ shopId, photoId, attempt }: Job<'photos.develop'>): Promise<void> {
    const found = await this.unitOfWork.read({ shopId }, (tx) => this.photos.find(tx, shopId, photoId));
    if (found?.photo.state !== 'processing') return;
    try {
      const developed = attempt > MOST_ATTEMPTS ? new PhotoRefusedError('gave-up') : await this.developBytes(found);
      await this.settle(found, developed);
    } catch (error) {
      if (!(error instanceof StorageUnavailableError)) throw error;
      await this.unitOfWork.run({ shopId }, (tx) => this.tryLater(tx, photoId));
    }
  }

  /** An outage of the store counts no attempt: the photo waits as long as it takes. */
  private async tryLater(tx: Tx, photoId: string): Promise<void> {
    await this.jobs.add(tx, 'photos.develop', { photoId }, { key: photoId, delayS: STORE_AWAY_RETRY_S });
  }

  private async developBytes({ photo }: PhotoWithCoupon): Promise<DevelopedPhoto | PhotoRefusedError> {
    try {
      if (photo.receivedKey === null) throw new PhotoRefusedError('lost');
      const developed = await developPhoto(await this.storage.getWhole(photo.receivedKey, photo.receivedSha256));
      for (const rendition of [developed.master, developed.large, developed.small]) await this.keep(photo.shopId, rendition);
      return developed;
    } catch (error) {
      if (error instanceof PhotoRefusedError) return error;
      if (error instanceof ObjectMissingError || error instanceof ObjectDamagedError) return new PhotoRefusedError('lost');
      throw error;
    }
  }

  private async keep(shopId: string, { bytes, sha256 }: Rendition): Promise<void> {
    await this.storage.put(keptObjectKey(shopId, sha256), { body: bytes, bytes: bytes.length, contentType: JPEG });
  }

  private async settle({ photo, couponCode }: PhotoWithCoupon, result: DevelopedPhoto | PhotoRefusedError): Promise<void> {
    const { shopId, id, receivedKey } = photo;
    await this.unitOfWork.run({ shopId }, async (tx) => {
      const coupon = await this.photos.holdCoupon(tx, shopId, photo.couponId);
      const present = await this.photos.lock(tx, shopId, id);
      if (present?.state !== 'processing' || present.receivedKey !== receivedKey || coupon === undefined) return;
      const entry = { actor: { shopId, printedName: SERVER }, subjectType: 'photo', subjectId: id, subjectCode: couponCode };
      if (result instanceof PhotoRefusedError) {
        await this.photos.markRefused(tx, shopId, id, result.message);
        await this.ledger.record(tx, { ...entry, action: 'photo.refused', after: { reason: result.code } });
        return;
      }
      const row = toDeveloped(result);
      await this.photos.markReady(tx, shopId, id, row);
      await this.ledger.record(tx, { ...entry, action: 'photo.developed', after: { ...row, receivedSha256: photo.receivedSha256 } });
    });
    // The hash of what was received stays in the row; the bytes with all that rode along in them go. If this fails, the sweep does it.
    if (receivedKey !== null) await this.storage.delete(receivedKey);
  }
}

function toDeveloped({ master, large, small, capturedAt, sourceProfile }: DevelopedPhoto): Developed {
  return {
    masterSha256: master.sha256,
    masterBytes: master.bytes.length,
    largeSha256: large.sha256,
    smallSha256: small.sha256,
    widthPx: master.widthPx,
    heightPx: master.heightPx,
    colourProfile: sourceProfile ?? null,
    capturedAtLocal: capturedAt,
  };
}
