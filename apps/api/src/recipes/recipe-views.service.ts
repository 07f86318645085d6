import { Injectable } from '@nestjs/common';
import { type RecipeScope, roleAtLeast } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import type { Tx } from '../database/unit-of-work';
import { PhotosService } from '../photos/photos.service';
import { ShopsService } from '../shops/shops.service';
import { DraftRepositories } from './draft-repositories';
import type { RecipeDto, RecipeFacetsDto, RecipeSummaryDto } from './dto/recipe.dto';
import { PowerShiftsService } from './power-shifts.service';
import { type ListCursor, type ListFilter, type RecipeFaceRow, RecipeListRepository, type Viewer } from './recipe-list.repository';
import { toRevisionBriefDto } from './recipe-revisions.mapper';
import { RecipeNotFoundError } from './recipes.errors';
import { toFacetsDto, toHoldDto, toRecipeSummaryDto } from './recipes.mapper';
import { RevisionRecordsService } from './revision-records.service';
import type { RevisionBrief } from './stored-revision';

/** Reads recipes as their list and their page show them. */
@Injectable()
export class RecipeViewsService {
  constructor(
    private readonly listing: RecipeListRepository,
    private readonly repositories: DraftRepositories,
    private readonly records: RevisionRecordsService,
    private readonly shops: ShopsService,
    private readonly photos: PhotosService,
    private readonly powerShifts: PowerShiftsService,
  ) {}

  async viewerOf(tx: Tx, { shopId, memberId, role }: Actor): Promise<Viewer> {
    const { policy } = await this.shops.getRow(tx, shopId);
    return { shopId, memberId, maySign: roleAtLeast(role, 'lead'), maySignOwn: policy.authorMaySign };
  }

  async rows(tx: Tx, viewer: Viewer, filter: ListFilter, page: { limit: number; after?: ListCursor }): Promise<RecipeFaceRow[]> {
    return this.listing.page(tx, viewer, filter, page);
  }

  async facets(tx: Tx, viewer: Viewer, filter: ListFilter): Promise<RecipeFacetsDto> {
    return toFacetsDto(await this.listing.facets(tx, viewer, filter));
  }

  async summaries(tx: Tx, actor: Actor, rows: readonly RecipeFaceRow[]): Promise<RecipeSummaryDto[]> {
    const recipeIds = rows.map(({ id }) => id);
    const shown = rows.flatMap(({ current_id, under_way_id }) => [current_id, under_way_id].filter((id) => id !== null));
    const ladders = await this.repositories.revisions.ladders(tx, actor.shopId, recipeIds);
    const signOffs = await this.repositories.revisions.signOffs(tx, actor.shopId, shown);
    const plates = await this.listing.plates(tx, actor.shopId, shown);
    const runs = await this.listing.recentRuns(tx, actor.shopId, recipeIds);
    const approved = rows.flatMap(({ current_id }) => (current_id === null ? [] : [current_id]));
    const checkDue = await this.powerShifts.checkDue(tx, actor.shopId, approved);
    return rows.map((row) =>
      toRecipeSummaryDto(row, { actor, ladders, signOffs, plates, runs, checkDue, photoUrls: (photo) => this.photos.urlsOf(photo) }),
    );
  }

  /** @throws RecipeNotFoundError also for another shop's recipe */
  async getDto(tx: Tx, actor: Actor, id: string): Promise<RecipeDto> {
    const viewer = await this.viewerOf(tx, actor);
    const [row] = await this.listing.page(tx, viewer, { recipeId: id }, { limit: 1 });
    const [summary] = row === undefined ? [] : await this.summaries(tx, actor, [row]);
    const recipe = await this.repositories.recipes.find(tx, actor.shopId, id);
    if (row === undefined || summary === undefined || recipe === undefined) throw new RecipeNotFoundError();
    const ladder = await this.repositories.revisions.ladders(tx, actor.shopId, [id]);
    const signOffs = await this.repositories.revisions.signOffs(
      tx,
      actor.shopId,
      ladder.map((rung) => rung.id),
    );
    const holds = await this.repositories.recipes.openHolds(tx, actor.shopId, { recipeId: id, machineId: recipe.machineId });
    return {
      ...summary,
      scope: scopeNow(ladder, [row.current_id, row.under_way_id]),
      holds: holds.map(toHoldDto),
      currentRevision: row.current_id === null ? null : await this.records.getDto(tx, actor, row.current_id),
      revisions: ladder.map((rung) =>
        toRevisionBriefDto(
          rung,
          signOffs.filter(({ revisionId }) => revisionId === rung.id),
        ),
      ),
      createdAt: recipe.createdAt.toISOString(),
      version: recipe.version,
    };
  }
}

/** The scope that holds: the approved revision's, else that of the one under way. */
function scopeNow(ladder: readonly RevisionBrief[], ids: readonly (string | null)[]): RecipeScope {
  const telling = ids.flatMap((id) => ladder.filter((rung) => rung.id === id));
  return (telling[0] ?? ladder[0])?.content.scope ?? {};
}
