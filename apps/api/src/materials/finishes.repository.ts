import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, asc, eq, isNotNull, isNull, ne, sql } from 'drizzle-orm';
import type { AfterName } from './materials.repository';

const { finish } = schema;

export type FinishRow = typeof finish.$inferSelect;
export type FinishValues = Pick<FinishRow, 'name' | 'preparation' | 'treatment'>;

@Injectable()
export class FinishesRepository {
  async list(tx: Tx, shopId: string, archived: boolean, { after, limit }: { after?: AfterName; limit: number }): Promise<FinishRow[]> {
    const isAfter = after === undefined ? undefined : sql`(${finish.name}, ${finish.id}) > (${after.name}, ${after.id}::uuid)`;
    return tx
      .select()
      .from(finish)
      .where(and(eq(finish.shopId, shopId), archived ? isNotNull(finish.archivedAt) : isNull(finish.archivedAt), isAfter))
      .orderBy(asc(finish.name), asc(finish.id))
      .limit(limit);
  }

  async findById(tx: Tx, shopId: string, id: string): Promise<FinishRow | undefined> {
    const [row] = await tx
      .select()
      .from(finish)
      .where(and(eq(finish.shopId, shopId), eq(finish.id, id)));
    return row;
  }

  async lockById(tx: Tx, shopId: string, id: string): Promise<FinishRow | undefined> {
    const [row] = await tx
      .select()
      .from(finish)
      .where(and(eq(finish.shopId, shopId), eq(finish.id, id)))
      .for('update');
    return row;
  }

  async isNameTaken(tx: Tx, shopId: string, name: string, exceptId?: string): Promise<boolean> {
    const isOther = exceptId === undefined ? undefined : ne(finish.id, exceptId);
    const [row] = await tx
      .select({ id: finish.id })
      .from(finish)
      .where(and(eq(finish.shopId, shopId), eq(finish.name, name), isOther));
    return row !== undefined;
  }

  async insert(tx: Tx, shopId: string, createdBy: string, values: FinishValues): Promise<FinishRow> {
    const [row] = await tx
      .insert(finish)
      .values({ shopId, createdBy, ...values })
      .returning();
    if (row === undefined) throw new Error('the finish was not stored');
    return row;
  }

  async update(tx: Tx, shopId: string, id: string, values: Partial<FinishValues> & { archivedAt?: Date | null }): Promise<FinishRow> {
    const [row] = await tx
      .update(finish)
      .set({ ...values, version: sql`${finish.version} + 1` })
      .where(and(eq(finish.shopId, shopId), eq(finish.id, id)))
      .returning();
    if (row === undefined) throw new Error('the locked finish is gone');
    return row;
  }
}
