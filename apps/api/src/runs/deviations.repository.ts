import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, desc, eq, type SQL, sql } from 'drizzle-orm';

const { deviation } = schema;

export type DeviationRow = typeof deviation.$inferSelect & { usedQuantity: number; isLive: boolean };

// Written out: in a select from one table the builder leaves the table's name away, and inside the sub-select that would be the run's.
const usedQuantity = sql<number>`(select coalesce(sum(u.good_count + u.scrap_count), 0)::int from run u
  where u.shop_id = deviation.shop_id and u.deviation_id = deviation.id)`;
const isLive = sql<boolean>`(coalesce(deviation.ends_at > now(), true) and coalesce(${usedQuantity} < deviation.maximum_quantity, true))`;

@Injectable()
export class DeviationsRepository {
  async find(tx: Tx, shopId: string, id: string): Promise<DeviationRow | undefined> {
    const [row] = await this.select(tx, and(eq(deviation.shopId, shopId), eq(deviation.id, id)), 1);
    return row;
  }

  /** Newest first. */
  async list(
    tx: Tx,
    shopId: string,
    { revisionId, isLiveOnly = false, beforeId, limit }: { revisionId?: string; isLiveOnly?: boolean; beforeId?: string; limit: number },
  ): Promise<DeviationRow[]> {
    const isWanted = and(
      eq(deviation.shopId, shopId),
      revisionId === undefined ? undefined : eq(deviation.revisionId, revisionId),
      isLiveOnly ? isLive : undefined,
      beforeId === undefined ? undefined : sql`${deviation.id} < ${beforeId}::uuid`,
    );
    return this.select(tx, isWanted, limit);
  }

  async insert(
    tx: Tx,
    shopId: string,
    createdBy: string,
    values: Omit<typeof deviation.$inferInsert, 'shopId' | 'createdBy'>,
  ): Promise<string> {
    const [row] = await tx
      .insert(deviation)
      .values({ shopId, createdBy, ...values })
      .returning({ id: deviation.id });
    if (row === undefined) throw new Error('the deviation was not stored');
    return row.id;
  }

  /** Runs that use up the same deviation finish one after the other. Its row is permanent and cannot be locked itself. */
  async takeTurn(tx: Tx, id: string): Promise<void> {
    await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`deviation ${id}`}, 0))`);
  }

  private async select(tx: Tx, isWanted: SQL | undefined, limit: number): Promise<DeviationRow[]> {
    const rows = await tx
      .select({ row: deviation, usedQuantity, isLive })
      .from(deviation)
      .where(isWanted)
      .orderBy(desc(deviation.id))
      .limit(limit);
    return rows.map(({ row, usedQuantity: used, isLive: live }) => ({ ...row, usedQuantity: used, isLive: live }));
  }
}
