import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { MeasurementMethod, MeasurementQuantity } from '@proofplate/recipe-model';
import { and, asc, eq } from 'drizzle-orm';

const { cell, measurement, member } = schema;

type MeasurementRow = typeof measurement.$inferSelect;
export type StoredMeasurement = Omit<MeasurementRow, 'quantity' | 'method'> & {
  readonly quantity: MeasurementQuantity;
  readonly method: MeasurementMethod;
  readonly by: string;
};
export type NewMeasurement = Omit<typeof measurement.$inferInsert, 'id' | 'createdAt'>;

@Injectable()
export class CouponMeasurementsRepository {
  /** All of a coupon, in the order in which they were entered. */
  async ofCoupon(tx: Tx, shopId: string, couponId: string): Promise<StoredMeasurement[]> {
    const rows = await tx
      .select({ measurement, by: member.printedName })
      .from(measurement)
      .innerJoin(cell, and(eq(cell.shopId, measurement.shopId), eq(cell.id, measurement.cellId)))
      .innerJoin(member, and(eq(member.shopId, measurement.shopId), eq(member.id, measurement.createdBy)))
      .where(and(eq(measurement.shopId, shopId), eq(cell.couponId, couponId)))
      .orderBy(asc(measurement.createdAt), asc(measurement.id));
    return rows.map((row) => toStored(row.measurement, row.by));
  }

  async insert(tx: Tx, rows: readonly NewMeasurement[], by: string): Promise<StoredMeasurement[]> {
    const stored = await tx
      .insert(measurement)
      .values([...rows])
      .returning();
    return stored.map((row) => toStored(row, by));
  }
}

/** The request class is the only way into these columns, so they hold codes of the lists. */
function toStored(row: MeasurementRow, by: string): StoredMeasurement {
  return { ...row, quantity: row.quantity as MeasurementQuantity, method: row.method as MeasurementMethod, by };
}
