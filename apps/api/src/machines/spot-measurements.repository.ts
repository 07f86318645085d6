import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, desc, eq } from 'drizzle-orm';
import type { SpotFitDto } from './dto/spot-measurement.dto';

const { coupon, member, spotMeasurement } = schema;

type SpotRow = typeof spotMeasurement.$inferSelect;
export type MeasuredSpot = {
  readonly spotUm: number;
  readonly method: string;
  readonly measuredOn: string;
  readonly standardErrorUm: number | null;
  /** The coupon whose craters it comes from, and what they gave; null: measured in another way and typed. */
  readonly fromCraters: { readonly couponId: string; readonly couponCode: string; readonly fit: SpotFitDto } | null;
};
export type SpotView = {
  readonly spot: Omit<SpotRow, 'fit'> & { readonly fit: SpotFitDto | null };
  readonly couponCode: string | null;
  readonly createdByName: string;
};

@Injectable()
export class SpotMeasurementsRepository {
  /** Every spot of a lens on a machine, newest first. A shop measures one some times a year. */
  async list(tx: Tx, shopId: string, machineLensId: string): Promise<SpotView[]> {
    const rows = await tx
      .select({ spot: spotMeasurement, couponCode: coupon.code, createdByName: member.printedName })
      .from(spotMeasurement)
      .innerJoin(member, and(eq(member.shopId, spotMeasurement.shopId), eq(member.id, spotMeasurement.createdBy)))
      .leftJoin(coupon, and(eq(coupon.shopId, spotMeasurement.shopId), eq(coupon.id, spotMeasurement.couponId)))
      .where(and(eq(spotMeasurement.shopId, shopId), eq(spotMeasurement.machineLensId, machineLensId)))
      .orderBy(desc(spotMeasurement.createdAt), desc(spotMeasurement.id));
    // insert() is the only way into the column, so it holds that shape
    return rows.map((row) => ({ ...row, spot: { ...row.spot, fit: row.spot.fit as SpotFitDto | null } }));
  }

  async insert(
    tx: Tx,
    { shopId, machineLensId, createdBy }: { readonly shopId: string; readonly machineLensId: string; readonly createdBy: string },
    { fromCraters, ...measured }: MeasuredSpot,
  ): Promise<void> {
    const origin = fromCraters === null ? {} : { couponId: fromCraters.couponId, fit: { ...fromCraters.fit } };
    await tx.insert(spotMeasurement).values({ shopId, machineLensId, createdBy, ...measured, ...origin });
  }
}
