import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { Caution, CautionLevel, CautionScope, SourceKind } from '@proofplate/recipe-model';
import { and, asc, eq, inArray, sql } from 'drizzle-orm';

const { caution, finish, effect, machine } = schema;

export type CautionRow = Caution & { shippedKey: string | null; version: number };
export type CautionValues = Omit<Caution, 'id'>;

@Injectable()
export class CautionsRepository {
  /** All of the shop's cautions, never first, the shipped ones in their order, then the shop's own. */
  async list(tx: Tx, shopId: string): Promise<CautionRow[]> {
    const rows = await tx
      .select()
      .from(caution)
      .where(and(eq(caution.shopId, shopId), eq(caution.isActive, true)))
      .orderBy(sql`${caution.level} = 'care'`, asc(caution.id));
    return rows.map(toCautionRow);
  }

  async lockById(tx: Tx, shopId: string, id: string): Promise<CautionRow | undefined> {
    const [row] = await tx
      .select()
      .from(caution)
      .where(and(eq(caution.shopId, shopId), eq(caution.id, id)))
      .for('update');
    return row === undefined ? undefined : toCautionRow(row);
  }

  async insert(tx: Tx, shopId: string, createdBy: string, { appliesTo, ...values }: CautionValues): Promise<CautionRow> {
    const [row] = await tx
      .insert(caution)
      .values({ shopId, createdBy, ...values, appliesTo: { ...appliesTo } })
      .returning();
    if (row === undefined) throw new Error('the caution was not stored');
    return toCautionRow(row);
  }

  async update(tx: Tx, shopId: string, id: string, { appliesTo, ...values }: CautionValues): Promise<CautionRow> {
    const [row] = await tx
      .update(caution)
      .set({ ...values, appliesTo: { ...appliesTo }, version: sql`${caution.version} + 1` })
      .where(and(eq(caution.shopId, shopId), eq(caution.id, id)))
      .returning();
    if (row === undefined) throw new Error('the locked caution is gone');
    return toCautionRow(row);
  }

  async insertShipped(tx: Tx, shopId: string, shipped: readonly (CautionValues & { shippedKey: string })[]): Promise<void> {
    await tx
      .insert(caution)
      .values(shipped.map(({ appliesTo, ...values }) => ({ shopId, ...values, appliesTo: { ...appliesTo } })))
      .onConflictDoNothing({ target: [caution.shopId, caution.shippedKey] });
  }

  async knownFinishIds(tx: Tx, shopId: string, ids: readonly string[]): Promise<string[]> {
    if (ids.length === 0) return [];
    const rows = await tx
      .select({ id: finish.id })
      .from(finish)
      .where(and(eq(finish.shopId, shopId), inArray(finish.id, [...ids])));
    return rows.map(({ id }) => id);
  }

  async knownEffectKeys(tx: Tx, shopId: string, keys: readonly string[]): Promise<string[]> {
    if (keys.length === 0) return [];
    const rows = await tx
      .select({ key: effect.key })
      .from(effect)
      .where(and(eq(effect.shopId, shopId), inArray(effect.key, [...keys])));
    return rows.map(({ key }) => key);
  }

  async findEffectKey(tx: Tx, shopId: string, effectId: string): Promise<string | undefined> {
    const [row] = await tx
      .select({ key: effect.key })
      .from(effect)
      .where(and(eq(effect.shopId, shopId), eq(effect.id, effectId)));
    return row?.key;
  }

  async findSourceKind(tx: Tx, shopId: string, machineId: string): Promise<SourceKind | undefined> {
    const [row] = await tx
      .select({ sourceKind: machine.sourceKind })
      .from(machine)
      .where(and(eq(machine.shopId, shopId), eq(machine.id, machineId)));
    // a constraint holds the column to the list
    return row?.sourceKind as SourceKind | undefined;
  }
}

/** A constraint and this module's request classes are the only ways into these columns, so they hold the model's shapes. */
function toCautionRow({ id, level, subject, text, source, appliesTo, shippedKey, version }: typeof caution.$inferSelect): CautionRow {
  return { id, level: level as CautionLevel, subject, text, source, appliesTo: appliesTo as CautionScope, shippedKey, version };
}
