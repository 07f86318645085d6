import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { Panel, PhysicalProfile, RecipeScope, RevisionContent } from '@proofplate/recipe-model';
import { and, asc, desc, eq, inArray, isNull, ne, or, sql } from 'drizzle-orm';
import type { KeyIds } from './stored-revision';

const { recipe, revision, material, finish, effect, machine, machineProfile, machineLens, lens, materialGroup, hold, coupon, run, photo } =
  schema;

export type RecipeRow = typeof recipe.$inferSelect;
export type HoldRow = typeof hold.$inferSelect;
export type NewRecipe = KeyIds & { readonly code: string; readonly title: string; readonly scope: RecipeScope };
export type Mate = { readonly recipeCode: string; readonly scope: RecipeScope };

/** Names of the five things of a recipe. */
export type KeyNames = Readonly<Record<keyof KeyIds, string>>;
export type Mounting = {
  readonly lensName: string;
  readonly workingDistanceMm: number | null;
  readonly focusMethod: string;
  readonly profileId: string;
  readonly physicalNumber: number;
  readonly physical: PhysicalProfile;
  readonly panel: Panel;
};

type Key = { readonly shopId: string; readonly id: string };
const isRecipe = ({ shopId, id }: Key) => and(eq(recipe.shopId, shopId), eq(recipe.id, id));
const hasKeys = (shopId: string, keys: KeyIds) =>
  and(
    eq(recipe.shopId, shopId),
    eq(recipe.materialId, keys.materialId),
    eq(recipe.finishId, keys.finishId),
    eq(recipe.effectId, keys.effectId),
    eq(recipe.machineId, keys.machineId),
    eq(recipe.lensId, keys.lensId),
  );

@Injectable()
export class RecipesRepository {
  async find(tx: Tx, shopId: string, id: string): Promise<RecipeRow | undefined> {
    const [row] = await tx.select().from(recipe).where(isRecipe({ shopId, id }));
    return row;
  }

  async lock(tx: Tx, shopId: string, id: string): Promise<RecipeRow | undefined> {
    const [row] = await tx.select().from(recipe).where(isRecipe({ shopId, id })).for('update');
    return row;
  }

  /** Every recipe that answers the same question, always in the same order: no two of them are approved at the same moment. */
  async lockMates(tx: Tx, shopId: string, keys: KeyIds): Promise<void> {
    await tx.select({ id: recipe.id }).from(recipe).where(hasKeys(shopId, keys)).orderBy(asc(recipe.id)).for('update');
  }

  /** Scopes of the other recipes with the same five keys that have an approved or scheduled revision. */
  async approvedMates(tx: Tx, shopId: string, keys: KeyIds, exceptId: string): Promise<Mate[]> {
    const rows = await tx
      .select({ recipeCode: recipe.code, content: revision.content })
      .from(recipe)
      .innerJoin(revision, and(eq(revision.shopId, recipe.shopId), eq(revision.recipeId, recipe.id)))
      .where(and(hasKeys(shopId, keys), ne(recipe.id, exceptId), inArray(revision.state, ['approved', 'scheduled'])))
      .orderBy(asc(recipe.code));
    // only this module writes revisions, so their content is the model's
    return rows.map(({ recipeCode, content }) => ({ recipeCode, scope: (content as unknown as RevisionContent).scope }));
  }

  async insert(tx: Tx, shopId: string, createdBy: string, { scope, ...values }: NewRecipe): Promise<string> {
    const [row] = await tx
      .insert(recipe)
      .values({ shopId, createdBy, ...values, ...scopeColumns(scope) })
      .returning({ id: recipe.id });
    if (row === undefined) throw new Error('the recipe was not stored');
    return row.id;
  }

  async update(tx: Tx, key: Key, { title, scope }: { title?: string; scope?: RecipeScope }): Promise<void> {
    const values = { ...(title === undefined ? {} : { title }), ...(scope === undefined ? {} : scopeColumns(scope)) };
    await tx
      .update(recipe)
      .set({ ...values, version: sql`${recipe.version} + 1` })
      .where(isRecipe(key));
  }

  /** Names of the five things, and whether each is in use; undefined where the shop has none with this id. */
  async namesOf(tx: Tx, shopId: string, keys: KeyIds) {
    const named = async (table: typeof material | typeof finish | typeof machine | typeof lens, id: string) => {
      const [row] = await tx
        .select({ name: table.name, archivedAt: table.archivedAt })
        .from(table)
        .where(and(eq(table.shopId, shopId), eq(table.id, id)));
      return row;
    };
    const [wanted] = await tx
      .select({ name: effect.name, archivedAt: effect.archivedAt, key: effect.key })
      .from(effect)
      .where(and(eq(effect.shopId, shopId), eq(effect.id, keys.effectId)));
    return {
      materialId: await named(material, keys.materialId),
      finishId: await named(finish, keys.finishId),
      effectId: wanted,
      machineId: await named(machine, keys.machineId),
      lensId: await named(lens, keys.lensId),
    };
  }

  /** The machine as it is now with one of its lenses; undefined where the lens is not used on it. */
  async findMounting(tx: Tx, shopId: string, { machineId, lensId }: { machineId: string; lensId: string }): Promise<Mounting | undefined> {
    const [row] = await tx
      .select({
        lensName: lens.name,
        workingDistanceMm: machineLens.workingDistanceMm,
        focusMethod: machineLens.focusMethod,
        profileId: machineProfile.id,
        physicalNumber: machineProfile.physicalNumber,
        physical: machineProfile.physical,
        panel: machineProfile.panel,
      })
      .from(machineLens)
      .innerJoin(lens, and(eq(lens.shopId, machineLens.shopId), eq(lens.id, machineLens.lensId)))
      .innerJoin(machine, and(eq(machine.shopId, machineLens.shopId), eq(machine.id, machineLens.machineId)))
      .innerJoin(
        machineProfile,
        and(
          eq(machineProfile.shopId, machine.shopId),
          eq(machineProfile.machineId, machine.id),
          eq(machineProfile.number, machine.profileNumber),
        ),
      )
      .where(and(eq(machineLens.shopId, shopId), eq(machineLens.machineId, machineId), eq(machineLens.lensId, lensId)));
    if (row === undefined) return undefined;
    // the machines module is the only way into these columns, so they hold the model's shapes
    return { ...row, physical: row.physical as unknown as PhysicalProfile, panel: row.panel as unknown as Panel };
  }

  /** Those of the photos that are of the shop. */
  async knownPhotoIds(tx: Tx, shopId: string, ids: readonly string[]): Promise<string[]> {
    if (ids.length === 0) return [];
    const rows = await tx
      .select({ id: photo.id })
      .from(photo)
      .where(and(eq(photo.shopId, shopId), inArray(photo.id, [...ids])));
    return rows.map(({ id }) => id);
  }

  async isMaterialGroup(tx: Tx, shopId: string, id: string): Promise<boolean> {
    const [row] = await tx
      .select({ id: materialGroup.id })
      .from(materialGroup)
      .where(and(eq(materialGroup.shopId, shopId), eq(materialGroup.id, id)));
    return row !== undefined;
  }

  /** Open holds on the recipe and on its machine, the recipe's own first. */
  async openHolds(tx: Tx, shopId: string, { recipeId, machineId }: { recipeId: string; machineId: string }): Promise<HoldRow[]> {
    return tx
      .select()
      .from(hold)
      .where(and(eq(hold.shopId, shopId), isNull(hold.releasedAt), or(eq(hold.recipeId, recipeId), eq(hold.machineId, machineId))))
      .orderBy(sql`${hold.recipeId} is null`, desc(hold.createdAt));
  }

  /** True if a coupon, a run or another revision refers to it, so that it has to stay. */
  async isCited(tx: Tx, shopId: string, revisionId: string): Promise<boolean> {
    const [row] = await tx.execute<{ cited: boolean }>(sql`select
      exists (select 1 from ${coupon} c where c.shop_id = ${shopId} and c.confirms_revision_id = ${revisionId})
      or exists (select 1 from ${run} r where r.shop_id = ${shopId} and r.revision_id = ${revisionId})
      or exists (select 1 from ${revision} v where v.shop_id = ${shopId} and v.based_on_id = ${revisionId}) as cited`);
    return row?.cited ?? false;
  }
}

/** The columns by which the finder looks for a recipe. */
function scopeColumns({ thicknessMm, partDiameterMm, featureKind, featureSizeMm, materialGroupId, customerSpecification }: RecipeScope) {
  return {
    thicknessFromMm: thicknessMm?.from ?? null,
    thicknessToMm: thicknessMm?.to ?? null,
    partDiameterFromMm: partDiameterMm?.from ?? null,
    partDiameterToMm: partDiameterMm?.to ?? null,
    featureKind: featureKind ?? 'filled-area',
    featureSizeFromMm: featureSizeMm?.from ?? null,
    featureSizeToMm: featureSizeMm?.to ?? null,
    materialGroupId: materialGroupId ?? null,
    customerSpecification: customerSpecification ?? '',
  };
}
