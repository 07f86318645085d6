import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { Criterion, Panel, RevisionContent, RevisionState, SourceKind } from '@proofplate/recipe-model';
import { and, asc, eq, isNull, sql } from 'drizzle-orm';

const { recipe, revision, revisionNow, machine, machineProfile, material, finish, effect, lens, shop } = schema;

type Named = { id: string; name: string };
/** A revision as a run cites it. */
export type CitedRevision = {
  id: string;
  number: number | null;
  state: RevisionState;
  content: RevisionContent;
  contentHash: string | null;
  isOverdue: boolean;
  overdueBlocks: boolean;
  recipe: { id: string; code: string; title: string };
  machine: Named & { sourceKind: SourceKind };
  lens: Named;
  material: Named;
  finish: Named;
  effect: Named;
  panel: Panel;
};

@Injectable()
export class CitedRevisionsRepository {
  /** Keeps recipe, machine and revision as they are until the transaction ends, so that no hold or withdrawal slips in between. */
  async lock(tx: Tx, shopId: string, revisionId: string): Promise<CitedRevision | undefined> {
    const found = await this.find(tx, shopId, revisionId);
    if (found === undefined) return undefined;
    await tx
      .select({ id: machine.id })
      .from(machine)
      .where(and(eq(machine.shopId, shopId), eq(machine.id, found.machine.id)))
      .for('share');
    await tx
      .select({ id: recipe.id })
      .from(recipe)
      .where(and(eq(recipe.shopId, shopId), eq(recipe.id, found.recipe.id)))
      .for('share');
    await tx
      .select({ id: revision.id })
      .from(revision)
      .where(and(eq(revision.shopId, shopId), eq(revision.id, revisionId)))
      .for('share');
    return this.find(tx, shopId, revisionId);
  }

  async find(tx: Tx, shopId: string, revisionId: string): Promise<CitedRevision | undefined> {
    const [row] = await tx
      .select({
        id: revisionNow.id,
        number: revisionNow.number,
        state: revisionNow.state,
        content: revisionNow.content,
        contentHash: revisionNow.contentHash,
        isOverdue: sql<boolean>`coalesce(${revisionNow.reviewDue} < now(), false)`,
        policy: shop.policy,
        recipe: { id: recipe.id, code: recipe.code, title: recipe.title },
        machine: { id: machine.id, name: machine.name, sourceKind: machine.sourceKind },
        lens: { id: lens.id, name: lens.name },
        material: { id: material.id, name: material.name },
        finish: { id: finish.id, name: finish.name },
        effect: { id: effect.id, name: effect.name },
        panel: machineProfile.panel,
      })
      .from(revisionNow)
      .innerJoin(recipe, and(eq(recipe.shopId, revisionNow.shopId), eq(recipe.id, revisionNow.recipeId)))
      .innerJoin(machineProfile, and(eq(machineProfile.shopId, revisionNow.shopId), eq(machineProfile.id, revisionNow.profileId)))
      .innerJoin(machine, and(eq(machine.shopId, recipe.shopId), eq(machine.id, recipe.machineId)))
      .innerJoin(lens, and(eq(lens.shopId, recipe.shopId), eq(lens.id, recipe.lensId)))
      .innerJoin(material, and(eq(material.shopId, recipe.shopId), eq(material.id, recipe.materialId)))
      .innerJoin(finish, and(eq(finish.shopId, recipe.shopId), eq(finish.id, recipe.finishId)))
      .innerJoin(effect, and(eq(effect.shopId, recipe.shopId), eq(effect.id, recipe.effectId)))
      .innerJoin(shop, eq(shop.id, revisionNow.shopId))
      .where(and(eq(revisionNow.shopId, shopId), eq(revisionNow.id, revisionId)));
    if (row === undefined) return undefined;
    const { policy, ...rest } = row;
    return {
      ...rest,
      overdueBlocks: policy.overdueBlocks,
      // constraints and the request classes of recipes and machines are the only ways into these columns
      state: row.state as RevisionState,
      content: row.content as unknown as RevisionContent,
      machine: { ...row.machine, sourceKind: row.machine.sourceKind as SourceKind },
      panel: row.panel as unknown as Panel,
    };
  }

  /** Lenses of the shop by name, to say which one is fitted. */
  async lenses(tx: Tx, shopId: string): Promise<Named[]> {
    return tx
      .select({ id: lens.id, name: lens.name })
      .from(lens)
      .where(and(eq(lens.shopId, shopId), isNull(lens.archivedAt)))
      .orderBy(asc(lens.name));
  }

  /** Acceptance criteria: those of the coupon that the setting comes from, else those of the effect. */
  async criteria(tx: Tx, shopId: string, revisionId: string): Promise<Criterion[]> {
    const rows = await tx.execute<{ criteria: Criterion[] | null }>(sql`
      select coalesce(
        (select k.criteria from revision_evidence e join coupon k on k.shop_id = e.shop_id and k.id = e.coupon_id
          where e.shop_id = v.shop_id and e.revision_id = v.id and e.kind = 'basis' and k.criteria is not null order by k.id limit 1),
        f.criteria) as criteria
      from revision v
      join recipe r on r.shop_id = v.shop_id and r.id = v.recipe_id
      join effect f on f.shop_id = r.shop_id and f.id = r.effect_id
      where v.shop_id = ${shopId} and v.id = ${revisionId}`);
    return rows[0]?.criteria ?? [];
  }
}
