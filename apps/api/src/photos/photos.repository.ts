import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, desc, eq, inArray, isNotNull, lt, or, sql } from 'drizzle-orm';
import type { Corner } from './corners';

const { coupon, photo, shop } = schema;

export type PhotoRow = typeof photo.$inferSelect;
export type PhotoWithCoupon = { readonly photo: PhotoRow; readonly couponState: string; readonly couponCode: string };
export type NewPhoto = Pick<
  PhotoRow,
  'shopId' | 'id' | 'couponId' | 'receivedKey' | 'receivedSha256' | 'receivedBytes' | 'receivedType' | 'createdBy'
>;
export type Developed = {
  readonly masterSha256: string;
  readonly masterBytes: number;
  readonly largeSha256: string;
  readonly smallSha256: string;
  readonly widthPx: number;
  readonly heightPx: number;
  readonly colourProfile: string | null;
  /** Local time of the camera, ISO 8601 without an offset. */
  readonly capturedAtLocal: string | undefined;
};

const WITH_COUPON = { photo, couponState: coupon.state, couponCode: coupon.code };
const sameCoupon = and(eq(coupon.shopId, photo.shopId), eq(coupon.id, photo.couponId));
const isPhoto = (shopId: string, id: string) => and(eq(photo.shopId, shopId), eq(photo.id, id));
const nextVersion = sql`${photo.version} + 1`;

@Injectable()
export class PhotosRepository {
  async findCoupon(tx: Tx, shopId: string, couponId: string): Promise<{ state: string; code: string } | undefined> {
    const [row] = await tx
      .select({ state: coupon.state, code: coupon.code })
      .from(coupon)
      .where(and(eq(coupon.shopId, shopId), eq(coupon.id, couponId)));
    return row;
  }

  /** Keeps the coupon from being sealed until the transaction ends. */
  async holdCoupon(tx: Tx, shopId: string, couponId: string): Promise<{ state: string; code: string } | undefined> {
    const query = tx.select({ state: coupon.state, code: coupon.code }).from(coupon);
    const [row] = await query.where(and(eq(coupon.shopId, shopId), eq(coupon.id, couponId))).for('share');
    return row;
  }

  /** Newest first; ids are in order of time. */
  async list(
    tx: Tx,
    shopId: string,
    { couponId, beforeId, limit }: { couponId: string; beforeId?: string; limit: number },
  ): Promise<PhotoWithCoupon[]> {
    const isWanted = and(
      eq(photo.shopId, shopId),
      eq(photo.couponId, couponId),
      beforeId === undefined ? undefined : lt(photo.id, beforeId),
    );
    return tx.select(WITH_COUPON).from(photo).innerJoin(coupon, sameCoupon).where(isWanted).orderBy(desc(photo.id)).limit(limit);
  }

  /** Of each coupon the newest that can be laid flat: ready, with its corners found. */
  async newestFlat(tx: Tx, shopId: string, couponIds: readonly string[]): Promise<PhotoRow[]> {
    if (couponIds.length === 0) return [];
    const isFlat = and(
      eq(photo.shopId, shopId),
      inArray(photo.couponId, [...couponIds]),
      eq(photo.state, 'ready'),
      isNotNull(photo.corners),
    );
    return tx.selectDistinctOn([photo.couponId]).from(photo).where(isFlat).orderBy(photo.couponId, desc(photo.id));
  }

  async find(tx: Tx, shopId: string, id: string): Promise<PhotoWithCoupon | undefined> {
    const [row] = await tx.select(WITH_COUPON).from(photo).innerJoin(coupon, sameCoupon).where(isPhoto(shopId, id));
    return row;
  }

  async lock(tx: Tx, shopId: string, id: string): Promise<PhotoRow | undefined> {
    const [row] = await tx.select().from(photo).where(isPhoto(shopId, id)).for('update');
    return row;
  }

  /** Undefined when the coupon has a photo of the same bytes already. */
  async insert(tx: Tx, row: NewPhoto): Promise<PhotoRow | undefined> {
    const [inserted] = await tx.insert(photo).values(row).onConflictDoNothing().returning();
    return inserted;
  }

  async lockByBytes(
    tx: Tx,
    { shopId, couponId, receivedSha256 }: Pick<NewPhoto, 'shopId' | 'couponId' | 'receivedSha256'>,
  ): Promise<PhotoRow | undefined> {
    const isSame = and(eq(photo.shopId, shopId), eq(photo.couponId, couponId), eq(photo.receivedSha256, receivedSha256));
    const [row] = await tx.select().from(photo).where(isSame).for('update');
    return row;
  }

  async markProcessing(tx: Tx, shopId: string, id: string, receivedKey: string): Promise<PhotoRow | undefined> {
    const change = { state: 'processing', refusedReason: null, receivedKey, version: nextVersion };
    const [row] = await tx.update(photo).set(change).where(isPhoto(shopId, id)).returning();
    return row;
  }

  async markReady(tx: Tx, shopId: string, id: string, { capturedAtLocal, ...developed }: Developed): Promise<void> {
    const zone = sql`(select ${shop.timeZone} from ${shop} where ${shop.id} = ${shopId}::uuid)`;
    const capturedAt = capturedAtLocal === undefined ? null : sql`${capturedAtLocal}::timestamp at time zone ${zone}`;
    const change = { ...developed, capturedAt, state: 'ready', receivedKey: null, processedAt: sql`now()`, version: nextVersion };
    await tx.update(photo).set(change).where(isPhoto(shopId, id));
  }

  async markRefused(tx: Tx, shopId: string, id: string, refusedReason: string): Promise<void> {
    const change = { state: 'refused', refusedReason, receivedKey: null, processedAt: sql`now()`, version: nextVersion };
    await tx.update(photo).set(change).where(isPhoto(shopId, id));
  }

  async setCorners(
    tx: Tx,
    shopId: string,
    id: string,
    { corners, foundBy }: { corners: Corner[]; foundBy: string },
  ): Promise<PhotoRow | undefined> {
    const change = { corners, cornersFoundBy: foundBy, version: nextVersion };
    const [row] = await tx.update(photo).set(change).where(isPhoto(shopId, id)).returning();
    return row;
  }

  async findByReceivedKey(tx: Tx, shopId: string, receivedKey: string): Promise<PhotoRow | undefined> {
    const [row] = await tx
      .select()
      .from(photo)
      .where(and(eq(photo.shopId, shopId), eq(photo.receivedKey, receivedKey)));
    return row;
  }

  /** Does a photo of the shop need the object with this hash? */
  async isObjectNeeded(tx: Tx, shopId: string, sha256: string): Promise<boolean> {
    const names = or(eq(photo.masterSha256, sha256), eq(photo.largeSha256, sha256), eq(photo.smallSha256, sha256));
    const [row] = await tx
      .select({ id: photo.id })
      .from(photo)
      .where(and(eq(photo.shopId, shopId), names))
      .limit(1);
    return row !== undefined;
  }
}
