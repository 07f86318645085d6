import { Injectable } from '@nestjs/common';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { JobsService } from '../jobs/jobs.service';
import { KEPT_PREFIX, parseObjectKey, RECEIVED_PREFIX } from '../storage/object-keys';
import { StorageService, type StoredObject } from '../storage/storage.service';
import { PhotosRepository } from './photos.repository';

const STUCK_AFTER_MS = 10 * 60 * 1000;
/** Longer than any upload or job: what no row names after this time, no row will. */
const ORPHAN_AFTER_MS = 60 * 60 * 1000;

export type SweepCount = { readonly pushed: number; readonly deleted: number };

/**
 * Finds what a crash left behind. It starts from the store and asks each shop about its own objects, so it needs no right to read across
 * shops. Only photos keep objects; a module that keeps others has to be asked here too.
 */
@Injectable()
export class PhotoSweepService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly photos: PhotosRepository,
    private readonly storage: StorageService,
    private readonly jobs: JobsService,
  ) {}

  /** Pushes photos that nobody processes, deletes received bytes that nobody waits for. */
  async sweepReceived(now = new Date()): Promise<SweepCount> {
    let [pushed, deleted] = [0, 0];
    for await (const object of this.storage.list(RECEIVED_PREFIX)) {
      if (ageMs(object, now) < STUCK_AFTER_MS) continue;
      const { key } = object;
      const wasPushed = await this.inShopOf(key, async (tx, shopId) => this.push(tx, shopId, key));
      if (wasPushed) pushed += 1;
      if (wasPushed || ageMs(object, now) < ORPHAN_AFTER_MS) continue;
      await this.storage.delete(key);
      deleted += 1;
    }
    return { pushed, deleted };
  }

  /** Deletes pictures whose transaction never came. */
  async sweepKept(now = new Date()): Promise<SweepCount> {
    let deleted = 0;
    for await (const object of this.storage.list(KEPT_PREFIX)) {
      if (ageMs(object, now) < ORPHAN_AFTER_MS) continue;
      const isOrphan = await this.inShopOf(object.key, async (tx, shopId, name) => !(await this.photos.isObjectNeeded(tx, shopId, name)));
      if (!isOrphan) continue;
      await this.storage.delete(object.key);
      deleted += 1;
    }
    return { pushed: 0, deleted };
  }

  private async push(tx: Tx, shopId: string, receivedKey: string): Promise<boolean> {
    const photo = await this.photos.findByReceivedKey(tx, shopId, receivedKey);
    if (photo?.state !== 'processing') return false;
    await this.jobs.add(tx, 'photos.develop', { photoId: photo.id }, { key: photo.id });
    return true;
  }

  /** False for a name that we did not make: what we don't know we don't touch. */
  private async inShopOf(key: string, ask: (tx: Tx, shopId: string, name: string) => Promise<boolean>): Promise<boolean> {
    const parsed = parseObjectKey(key);
    if (parsed === undefined) return false;
    return this.unitOfWork.run({ shopId: parsed.shopId }, (tx) => ask(tx, parsed.shopId, parsed.name));
  }
}

function ageMs(object: StoredObject, now: Date): number {
  return now.getTime() - object.storedAt.getTime();
}
