import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { Codes } from '../database/codes.repository';
import type { Tx } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { DraftRepositories } from './draft-repositories';
import type { NewDraft } from './recipe-revisions.repository';
import type { NewRecipe } from './recipes.repository';
import type { EvidenceKind } from './stored-revision';

export type DraftLink = { readonly couponId: string; readonly cellId: string; readonly kind: EvidenceKind };

/** Stores new recipes and drafts with their lines in the ledger. */
@Injectable()
export class DraftStoreService {
  constructor(
    private readonly repositories: DraftRepositories,
    private readonly codes: Codes,
    private readonly ledger: LedgerService,
  ) {}

  async addRecipe(tx: Tx, actor: Actor, values: Omit<NewRecipe, 'code'>): Promise<string> {
    const code = await this.codes.nextCode(tx, actor.shopId, 'recipe');
    const id = await this.repositories.recipes.insert(tx, actor.shopId, actor.memberId, { ...values, code });
    await this.ledger.record(tx, {
      actor,
      action: 'recipe.created',
      subjectType: 'recipe',
      subjectId: id,
      subjectCode: code,
      after: values,
    });
    return id;
  }

  async addDraft(tx: Tx, actor: Actor, draft: NewDraft, links: readonly DraftLink[]): Promise<string> {
    const id = await this.repositories.revisions.insertDraft(tx, actor.shopId, actor.memberId, draft);
    await this.repositories.evidence.link(
      tx,
      actor.shopId,
      actor.memberId,
      links.map((link) => ({ ...link, revisionId: id })),
    );
    const recipe = await this.repositories.recipes.find(tx, actor.shopId, draft.recipeId);
    const entry = { actor, action: 'revision.drafted', subjectType: 'revision', subjectId: id };
    await this.ledger.record(tx, {
      ...entry,
      ...(recipe === undefined ? {} : { subjectCode: recipe.code }),
      after: { ...draft, cellIds: links.map(({ cellId }) => cellId) },
    });
    return id;
  }

  /** The cells that a revision cites, for a draft that copies it. */
  async linksOf(tx: Tx, shopId: string, revisionId: string): Promise<DraftLink[]> {
    const cells = await this.repositories.evidence.linked(tx, shopId, [revisionId]);
    return cells.map(({ coupon, cellId, kind }) => ({ couponId: coupon.id, cellId, kind }));
  }
}
