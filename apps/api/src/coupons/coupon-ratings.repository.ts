import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { Outcome } from '@proofplate/recipe-model';
import { and, asc, eq, inArray, sql } from 'drizzle-orm';

const { cell, cellRating, member } = schema;

type RatingRow = typeof cellRating.$inferSelect;
export type StoredRating = Omit<RatingRow, 'outcome'> & { readonly outcome: Outcome | null; readonly by: string };
export type RatingChange = {
  readonly cellId: string;
  /** 0: there was no rating yet. */
  readonly seenVersion: number;
  readonly rating: number | null;
  readonly outcome: Outcome | null;
  readonly tags: string[];
  readonly note: string;
};

const whoRated = and(eq(member.shopId, cellRating.shopId), eq(member.id, cellRating.memberId));
const proposed = (column: string) => sql.raw(`excluded."${column}"`);

@Injectable()
export class CouponRatingsRepository {
  /** Everybody's ratings of a coupon. */
  async ofCoupon(tx: Tx, shopId: string, couponId: string): Promise<StoredRating[]> {
    const rows = await tx
      .select({ rating: cellRating, by: member.printedName })
      .from(cellRating)
      .innerJoin(cell, and(eq(cell.shopId, cellRating.shopId), eq(cell.id, cellRating.cellId)))
      .innerJoin(member, whoRated)
      .where(and(eq(cellRating.shopId, shopId), eq(cell.couponId, couponId)))
      .orderBy(asc(cellRating.ratedAt), asc(cellRating.id));
    return rows.map(({ rating, by }) => toStored(rating, by));
  }

  /** One person's ratings of these cells, in a fixed order so that two savers never wait for each other crosswise. */
  async lockOwn(tx: Tx, shopId: string, memberId: string, cellIds: readonly string[]): Promise<StoredRating[]> {
    const rows = await tx
      .select({ rating: cellRating, by: member.printedName })
      .from(cellRating)
      .innerJoin(member, whoRated)
      .where(and(eq(cellRating.shopId, shopId), eq(cellRating.memberId, memberId), inArray(cellRating.cellId, [...cellIds])))
      .orderBy(asc(cellRating.cellId))
      .for('update', { of: cellRating });
    return rows.map(({ rating, by }) => toStored(rating, by));
  }

  /** Writes what still stands at the version that was seen; what is left out of the answer had moved on. */
  async save(tx: Tx, owner: { shopId: string; memberId: string; by: string }, changes: readonly RatingChange[]): Promise<StoredRating[]> {
    const { shopId, memberId, by } = owner;
    const rows = await tx
      .insert(cellRating)
      .values(changes.map(({ seenVersion, ...change }) => ({ shopId, memberId, ...change, version: seenVersion + 1 })))
      .onConflictDoUpdate({
        target: [cellRating.shopId, cellRating.cellId, cellRating.memberId],
        set: {
          rating: proposed('rating'),
          outcome: proposed('outcome'),
          tags: proposed('tags'),
          note: proposed('note'),
          version: proposed('version'),
          ratedAt: sql`now()`,
        },
        setWhere: sql`${cellRating.version} = ${proposed('version')} - 1`,
      })
      .returning();
    return rows.map((row) => toStored(row, by));
  }
}

/** The request class is the only way into the column, so it holds a code of the list. */
function toStored(row: RatingRow, by: string): StoredRating {
  return { ...row, outcome: row.outcome as Outcome | null, by };
}
