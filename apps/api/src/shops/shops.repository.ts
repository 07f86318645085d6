import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, eq, type SQL, sql } from 'drizzle-orm';
import type { UnitSystem } from './dto/shop.dto';
import type { ShopPolicy } from './shop-policy';

const { shop } = schema;

export type ShopRow = typeof shop.$inferSelect;
export type NewShop = {
  readonly id: string;
  readonly name: string;
  readonly unitSystem: UnitSystem;
  readonly timeZone: string;
  readonly locale: string;
  readonly policy: ShopPolicy;
};
export type ShopChange = Partial<Omit<NewShop, 'id'>>;

@Injectable()
export class ShopsRepository {
  async insert(tx: Tx, row: NewShop): Promise<void> {
    await tx.insert(shop).values(row);
  }

  async find(tx: Tx, shopId: string): Promise<ShopRow | undefined> {
    const [row] = await tx.select().from(shop).where(eq(shop.id, shopId));
    return row;
  }

  /** The day it is now where the shop is, such as 2026-05-14. */
  async today(tx: Tx, shopId: string): Promise<string | undefined> {
    return this.dayAt(tx, shopId, sql`now()`);
  }

  async dayOf(tx: Tx, shopId: string, at: Date): Promise<string | undefined> {
    return this.dayAt(tx, shopId, sql`${at.toISOString()}::timestamptz`);
  }

  private async dayAt(tx: Tx, shopId: string, at: SQL): Promise<string | undefined> {
    const [row] = await tx
      .select({ day: sql<string>`to_char(${at} at time zone ${shop.timeZone}, 'YYYY-MM-DD')` })
      .from(shop)
      .where(eq(shop.id, shopId));
    return row?.day;
  }

  /** Undefined when the version is no longer the present one. */
  async update(tx: Tx, shopId: string, version: number, change: ShopChange): Promise<ShopRow | undefined> {
    const [row] = await tx
      .update(shop)
      .set({ ...change, version: sql`${shop.version} + 1` })
      .where(and(eq(shop.id, shopId), eq(shop.version, version)))
      .returning();
    return row;
  }
}
