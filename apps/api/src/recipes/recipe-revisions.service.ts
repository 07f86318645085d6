import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import type { Tx } from '../database/unit-of-work';
import { MaterialGroupsService } from '../materials/material-groups.service';
import type { RecipeRevisionDto } from './dto/recipe-revision.dto';
import { RecipeRevisionsRepository } from './recipe-revisions.repository';
import { RecipeNotFoundError, RevisionNotFoundError } from './recipes.errors';
import { RecipesRepository } from './recipes.repository';
import { keyIdsOf, type QueuedRevision, RevisionRecordsService } from './revision-records.service';
import { ScheduledRevisionsService } from './scheduled-revisions.service';
import type { LockedRevision, RevisionRecord, StoredRevision } from './stored-revision';

/** Reading revisions and moving their state inside the transaction of another module's use case: who may do so is decided there. */
@Injectable()
export class RecipeRevisionsService {
  constructor(
    private readonly revisions: RecipeRevisionsRepository,
    private readonly recipes: RecipesRepository,
    private readonly records: RevisionRecordsService,
    private readonly scheduled: ScheduledRevisionsService,
    private readonly groups: MaterialGroupsService,
  ) {}

  /** Everything about a revision. @throws RevisionNotFoundError also for another shop's revision */
  async getRecord(tx: Tx, shopId: string, id: string): Promise<RevisionRecord> {
    return this.records.get(tx, shopId, id);
  }

  /** Revisions in review as the queue shows them, in the order of the ids. */
  async listQueued(tx: Tx, actor: Actor, ids: readonly string[]): Promise<QueuedRevision[]> {
    const records = await this.records.list(tx, actor.shopId, ids);
    return this.records.toQueued(tx, actor, records);
  }

  /** The answer of every act on a revision. */
  async getDto(tx: Tx, actor: Actor, id: string): Promise<RecipeRevisionDto> {
    return this.records.getDto(tx, actor, id);
  }

  /**
   * Locks what a signature depends on, always in the same order: the recipes that answer the same question, then every revision of this
   * one, then the group that it covers. A scheduled revision whose day has come is made current on the way.
   *
   * @throws RevisionNotFoundError also for another shop's revision
   */
  async lockForSigning(tx: Tx, shopId: string, id: string): Promise<{ revision: LockedRevision; ladder: LockedRevision[] }> {
    const { recipeId } = await this.getRow(tx, shopId, id);
    const recipe = await this.recipes.find(tx, shopId, recipeId);
    if (recipe === undefined) throw new RecipeNotFoundError();
    await this.recipes.lockMates(tx, shopId, recipe);
    const ladder = await this.scheduled.lockSettled(tx, shopId, recipeId);
    const revision = ladder.find((rung) => rung.id === id);
    if (revision === undefined) throw new RevisionNotFoundError();
    const { materialGroupId } = revision.content.scope;
    if (materialGroupId !== undefined) await this.groups.lockAsCovered(tx, shopId, materialGroupId);
    return { revision, ladder };
  }

  /** Other recipes with the same five keys that have an approved or scheduled revision. */
  async approvedMates(tx: Tx, shopId: string, { recipe }: RevisionRecord) {
    return this.recipes.approvedMates(tx, shopId, keyIdsOf(recipe), recipe.id);
  }

  async markSubmitted(tx: Tx, shopId: string, id: string, submitted: Parameters<RecipeRevisionsRepository['submit']>[2]): Promise<void> {
    await this.revisions.submit(tx, { shopId, id }, submitted);
  }

  async markReturned(tx: Tx, shopId: string, id: string): Promise<void> {
    await this.revisions.giveBack(tx, { shopId, id });
  }

  /** Approves a revision of a locked ladder: current at once, superseding the one before, or scheduled for its day. */
  async markApproved(
    tx: Tx,
    shopId: string,
    { revision, ladder, reviewEveryDays }: { revision: LockedRevision; ladder: readonly LockedRevision[]; reviewEveryDays: number },
  ): Promise<{ state: 'approved' | 'scheduled'; superseded: LockedRevision | undefined }> {
    const key = { shopId, id: revision.id };
    if (revision.takesEffectLater && revision.effectiveFrom !== null) {
      await this.revisions.approve(tx, key, 'scheduled', reviewEveryDays);
      await this.scheduled.plan(tx, revision.id, revision.effectiveFrom);
      return { state: 'scheduled', superseded: undefined };
    }
    const superseded = ladder.find(({ state }) => state === 'approved');
    if (superseded !== undefined) await this.revisions.supersede(tx, { shopId, id: superseded.id });
    await this.revisions.approve(tx, key, 'approved', reviewEveryDays);
    await this.recipes.update(tx, { shopId, id: revision.recipeId }, { scope: revision.content.scope });
    return { state: 'approved', superseded };
  }

  async markWithdrawn(tx: Tx, shopId: string, id: string): Promise<void> {
    await this.revisions.withdraw(tx, { shopId, id });
  }

  /**
   * Keeps the revisions of a recipe from being superseded or withdrawn until the transaction ends, with the one current that may be
   * marked with now.
   */
  async lockForRun(tx: Tx, shopId: string, recipeId: string): Promise<void> {
    await this.scheduled.lockSettled(tx, shopId, recipeId);
  }

  /** A revision row. @throws RevisionNotFoundError also for another shop's revision */
  async getRow(tx: Tx, shopId: string, id: string): Promise<StoredRevision> {
    const revision = await this.revisions.find(tx, shopId, id);
    if (revision === undefined) throw new RevisionNotFoundError();
    return revision;
  }
}
