import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, desc, eq, sql } from 'drizzle-orm';

const { outbox, shop } = schema;

export type OutboxRow = typeof outbox.$inferSelect;
export type NewOutboxRow = { readonly shopId: string; readonly kind: string; readonly payload: Record<string, unknown> };

/** A secret has no business in the table once its mail is on the way or given up. */
const withoutToken = sql`${outbox.payload} - 'token'`;

@Injectable()
export class OutboxRepository {
  async insert(tx: Tx, row: NewOutboxRow): Promise<string> {
    const [inserted] = await tx.insert(outbox).values(row).returning({ id: outbox.id });
    if (inserted === undefined) throw new Error('the outbox took no row');
    return inserted.id;
  }

  async find(tx: Tx, shopId: string, id: string): Promise<OutboxRow | undefined> {
    const [row] = await tx.select().from(outbox).where(isRow(shopId, id));
    return row;
  }

  async timeZoneOf(tx: Tx, shopId: string): Promise<string> {
    const [row] = await tx.select({ timeZone: shop.timeZone }).from(shop).where(eq(shop.id, shopId));
    return row?.timeZone ?? 'UTC';
  }

  async markSent(tx: Tx, shopId: string, id: string): Promise<void> {
    const change = { state: 'sent', sentAt: sql`now()`, attempts: sql`${outbox.attempts} + 1`, failure: null, payload: withoutToken };
    await tx.update(outbox).set(change).where(isRow(shopId, id));
  }

  async markTried(tx: Tx, shopId: string, id: string, failure: string): Promise<void> {
    await tx
      .update(outbox)
      .set({ attempts: sql`${outbox.attempts} + 1`, failure })
      .where(isRow(shopId, id));
  }

  async markFailed(tx: Tx, shopId: string, id: string, failure: string): Promise<void> {
    const change = { state: 'failed', attempts: sql`${outbox.attempts} + 1`, failure, payload: withoutToken };
    await tx.update(outbox).set(change).where(isRow(shopId, id));
  }

  async listFailed(tx: Tx, shopId: string, limit: number): Promise<OutboxRow[]> {
    return tx
      .select()
      .from(outbox)
      .where(and(eq(outbox.shopId, shopId), eq(outbox.state, 'failed')))
      .orderBy(desc(outbox.createdAt))
      .limit(limit);
  }
}

const isRow = (shopId: string, id: string) => and(eq(outbox.shopId, shopId), eq(outbox.id, id));
