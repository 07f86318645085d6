import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type {
  MaterialFamily,
  Panel,
  PhysicalProfile,
  RevisionContent,
  RevisionState,
  Role,
  RouteKind,
  SourceKind,
} from '@proofplate/recipe-model';
import { and, asc, eq, getViewSelectedFields, gt, inArray, type SQL, sql } from 'drizzle-orm';
import { alias, type PgUpdateSetSource } from 'drizzle-orm/pg-core';
import type { SignOffMeaning } from './dto/sign-off.dto';
import type { LockedRevision, RevisionBrief, RevisionHead, StoredRevision, StoredSignOff } from './stored-revision';

const {
  revision,
  revisionNow,
  recipe,
  material,
  finish,
  effect,
  machine,
  machineProfile,
  machineLens,
  lens,
  powerCalibration,
  member,
  signOff,
} = schema;
const author = alias(member, 'author');
const groundsGiver = alias(member, 'grounds_giver');
const presentProfile = alias(machineProfile, 'present_profile');

type RevisionRow = typeof revision.$inferSelect;
type Key = { readonly shopId: string; readonly id: string };
export type NewDraft = Pick<StoredRevision, 'recipeId' | 'content' | 'profileId' | 'calibrationId' | 'reason' | 'basedOnId' | 'route'>;
export type DraftChange = Partial<
  Pick<
    StoredRevision,
    | 'content'
    | 'calibrationId'
    | 'reason'
    | 'route'
    | 'grounds'
    | 'groundsBy'
    | 'effectiveFrom'
    | 'reviewDue'
    | 'acknowledgedCautionIds'
    | 'editorIds'
  >
>;

const isRevision = ({ shopId, id }: Key) => and(eq(revision.shopId, shopId), eq(revision.id, id));
/** What people read; the table itself is for changing and for locks. */
const readColumns = getViewSelectedFields(revisionNow);
const isReviewOverdue = sql<boolean>`(${revisionNow.state} = 'approved' and coalesce(${revisionNow.reviewDue} < now(), false))`;

@Injectable()
export class RecipeRevisionsRepository {
  async find(tx: Tx, shopId: string, id: string): Promise<StoredRevision | undefined> {
    const [row] = await tx
      .select()
      .from(revisionNow)
      .where(and(eq(revisionNow.shopId, shopId), eq(revisionNow.id, id)));
    return row === undefined ? undefined : toStoredRevision(row);
  }

  /** Keeps a draft from being edited by two people at once. */
  async lock(tx: Tx, shopId: string, id: string): Promise<StoredRevision | undefined> {
    const [row] = await tx.select().from(revision).where(isRevision({ shopId, id })).for('update');
    return row === undefined ? undefined : toStoredRevision(row);
  }

  /** All revisions of a recipe, always in the same order, so that two signers never wait for each other. */
  async lockLadder(tx: Tx, shopId: string, recipeId: string): Promise<LockedRevision[]> {
    const rows = await tx
      .select({ row: revision, takesEffectLater: sql<boolean>`coalesce(${revision.effectiveFrom} > now(), false)` })
      .from(revision)
      .where(and(eq(revision.shopId, shopId), eq(revision.recipeId, recipeId)))
      .orderBy(asc(revision.id))
      .for('update');
    return rows.map(({ row, takesEffectLater }) => ({ ...toStoredRevision(row), takesEffectLater }));
  }

  async heads(tx: Tx, shopId: string, ids: readonly string[]): Promise<RevisionHead[]> {
    if (ids.length === 0) return [];
    const rows = await headQuery(tx).where(and(eq(revisionNow.shopId, shopId), inArray(revisionNow.id, [...ids])));
    return rows.map(toHead);
  }

  /** Approved revisions by the code of their recipe. */
  async approvedIds(
    tx: Tx,
    shopId: string,
    { machineId, afterCode, limit }: { machineId?: string; afterCode?: string; limit: number },
  ): Promise<string[]> {
    const rows = await tx
      .select({ id: revisionNow.id })
      .from(revisionNow)
      .innerJoin(recipe, and(eq(recipe.shopId, revisionNow.shopId), eq(recipe.id, revisionNow.recipeId)))
      .where(
        and(
          eq(revisionNow.shopId, shopId),
          eq(revisionNow.state, 'approved'),
          machineId === undefined ? undefined : eq(recipe.machineId, machineId),
          afterCode === undefined ? undefined : gt(recipe.code, afterCode),
        ),
      )
      .orderBy(asc(recipe.code))
      .limit(limit);
    return rows.map(({ id }) => id);
  }

  /** The ladders of recipes: drafts first, then newest first. */
  async ladders(tx: Tx, shopId: string, recipeIds: readonly string[]): Promise<RevisionBrief[]> {
    if (recipeIds.length === 0) return [];
    return this.briefs(tx, and(eq(revisionNow.shopId, shopId), inArray(revisionNow.recipeId, [...recipeIds])));
  }

  /** Oldest first. */
  async signOffs(tx: Tx, shopId: string, revisionIds: readonly string[]): Promise<StoredSignOff[]> {
    if (revisionIds.length === 0) return [];
    const rows = await tx
      .select()
      .from(signOff)
      .where(and(eq(signOff.shopId, shopId), inArray(signOff.revisionId, [...revisionIds])))
      .orderBy(asc(signOff.signedAt), asc(signOff.id));
    return rows.map(toStoredSignOff);
  }

  async insertDraft(tx: Tx, shopId: string, createdBy: string, { content, ...draft }: NewDraft): Promise<string> {
    const [row] = await tx
      .insert(revision)
      .values({ shopId, createdBy, ...draft, content: { ...content } })
      .returning({ id: revision.id });
    if (row === undefined) throw new Error('the draft was not stored');
    return row.id;
  }

  async updateDraft(tx: Tx, key: Key, { content, acknowledgedCautionIds, editorIds, ...change }: DraftChange): Promise<void> {
    const values = {
      ...change,
      ...(content === undefined ? {} : { content: { ...content } }),
      ...(acknowledgedCautionIds === undefined ? {} : { acknowledgedCautionIds: [...acknowledgedCautionIds] }),
      ...(editorIds === undefined ? {} : { editorIds: [...editorIds] }),
    };
    await tx
      .update(revision)
      .set({ ...values, version: sql`${revision.version} + 1` })
      .where(isRevision(key));
  }

  async deleteDraft(tx: Tx, key: Key): Promise<void> {
    await tx.delete(revision).where(isRevision(key));
  }

  /** Gives the number and freezes the content. */
  async submit(
    tx: Tx,
    key: Key,
    submitted: { number: number; contentHash: string; acknowledgedCautionIds: readonly string[] },
  ): Promise<void> {
    const { number, contentHash, acknowledgedCautionIds } = submitted;
    await this.move(tx, key, 'in_review', {
      number,
      contentHash,
      acknowledgedCautionIds: [...acknowledgedCautionIds],
      submittedAt: sql`now()`,
    });
  }

  /** Without a day of its own the review falls due by the shop's policy, counted from when the setting takes effect. */
  async approve(tx: Tx, key: Key, state: 'approved' | 'scheduled', reviewEveryDays: number): Promise<void> {
    const reviewDue = sql`coalesce(${revision.reviewDue}, greatest(${revision.effectiveFrom}, now()) + make_interval(days => ${reviewEveryDays}))`;
    await this.move(tx, key, state, { approvedAt: sql`now()`, reviewDue });
  }

  async takeEffect(tx: Tx, key: Key): Promise<void> {
    await this.move(tx, key, 'approved', {});
  }

  async giveBack(tx: Tx, key: Key): Promise<void> {
    await this.move(tx, key, 'returned', {});
  }

  async supersede(tx: Tx, key: Key): Promise<void> {
    await this.move(tx, key, 'superseded', { supersededAt: sql`now()` });
  }

  async withdraw(tx: Tx, key: Key): Promise<void> {
    await this.move(tx, key, 'withdrawn', { withdrawnAt: sql`now()` });
  }

  private async move(tx: Tx, key: Key, state: RevisionState, values: PgUpdateSetSource<typeof revision>): Promise<void> {
    const moved = await tx
      .update(revision)
      .set({ ...values, state, version: sql`${revision.version} + 1` })
      .where(isRevision(key))
      .returning({ id: revision.id });
    if (moved.length !== 1) throw new Error('the locked revision is gone');
  }

  private async briefs(tx: Tx, isWanted: SQL | undefined): Promise<RevisionBrief[]> {
    const rows = await tx
      .select({ row: readColumns, authorName: author.printedName, isReviewOverdue })
      .from(revisionNow)
      .innerJoin(author, and(eq(author.shopId, revisionNow.shopId), eq(author.id, revisionNow.createdBy)))
      .where(isWanted)
      .orderBy(sql`${revisionNow.number} desc nulls first`, asc(revisionNow.id));
    return rows.map(({ row, authorName, isReviewOverdue: isOverdue }) => ({
      ...toStoredRevision(row),
      authorName,
      isReviewOverdue: isOverdue,
    }));
  }
}

function headQuery(tx: Tx) {
  return tx
    .select({
      revision: readColumns,
      recipe: { id: recipe.id, code: recipe.code, title: recipe.title },
      material: { id: material.id, name: material.name, family: material.family },
      finish: { id: finish.id, name: finish.name },
      effect: { id: effect.id, name: effect.name, key: effect.key },
      machine: { id: machine.id, name: machine.name, sourceKind: machine.sourceKind },
      lens: { id: lens.id, name: lens.name },
      profile: machineProfile,
      presentPhysicalNumber: presentProfile.physicalNumber,
      calibration: powerCalibration,
      groundsByName: groundsGiver.printedName,
      focalLengthMm: lens.focalLengthMm,
      measuredSpotUm: machineLens.measuredSpotUm,
    })
    .from(revisionNow)
    .innerJoin(recipe, and(eq(recipe.shopId, revisionNow.shopId), eq(recipe.id, revisionNow.recipeId)))
    .innerJoin(material, and(eq(material.shopId, recipe.shopId), eq(material.id, recipe.materialId)))
    .innerJoin(finish, and(eq(finish.shopId, recipe.shopId), eq(finish.id, recipe.finishId)))
    .innerJoin(effect, and(eq(effect.shopId, recipe.shopId), eq(effect.id, recipe.effectId)))
    .innerJoin(machine, and(eq(machine.shopId, recipe.shopId), eq(machine.id, recipe.machineId)))
    .innerJoin(lens, and(eq(lens.shopId, recipe.shopId), eq(lens.id, recipe.lensId)))
    .innerJoin(machineProfile, and(eq(machineProfile.shopId, revisionNow.shopId), eq(machineProfile.id, revisionNow.profileId)))
    .innerJoin(
      presentProfile,
      and(
        eq(presentProfile.shopId, machine.shopId),
        eq(presentProfile.machineId, machine.id),
        eq(presentProfile.number, machine.profileNumber),
      ),
    )
    .leftJoin(powerCalibration, and(eq(powerCalibration.shopId, revisionNow.shopId), eq(powerCalibration.id, revisionNow.calibrationId)))
    .leftJoin(groundsGiver, and(eq(groundsGiver.shopId, revisionNow.shopId), eq(groundsGiver.id, revisionNow.groundsBy)))
    .leftJoin(
      machineLens,
      and(eq(machineLens.shopId, recipe.shopId), eq(machineLens.machineId, recipe.machineId), eq(machineLens.lensId, recipe.lensId)),
    );
}

type HeadRow = Awaited<ReturnType<typeof headQuery>>[number];

/** Constraints and the request classes are the only ways into these columns, so they hold the model's shapes. */
function toHead(row: HeadRow): RevisionHead {
  const { profile, calibration, focalLengthMm, measuredSpotUm } = row;
  return {
    revision: toStoredRevision(row.revision),
    recipe: {
      ...row.recipe,
      material: { ...row.material, family: row.material.family as MaterialFamily },
      finish: row.finish,
      effect: row.effect,
      machine: { ...row.machine, sourceKind: row.machine.sourceKind as SourceKind },
      lens: row.lens,
    },
    profile: {
      id: profile.id,
      number: profile.number,
      physicalNumber: profile.physicalNumber,
      physical: profile.physical as unknown as PhysicalProfile,
      panel: profile.panel as unknown as Panel,
    },
    presentPhysicalNumber: row.presentPhysicalNumber,
    calibration,
    groundsByName: row.groundsByName,
    optics: { focalLengthMm, measuredSpotUm },
  };
}

export function toStoredRevision(row: RevisionRow): StoredRevision {
  return {
    ...row,
    state: row.state as RevisionState,
    route: row.route as RouteKind,
    content: row.content as unknown as RevisionContent,
  };
}

function toStoredSignOff(row: typeof signOff.$inferSelect): StoredSignOff {
  const { role, meaning, method, ...rest } = row;
  return { ...rest, role: role as Role, meaning: meaning as SignOffMeaning, method: method as StoredSignOff['method'] };
}
