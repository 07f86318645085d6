import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, desc, eq, isNotNull, isNull, type SQL, sql } from 'drizzle-orm';

const { hold, recipe, machine, shop } = schema;

export type HoldRow = typeof hold.$inferSelect & { recipeCode: string | null; recipeTitle: string | null; machineName: string | null };
export type HoldSubject = { kind: 'recipe' | 'machine'; id: string };

@Injectable()
export class HoldsRepository {
  /** Locks what is to be held, so that no run starts on it at the same moment, and says how people call it. */
  async lockSubject(tx: Tx, shopId: string, { kind, id }: HoldSubject): Promise<string | undefined> {
    if (kind === 'machine') {
      const [row] = await tx
        .select({ name: machine.name })
        .from(machine)
        .where(and(eq(machine.shopId, shopId), eq(machine.id, id)))
        .for('update');
      return row?.name;
    }
    const [row] = await tx
      .select({ code: recipe.code, title: recipe.title })
      .from(recipe)
      .where(and(eq(recipe.shopId, shopId), eq(recipe.id, id)))
      .for('update');
    return row === undefined ? undefined : `${row.code} ${row.title}`;
  }

  async isHeld(tx: Tx, shopId: string, { kind, id }: HoldSubject): Promise<boolean> {
    const column = kind === 'machine' ? hold.machineId : hold.recipeId;
    const rows = await tx
      .select({ id: hold.id })
      .from(hold)
      .where(and(eq(hold.shopId, shopId), eq(column, id), isNull(hold.releasedAt)));
    return rows.length > 0;
  }

  async insert(
    tx: Tx,
    shopId: string,
    createdBy: string,
    values: { subject: HoldSubject; reason: string; placedByName: string },
  ): Promise<string> {
    const { subject, reason, placedByName } = values;
    const on = subject.kind === 'machine' ? { machineId: subject.id } : { recipeId: subject.id };
    const [row] = await tx
      .insert(hold)
      .values({ shopId, createdBy, ...on, reason, placedByName })
      .returning({ id: hold.id });
    if (row === undefined) throw new Error('the hold was not stored');
    return row.id;
  }

  async lock(tx: Tx, shopId: string, id: string): Promise<typeof hold.$inferSelect | undefined> {
    const [row] = await tx
      .select()
      .from(hold)
      .where(and(eq(hold.shopId, shopId), eq(hold.id, id)))
      .for('update');
    return row;
  }

  async release(tx: Tx, shopId: string, id: string, by: { memberId: string; name: string; reason: string }): Promise<void> {
    await tx
      .update(hold)
      .set({
        releasedAt: sql`now()`,
        releasedBy: by.memberId,
        releasedByName: by.name,
        releaseReason: by.reason,
        version: sql`${hold.version} + 1`,
      })
      .where(and(eq(hold.shopId, shopId), eq(hold.id, id)));
  }

  async find(tx: Tx, shopId: string, id: string): Promise<HoldRow | undefined> {
    const [row] = await this.select(tx, and(eq(hold.shopId, shopId), eq(hold.id, id)), 1);
    return row;
  }

  /** Newest first. */
  async list(tx: Tx, shopId: string, page: { state: 'open' | 'released'; beforeId?: string; limit: number }): Promise<HoldRow[]> {
    const isWanted = and(
      eq(hold.shopId, shopId),
      page.state === 'open' ? isNull(hold.releasedAt) : isNotNull(hold.releasedAt),
      page.beforeId === undefined ? undefined : sql`${hold.id} < ${page.beforeId}::uuid`,
    );
    return this.select(tx, isWanted, page.limit);
  }

  async shopName(tx: Tx, shopId: string): Promise<string> {
    const [row] = await tx.select({ name: shop.name }).from(shop).where(eq(shop.id, shopId));
    return row?.name ?? '';
  }

  private async select(tx: Tx, isWanted: SQL | undefined, limit: number): Promise<HoldRow[]> {
    const rows = await tx
      .select({ row: hold, recipeCode: recipe.code, recipeTitle: recipe.title, machineName: machine.name })
      .from(hold)
      .leftJoin(recipe, and(eq(recipe.shopId, hold.shopId), eq(recipe.id, hold.recipeId)))
      .leftJoin(machine, and(eq(machine.shopId, hold.shopId), eq(machine.id, hold.machineId)))
      .where(isWanted)
      .orderBy(desc(hold.id))
      .limit(limit);
    return rows.map(({ row, ...names }) => ({ ...row, ...names }));
  }
}
