import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, asc, eq, isNotNull, isNull, ne, sql } from 'drizzle-orm';

const { lens } = schema;

export type LensRow = typeof lens.$inferSelect;
export type LensValues = Pick<LensRow, 'name' | 'focalLengthMm' | 'fieldSizeMm' | 'notes'>;

@Injectable()
export class LensesRepository {
  async list(
    tx: Tx,
    shopId: string,
    { archived, after, limit }: { archived: boolean; after?: { name: string; id: string }; limit: number },
  ): Promise<LensRow[]> {
    return tx
      .select()
      .from(lens)
      .where(
        and(
          eq(lens.shopId, shopId),
          archived ? isNotNull(lens.archivedAt) : isNull(lens.archivedAt),
          after === undefined ? undefined : sql`(${lens.name}, ${lens.id}) > (${after.name}, ${after.id}::uuid)`,
        ),
      )
      .orderBy(asc(lens.name), asc(lens.id))
      .limit(limit);
  }

  async findById(tx: Tx, shopId: string, id: string): Promise<LensRow | undefined> {
    const [row] = await tx
      .select()
      .from(lens)
      .where(and(eq(lens.shopId, shopId), eq(lens.id, id)));
    return row;
  }

  async lockById(tx: Tx, shopId: string, id: string): Promise<LensRow | undefined> {
    const [row] = await tx
      .select()
      .from(lens)
      .where(and(eq(lens.shopId, shopId), eq(lens.id, id)))
      .for('update');
    return row;
  }

  async isNameTaken(tx: Tx, shopId: string, name: string, exceptId?: string): Promise<boolean> {
    const [row] = await tx
      .select({ id: lens.id })
      .from(lens)
      .where(and(eq(lens.shopId, shopId), eq(lens.name, name), exceptId === undefined ? undefined : ne(lens.id, exceptId)));
    return row !== undefined;
  }

  async insert(tx: Tx, shopId: string, createdBy: string, values: LensValues): Promise<LensRow> {
    const [row] = await tx
      .insert(lens)
      .values({ shopId, createdBy, ...values })
      .returning();
    if (row === undefined) throw new Error('the lens was not stored');
    return row;
  }

  async update(tx: Tx, shopId: string, id: string, values: Partial<LensValues> & { archivedAt?: Date | null }): Promise<LensRow> {
    const [row] = await tx
      .update(lens)
      .set({ ...values, version: sql`${lens.version} + 1` })
      .where(and(eq(lens.shopId, shopId), eq(lens.id, id)))
      .returning();
    if (row === undefined) throw new Error('the locked lens is gone');
    return row;
  }
}
