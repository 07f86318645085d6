import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import type { Tx } from '../database/unit-of-work';
import { DraftRepositories } from './draft-repositories';
import { DraftOpenError, OtherKeysError, RecipeNotFoundError } from './recipes.errors';
import type { KeyIds } from './stored-revision';

const KEYS = ['materialId', 'finishId', 'effectId', 'machineId', 'lensId'] as const;

/** The recipe that a new draft goes into. */
@Injectable()
export class DraftRecipeService {
  constructor(private readonly repositories: DraftRepositories) {}

  /** @throws RecipeNotFoundError; OtherKeysError where it answers another question; DraftOpenError where the author has a draft of it */
  async recipeToDraftFor(tx: Tx, actor: Actor, recipeId: string, keys: KeyIds): Promise<string> {
    const recipe = await this.repositories.recipes.lock(tx, actor.shopId, recipeId);
    if (recipe === undefined) throw new RecipeNotFoundError();
    if (!KEYS.every((key) => recipe[key] === keys[key])) throw new OtherKeysError();
    await this.refuseSecondDraft(tx, actor, recipeId);
    return recipeId;
  }

  /** One open draft per recipe and author. @throws DraftOpenError carrying the one that is there */
  async refuseSecondDraft(tx: Tx, actor: Actor, recipeId: string): Promise<void> {
    const ladder = await this.repositories.revisions.ladders(tx, actor.shopId, [recipeId]);
    const open = ladder.find(({ state, createdBy }) => state === 'draft' && createdBy === actor.memberId);
    if (open !== undefined) throw new DraftOpenError(open.id);
  }
}
