import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { MaterialFamily } from '@proofplate/recipe-model';
import { and, asc, count, eq, ilike, inArray, isNotNull, isNull, ne, or, type SQL, sql } from 'drizzle-orm';
import { containsText } from '../database/contains-text';

const { material } = schema;

export type MaterialRow = Omit<typeof material.$inferSelect, 'family'> & { family: MaterialFamily };
export type MaterialValues = Pick<
  MaterialRow,
  'name' | 'family' | 'grade' | 'standardDesignation' | 'supplier' | 'thicknessMm' | 'properties' | 'notes'
>;
export type MaterialFilter = { archived: boolean; families?: readonly MaterialFamily[] | undefined; words?: string | undefined };
export type AfterName = { name: string; id: string };

@Injectable()
export class MaterialsRepository {
  async list(
    tx: Tx,
    shopId: string,
    filter: MaterialFilter,
    { after, limit }: { after?: AfterName; limit: number },
  ): Promise<MaterialRow[]> {
    const isAfter = after === undefined ? undefined : sql`(${material.name}, ${material.id}) > (${after.name}, ${after.id}::uuid)`;
    const rows = await tx
      .select()
      .from(material)
      .where(and(eq(material.shopId, shopId), matches(filter), isAfter))
      .orderBy(asc(material.name), asc(material.id))
      .limit(limit);
    return rows.map(toMaterialRow);
  }

  /** How many materials in use each family has. */
  async countByFamily(tx: Tx, shopId: string): Promise<{ family: MaterialFamily; count: number }[]> {
    const rows = await tx
      .select({ family: material.family, count: count() })
      .from(material)
      .where(and(eq(material.shopId, shopId), isNull(material.archivedAt)))
      .groupBy(material.family);
    return rows.map(({ family, ...row }) => ({ ...row, family: asFamily(family) }));
  }

  async findById(tx: Tx, shopId: string, id: string): Promise<MaterialRow | undefined> {
    const [row] = await tx
      .select()
      .from(material)
      .where(and(eq(material.shopId, shopId), eq(material.id, id)));
    return row === undefined ? undefined : toMaterialRow(row);
  }

  async lockById(tx: Tx, shopId: string, id: string): Promise<MaterialRow | undefined> {
    const [row] = await tx
      .select()
      .from(material)
      .where(and(eq(material.shopId, shopId), eq(material.id, id)))
      .for('update');
    return row === undefined ? undefined : toMaterialRow(row);
  }

  async knownIds(tx: Tx, shopId: string, ids: readonly string[]): Promise<string[]> {
    if (ids.length === 0) return [];
    const rows = await tx
      .select({ id: material.id })
      .from(material)
      .where(and(eq(material.shopId, shopId), inArray(material.id, [...ids])));
    return rows.map(({ id }) => id);
  }

  async isNameTaken(tx: Tx, shopId: string, name: string, exceptId?: string): Promise<boolean> {
    const isOther = exceptId === undefined ? undefined : ne(material.id, exceptId);
    const [row] = await tx
      .select({ id: material.id })
      .from(material)
      .where(and(eq(material.shopId, shopId), eq(material.name, name), isOther));
    return row !== undefined;
  }

  async insert(tx: Tx, shopId: string, createdBy: string, values: MaterialValues): Promise<MaterialRow> {
    const [row] = await tx
      .insert(material)
      .values({ shopId, createdBy, ...values })
      .returning();
    if (row === undefined) throw new Error('the material was not stored');
    return toMaterialRow(row);
  }

  async update(tx: Tx, shopId: string, id: string, values: Partial<MaterialValues> & { archivedAt?: Date | null }): Promise<MaterialRow> {
    const [row] = await tx
      .update(material)
      .set({ ...values, version: sql`${material.version} + 1` })
      .where(and(eq(material.shopId, shopId), eq(material.id, id)))
      .returning();
    if (row === undefined) throw new Error('the locked material is gone');
    return toMaterialRow(row);
  }
}

function matches({ archived, families, words }: MaterialFilter): SQL | undefined {
  const pattern = words === undefined || words === '' ? undefined : containsText(words);
  return and(
    archived ? isNotNull(material.archivedAt) : isNull(material.archivedAt),
    families === undefined ? undefined : inArray(material.family, [...families]),
    pattern === undefined
      ? undefined
      : or(
          ilike(material.name, pattern),
          ilike(material.grade, pattern),
          ilike(material.standardDesignation, pattern),
          ilike(material.supplier, pattern),
        ),
  );
}

const toMaterialRow = (row: typeof material.$inferSelect): MaterialRow => ({ ...row, family: asFamily(row.family) });

/** Only resolved families are ever stored. */
const asFamily = (family: string) => family as MaterialFamily;
