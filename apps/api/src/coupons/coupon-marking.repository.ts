import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { ParameterSet } from '@proofplate/recipe-model';
import { and, asc, eq, sql } from 'drizzle-orm';
import { type StoredCell, type StoredCoupon, toStoredCell } from './coupons.repository';

const { cell, coupon, machineProfile, powerCalibration } = schema;

export type CellMark = Pick<StoredCell, 'markState' | 'markNote' | 'markedAt' | 'markedBy'> & { actualParameters: ParameterSet | null };
type CouponChange = Partial<Pick<StoredCoupon, 'state' | 'markingStartedAt' | 'markedAt' | 'markedBy' | 'ambientNotes' | 'storedAt'>>;
export type MarkedWith = {
  physical: Record<string, unknown>;
  panel: Record<string, unknown>;
  calibration: { points: { percent: number; watts: number }[]; frequencyKhz: number | null; pulseWidthNs: number | null } | null;
};

@Injectable()
export class CouponMarkingRepository {
  async lockCell(tx: Tx, shopId: string, at: { couponId: string; cellId: string }): Promise<StoredCell | undefined> {
    const [row] = await tx
      .select()
      .from(cell)
      .where(and(eq(cell.shopId, shopId), eq(cell.couponId, at.couponId), eq(cell.id, at.cellId)))
      .for('update');
    return row === undefined ? undefined : toStoredCell(row);
  }

  async setMark(tx: Tx, shopId: string, cellId: string, mark: CellMark): Promise<StoredCell> {
    const [row] = await tx
      .update(cell)
      .set({
        ...mark,
        actualParameters: mark.actualParameters === null ? null : { ...mark.actualParameters },
        version: sql`${cell.version} + 1`,
      })
      .where(and(eq(cell.shopId, shopId), eq(cell.id, cellId)))
      .returning();
    if (row === undefined) throw new Error('the cell was not stored');
    return toStoredCell(row);
  }

  /** In the order of marking. */
  async marks(tx: Tx, shopId: string, couponId: string): Promise<Pick<StoredCell, 'address' | 'markState'>[]> {
    const rows = await tx
      .select({ address: cell.address, markState: cell.markState })
      .from(cell)
      .where(and(eq(cell.shopId, shopId), eq(cell.couponId, couponId)))
      .orderBy(asc(cell.runOrder));
    return rows.map(({ address, markState }) => ({ address, markState: markState as StoredCell['markState'] }));
  }

  async updateCoupon(tx: Tx, shopId: string, couponId: string, change: CouponChange): Promise<void> {
    await tx
      .update(coupon)
      .set({ ...change, version: sql`${coupon.version} + 1` })
      .where(and(eq(coupon.shopId, shopId), eq(coupon.id, couponId)));
  }

  /** The profile and calibration that the coupon cites, which may be older than those in force. */
  async markedWith(tx: Tx, shopId: string, couponId: string): Promise<MarkedWith | undefined> {
    const [row] = await tx
      .select({
        physical: machineProfile.physical,
        panel: machineProfile.panel,
        calibration: {
          points: powerCalibration.points,
          frequencyKhz: powerCalibration.frequencyKhz,
          pulseWidthNs: powerCalibration.pulseWidthNs,
        },
      })
      .from(coupon)
      .innerJoin(machineProfile, and(eq(machineProfile.shopId, coupon.shopId), eq(machineProfile.id, coupon.profileId)))
      .leftJoin(powerCalibration, and(eq(powerCalibration.shopId, coupon.shopId), eq(powerCalibration.id, coupon.calibrationId)))
      .where(and(eq(coupon.shopId, shopId), eq(coupon.id, couponId)));
    return row;
  }
}
