import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { Criterion } from '@proofplate/recipe-model';
import { and, eq, exists, isNotNull, or, sql } from 'drizzle-orm';
import { type StoredCoupon, toStoredCoupon } from './coupons.repository';

const { coupon, cell, cellRating, measurement, photo, revisionEvidence, shop } = schema;

export type CellStanding = { readonly id: string; readonly address: string; readonly markState: string };
export type PhotoStanding = { readonly id: string; readonly state: string; readonly hasCorners: boolean };

const isCoupon = (shopId: string, id: string) => and(eq(coupon.shopId, shopId), eq(coupon.id, id));
const nextVersion = sql`${coupon.version} + 1`;

@Injectable()
export class CouponInspectionRepository {
  /** Keeps the coupon from changing its state until the transaction ends; several people may hold it at once. */
  async hold(tx: Tx, shopId: string, id: string): Promise<StoredCoupon | undefined> {
    const [row] = await tx.select().from(coupon).where(isCoupon(shopId, id)).for('share');
    return row === undefined ? undefined : toStoredCoupon(row);
  }

  /** Was anything of the coupon rated or measured? */
  async hasResults(tx: Tx, shopId: string, couponId: string): Promise<boolean> {
    const isOwnCell = and(eq(cell.shopId, shopId), eq(cell.couponId, couponId));
    const rated = tx
      .select({ one: sql`1` })
      .from(cellRating)
      .where(and(eq(cellRating.shopId, shopId), eq(cellRating.cellId, cell.id)));
    const measured = tx
      .select({ one: sql`1` })
      .from(measurement)
      .where(and(eq(measurement.shopId, shopId), eq(measurement.cellId, cell.id)));
    const [row] = await tx
      .select({ id: cell.id })
      .from(cell)
      .where(and(isOwnCell, or(exists(rated), exists(measured))))
      .limit(1);
    return row !== undefined;
  }

  /** Just enough of the cells to say which of them may be judged. */
  async cellStandings(tx: Tx, shopId: string, couponId: string): Promise<CellStanding[]> {
    return tx
      .select({ id: cell.id, address: cell.address, markState: cell.markState })
      .from(cell)
      .where(and(eq(cell.shopId, shopId), eq(cell.couponId, couponId)));
  }

  /** Criteria of the coupon that a revision rests on; null where it rests on none or none were recorded. */
  async criteriaOfBasis(tx: Tx, shopId: string, revisionId: string): Promise<Criterion[] | null> {
    const [row] = await tx
      .select({ criteria: coupon.criteria })
      .from(revisionEvidence)
      .innerJoin(coupon, and(eq(coupon.shopId, revisionEvidence.shopId), eq(coupon.id, revisionEvidence.couponId)))
      .where(
        and(
          eq(revisionEvidence.shopId, shopId),
          eq(revisionEvidence.revisionId, revisionId),
          eq(revisionEvidence.kind, 'basis'),
          isNotNull(coupon.criteria),
        ),
      )
      .orderBy(coupon.code)
      .limit(1);
    // the request class of criteria is the only way into the column, so it holds the model's shape
    return row === undefined ? null : (row.criteria as Criterion[] | null);
  }

  async recordCriteria(tx: Tx, shopId: string, id: string, criteria: Criterion[]): Promise<void> {
    await tx.update(coupon).set({ criteria, criteriaRecordedAt: sql`now()`, version: nextVersion }).where(isCoupon(shopId, id));
  }

  async finishInspection(tx: Tx, shopId: string, id: string, memberId: string): Promise<void> {
    const change = { state: 'inspected', inspectedAt: sql`now()`, inspectedBy: memberId, version: nextVersion };
    await tx.update(coupon).set(change).where(isCoupon(shopId, id));
  }

  async seal(tx: Tx, shopId: string, id: string, memberId: string): Promise<void> {
    const change = { state: 'sealed', sealedAt: sql`now()`, sealedBy: memberId, version: nextVersion };
    await tx.update(coupon).set(change).where(isCoupon(shopId, id));
  }

  async photos(tx: Tx, shopId: string, couponId: string): Promise<PhotoStanding[]> {
    return this.photoQuery(tx, shopId, couponId);
  }

  /** As photos, and no photo leaves its state before the transaction ends. Lock the coupon before. */
  async lockPhotos(tx: Tx, shopId: string, couponId: string): Promise<PhotoStanding[]> {
    return this.photoQuery(tx, shopId, couponId).for('update');
  }

  private photoQuery(tx: Tx, shopId: string, couponId: string) {
    return tx
      .select({ id: photo.id, state: photo.state, hasCorners: sql<boolean>`${photo.corners} is not null` })
      .from(photo)
      .where(and(eq(photo.shopId, shopId), eq(photo.couponId, couponId)))
      .orderBy(photo.id);
  }

  async isPhotoRequired(tx: Tx, shopId: string): Promise<boolean> {
    const [row] = await tx.select({ policy: shop.policy }).from(shop).where(eq(shop.id, shopId));
    return row?.policy.photoRequired !== false;
  }
}
