import { Injectable } from '@nestjs/common';
import type { RunKind } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { NotFoundError } from '../common/errors/domain-error';
import type { Tx } from '../database/unit-of-work';
import { RecipeRevisionsService } from '../recipes/recipe-revisions.service';
import { type CitedRevision, CitedRevisionsRepository } from './cited-revisions.repository';

/** Revisions as runs cite them. */
@Injectable()
export class CitedRevisionsService {
  constructor(
    private readonly cited: CitedRevisionsRepository,
    private readonly revisions: RecipeRevisionsService,
  ) {}

  /** @throws NotFoundError for another shop's revision, and for a trainee one that is not approved */
  async get(tx: Tx, actor: Actor, revisionId: string): Promise<CitedRevision> {
    const revision = await this.cited.find(tx, actor.shopId, revisionId);
    const isHidden =
      actor.role === 'trainee' && (revision?.state === 'draft' || revision?.state === 'in_review' || revision?.state === 'returned');
    if (revision === undefined || isHidden)
      throw new NotFoundError('This revision is not in the shop. Choose the setting at the machine again.');
    return revision;
  }

  /**
   * The revision as it stands under lock, so that no hold, withdrawal or newer revision slips in before the run is stored.
   *
   * @throws NotFoundError as get() does
   */
  async lock(tx: Tx, actor: Actor, { revisionId, kind }: { revisionId: string; kind: RunKind }): Promise<CitedRevision> {
    const { recipe } = await this.get(tx, actor, revisionId);
    if (kind !== 'confirmation') await this.revisions.lockForRun(tx, actor.shopId, recipe.id);
    const revision = await this.cited.lock(tx, actor.shopId, revisionId);
    if (revision === undefined) throw new NotFoundError();
    return revision;
  }

  /** Lenses of the shop by name, to say which one is fitted. */
  async lenses(tx: Tx, shopId: string): Promise<{ id: string; name: string }[]> {
    return this.cited.lenses(tx, shopId);
  }
}
