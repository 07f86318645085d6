import { Injectable } from '@nestjs/common';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import type { Job } from '../jobs/job-tasks';
import { JobsService } from '../jobs/jobs.service';
import { LedgerService } from '../ledger/ledger.service';
import { RecipeRevisionsRepository } from './recipe-revisions.repository';
import { RecipesRepository } from './recipes.repository';
import type { LockedRevision } from './stored-revision';

/** The queue keeps a job for a day at most; one that comes too early is put off again. */
const LONGEST_DELAY_S = 24 * 60 * 60;
const MS_PER_S = 1000;
/** In the ledger, what nobody does by hand. */
export const SERVER_NAME = 'Proofplate';

/** Makes an approved revision current when its day has come. */
@Injectable()
export class ScheduledRevisionsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly revisions: RecipeRevisionsRepository,
    private readonly recipes: RecipesRepository,
    private readonly ledger: LedgerService,
    private readonly jobs: JobsService,
  ) {}

  /** Leaves the change to the worker, as part of the signing transaction. */
  async plan(tx: Tx, revisionId: string, effectiveFrom: Date): Promise<void> {
    const delayS = Math.min(LONGEST_DELAY_S, Math.max(0, Math.ceil((effectiveFrom.getTime() - Date.now()) / MS_PER_S)));
    await this.jobs.add(tx, 'revisions.take-effect', { revisionId }, { key: revisionId, delayS });
  }

  /** The worker's job. */
  async takeEffect({ shopId, revisionId }: Job<'revisions.take-effect'>): Promise<void> {
    await this.unitOfWork.run({ shopId }, async (tx) => {
      const revision = await this.revisions.find(tx, shopId, revisionId);
      if (revision === undefined) return;
      const after = await this.lockSettled(tx, shopId, revision.recipeId);
      const waiting = after.find(({ id }) => id === revisionId);
      if (waiting?.state === 'scheduled' && waiting.effectiveFrom !== null) await this.plan(tx, revisionId, waiting.effectiveFrom);
    });
  }

  /**
   * Locks a recipe and then all its revisions, as signing does; a scheduled revision whose day has come is made current and supersedes
   * the one before it.
   *
   * @returns the ladder as it stands then
   */
  async lockSettled(tx: Tx, shopId: string, recipeId: string): Promise<LockedRevision[]> {
    await this.recipes.lock(tx, shopId, recipeId);
    return this.takeDue(tx, shopId, await this.revisions.lockLadder(tx, shopId, recipeId));
  }

  private async takeDue(tx: Tx, shopId: string, ladder: LockedRevision[]): Promise<LockedRevision[]> {
    const due = ladder.find(({ state, takesEffectLater }) => state === 'scheduled' && !takesEffectLater);
    if (due === undefined) return ladder;
    const current = ladder.find(({ state }) => state === 'approved');
    const recipe = await this.recipes.find(tx, shopId, due.recipeId);
    const subject = { actor: { shopId, printedName: SERVER_NAME }, subjectType: 'revision', ...codeOf(recipe?.code) };
    if (current !== undefined) {
      await this.revisions.supersede(tx, { shopId, id: current.id });
      await this.ledger.record(tx, { ...subject, action: 'revision.superseded', subjectId: current.id, after: { number: current.number } });
    }
    await this.revisions.takeEffect(tx, { shopId, id: due.id });
    await this.recipes.update(tx, { shopId, id: due.recipeId }, { scope: due.content.scope });
    await this.ledger.record(tx, { ...subject, action: 'revision.took-effect', subjectId: due.id, after: { number: due.number } });
    return this.revisions.lockLadder(tx, shopId, due.recipeId);
  }
}

const codeOf = (code: string | undefined) => (code === undefined ? {} : { subjectCode: code });
