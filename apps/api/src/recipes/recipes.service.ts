import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { ForbiddenError, InvalidError, StaleError } from '../common/errors/domain-error';
import { decodeCursor, pageOf } from '../common/pagination/page';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { isRewritten, withEditor } from './draft-editors';
import { DraftEntryService } from './draft-entry.service';
import { DraftRepositories } from './draft-repositories';
import type { UpdateRecipeDto } from './dto/create-recipe.dto';
import type { ListRecipesQuery } from './dto/list-recipes.query.dto';
import type { RecipeDto, RecipePageDto } from './dto/recipe.dto';
import { scopeAsStored } from './entered-content';
import { mayEditDraft } from './recipe-revisions.policy';
import { RecipeViewsService } from './recipe-views.service';
import { NotYourDraftError, RecipeNotFoundError, ScopeSignedError } from './recipes.errors';
import { mayEditRecipe } from './recipes.policy';

/** Finding recipes and changing what is not signed of them. */
@Injectable()
export class RecipesService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly repositories: DraftRepositories,
    private readonly views: RecipeViewsService,
    private readonly entry: DraftEntryService,
    private readonly ledger: LedgerService,
  ) {}

  async list(actor: Actor, { limit, cursor, ...filter }: ListRecipesQuery): Promise<RecipePageDto> {
    const [rank, activeAt, id] = decodeCursor(cursor, ['number', 'moment', 'id']) ?? [];
    const after = rank === undefined ? {} : { after: { rank: Number(rank), activeAt: String(activeAt), id: String(id) } };
    return this.unitOfWork.read(actor, async (tx) => {
      const viewer = await this.views.viewerOf(tx, actor);
      const rows = await this.views.rows(tx, viewer, filter, { limit: limit + 1, ...after });
      const facets = await this.views.facets(tx, viewer, filter);
      const summaries = await this.views.summaries(tx, actor, rows.slice(0, limit));
      const page = pageOf(rows, limit, { item: (row) => row, cursor: (row) => [row.rank, row.active_text, row.id] });
      return { items: summaries, nextCursor: page.nextCursor, facets };
    });
  }

  async get(actor: Actor, id: string): Promise<RecipeDto> {
    return this.unitOfWork.read(actor, (tx) => this.views.getDto(tx, actor, id));
  }

  /** Changes the title; and the scope while nothing was submitted, since it is signed with the setting. */
  async update(actor: Actor, id: string, version: number, dto: UpdateRecipeDto): Promise<RecipeDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.repositories.recipes.lock(tx, actor.shopId, id);
      if (before === undefined) throw new RecipeNotFoundError();
      if (!mayEditRecipe(actor, before)) throw new ForbiddenError('Whoever began the recipe changes it, or a lead.');
      if (before.version !== version) throw new StaleError(await this.views.getDto(tx, actor, id));
      const scopes = dto.scope == null ? undefined : await this.changeScope(tx, actor, id, dto.scope);
      const change = { ...(dto.title == null ? {} : { title: dto.title }), ...(scopes === undefined ? {} : { scope: scopes.after }) };
      await this.repositories.recipes.update(tx, { shopId: actor.shopId, id }, change);
      const entry = { actor, action: 'recipe.changed', subjectType: 'recipe', subjectId: id, subjectCode: before.code };
      const earlier = { title: before.title, ...(scopes === undefined ? {} : { scope: scopes.before }) };
      await this.ledger.record(tx, { ...entry, before: earlier, after: change });
      return this.views.getDto(tx, actor, id);
    });
  }

  /** The drafts follow, so whoever changes it must be one who may change each of them. */
  private async changeScope(tx: Tx, actor: Actor, recipeId: string, typed: NonNullable<UpdateRecipeDto['scope']>) {
    const ladder = await this.repositories.revisions.lockLadder(tx, actor.shopId, recipeId);
    if (ladder.some(({ number }) => number !== null)) throw new ScopeSignedError();
    if (!ladder.every((draft) => mayEditDraft(actor, draft))) throw new NotYourDraftError('or a lead changes a draft');
    const problems = await this.entry.scopeProblems(tx, actor.shopId, typed);
    if (problems.length > 0) throw new InvalidError('The scope needs another look.', problems);
    const scope = scopeAsStored(typed);
    for (const draft of ladder) {
      const change = { content: { ...draft.content, scope } };
      const editorIds = isRewritten(draft, { ...draft, ...change }) ? withEditor(draft, actor.memberId) : draft.editorIds;
      await this.repositories.revisions.updateDraft(tx, { shopId: actor.shopId, id: draft.id }, { ...change, editorIds });
    }
    return { before: ladder[0]?.content.scope ?? {}, after: scope };
  }
}
