import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { Criterion } from '@proofplate/recipe-model';
import { and, asc, eq, isNotNull, isNull, like, ne, sql } from 'drizzle-orm';
import { containsText } from '../database/contains-text';
import type { AfterName } from './materials.repository';

const { effect } = schema;

export type EffectRow = Omit<typeof effect.$inferSelect, 'criteria'> & { criteria: Criterion[] };
export type EffectValues = Pick<EffectRow, 'name' | 'criteria' | 'notes'>;

@Injectable()
export class EffectsRepository {
  async list(tx: Tx, shopId: string, archived: boolean, { after, limit }: { after?: AfterName; limit: number }): Promise<EffectRow[]> {
    const isAfter = after === undefined ? undefined : sql`(${effect.name}, ${effect.id}) > (${after.name}, ${after.id}::uuid)`;
    const rows = await tx
      .select()
      .from(effect)
      .where(and(eq(effect.shopId, shopId), archived ? isNotNull(effect.archivedAt) : isNull(effect.archivedAt), isAfter))
      .orderBy(asc(effect.name), asc(effect.id))
      .limit(limit);
    return rows.map(toEffectRow);
  }

  async findById(tx: Tx, shopId: string, id: string): Promise<EffectRow | undefined> {
    const [row] = await tx
      .select()
      .from(effect)
      .where(and(eq(effect.shopId, shopId), eq(effect.id, id)));
    return row === undefined ? undefined : toEffectRow(row);
  }

  async lockById(tx: Tx, shopId: string, id: string): Promise<EffectRow | undefined> {
    const [row] = await tx
      .select()
      .from(effect)
      .where(and(eq(effect.shopId, shopId), eq(effect.id, id)))
      .for('update');
    return row === undefined ? undefined : toEffectRow(row);
  }

  async isNameTaken(tx: Tx, shopId: string, name: string, exceptId?: string): Promise<boolean> {
    const isOther = exceptId === undefined ? undefined : ne(effect.id, exceptId);
    const [row] = await tx
      .select({ id: effect.id })
      .from(effect)
      .where(and(eq(effect.shopId, shopId), eq(effect.name, name), isOther));
    return row !== undefined;
  }

  /** Keys of the shop that hold the text. */
  async keysHolding(tx: Tx, shopId: string, text: string): Promise<string[]> {
    const rows = await tx
      .select({ key: effect.key })
      .from(effect)
      .where(and(eq(effect.shopId, shopId), like(effect.key, containsText(text))));
    return rows.map(({ key }) => key);
  }

  async insert(tx: Tx, shopId: string, createdBy: string, values: EffectValues & { key: string }): Promise<EffectRow> {
    const [row] = await tx
      .insert(effect)
      .values({ shopId, createdBy, ...values })
      .returning();
    if (row === undefined) throw new Error('the effect was not stored');
    return toEffectRow(row);
  }

  async insertShipped(tx: Tx, shopId: string, shipped: readonly (EffectValues & { key: string })[]): Promise<void> {
    await tx
      .insert(effect)
      .values(shipped.map((values) => ({ shopId, ...values })))
      .onConflictDoNothing({ target: [effect.shopId, effect.key] });
  }

  async update(tx: Tx, shopId: string, id: string, values: Partial<EffectValues> & { archivedAt?: Date | null }): Promise<EffectRow> {
    const [row] = await tx
      .update(effect)
      .set({ ...values, version: sql`${effect.version} + 1` })
      .where(and(eq(effect.shopId, shopId), eq(effect.id, id)))
      .returning();
    if (row === undefined) throw new Error('the locked effect is gone');
    return toEffectRow(row);
  }
}

/** This module's request classes are the only way into the column, so it holds the model's shape. */
const toEffectRow = (row: typeof effect.$inferSelect): EffectRow => ({ ...row, criteria: row.criteria as Criterion[] });
