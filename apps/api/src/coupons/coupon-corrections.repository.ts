import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, asc, eq } from 'drizzle-orm';

const { cell, couponCorrection, member } = schema;

export type StoredCorrection = {
  readonly id: string;
  readonly cellId: string | null;
  readonly address: string | null;
  readonly text: string;
  readonly reason: string;
  readonly createdAt: Date;
  readonly by: string;
};
export type NewCorrection = Pick<typeof couponCorrection.$inferInsert, 'shopId' | 'couponId' | 'cellId' | 'text' | 'reason' | 'createdBy'>;

@Injectable()
export class CouponCorrectionsRepository {
  /** Oldest first. */
  async ofCoupon(tx: Tx, shopId: string, couponId: string): Promise<StoredCorrection[]> {
    return tx
      .select({
        id: couponCorrection.id,
        cellId: couponCorrection.cellId,
        address: cell.address,
        text: couponCorrection.text,
        reason: couponCorrection.reason,
        createdAt: couponCorrection.createdAt,
        by: member.printedName,
      })
      .from(couponCorrection)
      .innerJoin(member, and(eq(member.shopId, couponCorrection.shopId), eq(member.id, couponCorrection.createdBy)))
      .leftJoin(cell, and(eq(cell.shopId, couponCorrection.shopId), eq(cell.id, couponCorrection.cellId)))
      .where(and(eq(couponCorrection.shopId, shopId), eq(couponCorrection.couponId, couponId)))
      .orderBy(asc(couponCorrection.createdAt), asc(couponCorrection.id));
  }

  async insert(tx: Tx, row: NewCorrection): Promise<string> {
    const [stored] = await tx.insert(couponCorrection).values(row).returning({ id: couponCorrection.id });
    if (stored === undefined) throw new Error('The correction was not stored');
    return stored.id;
  }
}
