import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { MaterialFamily } from '@proofplate/recipe-model';
import { and, asc, eq, inArray, ne, sql } from 'drizzle-orm';
import type { AfterName } from './materials.repository';

const { materialGroup, materialGroupMaterial, material, recipe, revisionNow } = schema;

export type MaterialGroupRow = typeof materialGroup.$inferSelect;
export type MaterialGroupView = { group: MaterialGroupRow; materials: { id: string; name: string }[] };
export type GroupedMaterial = { readonly groupId: string; readonly id: string; readonly family: MaterialFamily };
export type CoveringRecipe = { readonly id: string; readonly code: string; readonly title: string };

@Injectable()
export class MaterialGroupsRepository {
  async list(tx: Tx, shopId: string, { after, limit }: { after?: AfterName; limit: number }): Promise<MaterialGroupView[]> {
    const isAfter =
      after === undefined ? undefined : sql`(${materialGroup.name}, ${materialGroup.id}) > (${after.name}, ${after.id}::uuid)`;
    const groups = await tx
      .select()
      .from(materialGroup)
      .where(and(eq(materialGroup.shopId, shopId), isAfter))
      .orderBy(asc(materialGroup.name), asc(materialGroup.id))
      .limit(limit);
    return this.withMaterials(tx, shopId, groups);
  }

  async findById(tx: Tx, shopId: string, id: string): Promise<MaterialGroupView | undefined> {
    const groups = await tx
      .select()
      .from(materialGroup)
      .where(and(eq(materialGroup.shopId, shopId), eq(materialGroup.id, id)));
    const [view] = await this.withMaterials(tx, shopId, groups);
    return view;
  }

  async lockById(tx: Tx, shopId: string, id: string): Promise<MaterialGroupRow | undefined> {
    const [row] = await tx
      .select()
      .from(materialGroup)
      .where(and(eq(materialGroup.shopId, shopId), eq(materialGroup.id, id)))
      .for('update');
    return row;
  }

  async isNameTaken(tx: Tx, shopId: string, name: string, exceptId?: string): Promise<boolean> {
    const isOther = exceptId === undefined ? undefined : ne(materialGroup.id, exceptId);
    const [row] = await tx
      .select({ id: materialGroup.id })
      .from(materialGroup)
      .where(and(eq(materialGroup.shopId, shopId), eq(materialGroup.name, name), isOther));
    return row !== undefined;
  }

  async insert(tx: Tx, shopId: string, createdBy: string, name: string): Promise<string> {
    const [row] = await tx.insert(materialGroup).values({ shopId, createdBy, name }).returning({ id: materialGroup.id });
    if (row === undefined) throw new Error('the group was not stored');
    return row.id;
  }

  async rename(tx: Tx, shopId: string, id: string, name: string): Promise<void> {
    await tx
      .update(materialGroup)
      .set({ name, version: sql`${materialGroup.version} + 1` })
      .where(and(eq(materialGroup.shopId, shopId), eq(materialGroup.id, id)));
  }

  async replaceMaterials(tx: Tx, shopId: string, groupId: string, materialIds: readonly string[]): Promise<void> {
    await tx
      .delete(materialGroupMaterial)
      .where(and(eq(materialGroupMaterial.shopId, shopId), eq(materialGroupMaterial.materialGroupId, groupId)));
    if (materialIds.length === 0) return;
    await tx.insert(materialGroupMaterial).values(materialIds.map((materialId) => ({ shopId, materialGroupId: groupId, materialId })));
  }

  /** The materials of several groups, with what cautions ask of them. */
  async materialsOf(tx: Tx, shopId: string, groupIds: readonly string[]): Promise<GroupedMaterial[]> {
    if (groupIds.length === 0) return [];
    const rows = await tx
      .select({ groupId: materialGroupMaterial.materialGroupId, id: material.id, family: material.family })
      .from(materialGroupMaterial)
      .innerJoin(material, and(eq(material.shopId, materialGroupMaterial.shopId), eq(material.id, materialGroupMaterial.materialId)))
      .where(and(eq(materialGroupMaterial.shopId, shopId), inArray(materialGroupMaterial.materialGroupId, [...groupIds])));
    // a constraint keeps the family on the list
    return rows.map((row) => ({ ...row, family: row.family as MaterialFamily }));
  }

  /** Keeps the group from being changed until the transaction ends. */
  async lockAsCovered(tx: Tx, shopId: string, id: string): Promise<void> {
    await tx
      .select({ id: materialGroup.id })
      .from(materialGroup)
      .where(and(eq(materialGroup.shopId, shopId), eq(materialGroup.id, id)))
      .for('share');
  }

  /** Recipes with a revision that somebody signed or is about to sign for the group, by code. */
  async recipesCovering(tx: Tx, shopId: string, groupId: string): Promise<CoveringRecipe[]> {
    return tx
      .selectDistinct({ id: recipe.id, code: recipe.code, title: recipe.title })
      .from(revisionNow)
      .innerJoin(recipe, and(eq(recipe.shopId, revisionNow.shopId), eq(recipe.id, revisionNow.recipeId)))
      .where(
        and(
          eq(revisionNow.shopId, shopId),
          inArray(revisionNow.state, ['in_review', 'scheduled', 'approved']),
          sql`${revisionNow.content} #>> '{scope,materialGroupId}' = ${groupId}`,
        ),
      )
      .orderBy(asc(recipe.code));
  }

  private async withMaterials(tx: Tx, shopId: string, groups: readonly MaterialGroupRow[]): Promise<MaterialGroupView[]> {
    if (groups.length === 0) return [];
    const members = await tx
      .select({ groupId: materialGroupMaterial.materialGroupId, id: material.id, name: material.name })
      .from(materialGroupMaterial)
      .innerJoin(material, and(eq(material.shopId, materialGroupMaterial.shopId), eq(material.id, materialGroupMaterial.materialId)))
      .where(
        and(
          eq(materialGroupMaterial.shopId, shopId),
          inArray(
            materialGroupMaterial.materialGroupId,
            groups.map(({ id }) => id),
          ),
        ),
      )
      .orderBy(asc(material.name), asc(material.id));
    return groups.map((group) => ({
      group,
      materials: members.filter(({ groupId }) => groupId === group.id).map(({ id, name }) => ({ id, name })),
    }));
  }
}
