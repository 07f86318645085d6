import { Injectable } from '@nestjs/common';
import { isDraftable, type MarkStep, transferSetting } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { DraftGroundService } from './draft-ground.service';
import { DraftRecipeService } from './draft-recipe.service';
import { DraftStoreService } from './draft-store.service';
import type { RecipeRevisionDto } from './dto/recipe-revision.dto';
import type { CreateTransferDto, PreviewTransferDto, TransferGroundDto, TransferPreviewDto } from './dto/transfer.dto';
import type { NewDraft } from './recipe-revisions.repository';
import { keyIdsOf, RevisionRecordsService } from './revision-records.service';
import { transferReason, transferredContent } from './transfer-content';
import { asTransferPlace, TransferGroundService, targetOf } from './transfer-ground.service';
import { NotEquivalentError, TransferNotPossibleError } from './transfers.errors';
import { proposedSteps, toTransferGroundDto, toTransferPreviewDto } from './transfers.mapper';

/** Carrying a submitted revision to another machine or lens, as a proposal that needs a coupon. */
@Injectable()
export class TransfersService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly ground: TransferGroundService,
    private readonly draftGround: DraftGroundService,
    private readonly draftRecipes: DraftRecipeService,
    private readonly store: DraftStoreService,
    private readonly records: RevisionRecordsService,
  ) {}

  async targets(actor: Actor, revisionId: string): Promise<TransferGroundDto> {
    return this.unitOfWork.read(actor, async (tx) => toTransferGroundDto(await this.ground.read(tx, actor.shopId, revisionId)));
  }

  async preview(actor: Actor, revisionId: string, dto: PreviewTransferDto): Promise<TransferPreviewDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const { result, ground } = await this.workOut(tx, actor.shopId, revisionId, dto);
      return toTransferPreviewDto(result, ground.record.revision.content.steps);
    });
  }

  /** Works the transfer out anew from the records; nothing that the browser computed is taken over. */
  async create(actor: Actor, revisionId: string, dto: CreateTransferDto): Promise<RecipeRevisionDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const { result, ground, target } = await this.workOut(tx, actor.shopId, revisionId, dto);
      const { revision, recipe } = ground.record;
      const steps = proposedSteps(result, revision.content.steps).filter((step): step is MarkStep => step !== null);
      if (!isDraftable(result)) throw new TransferNotPossibleError(result);
      if (result.outcome !== 'equivalent' && !dto.acceptNotEquivalent) throw new NotEquivalentError(result);
      const keys = { ...keyIdsOf(recipe), machineId: target.machineId, lensId: target.lensId };
      const { mounting } = await this.draftGround.read(tx, actor.shopId, keys);
      const content = transferredContent(ground.record, steps, mounting);
      const recipeId =
        dto.recipeId === undefined
          ? await this.store.addRecipe(tx, actor, { ...keys, title: recipe.title, scope: content.scope })
          : await this.draftRecipes.recipeToDraftFor(tx, actor, dto.recipeId, keys);
      const draft: NewDraft = {
        ...{ recipeId, content },
        profileId: mounting.profileId,
        calibrationId: result.calibrationId,
        reason: transferReason(ground.record, result),
        basedOnId: revision.id,
        route: 'transferred',
      };
      const id = await this.store.addDraft(tx, actor, draft, []);
      return this.records.getDto(tx, actor, id);
    });
  }

  private async workOut(tx: Tx, shopId: string, revisionId: string, { machineId, lensId, choices = [] }: PreviewTransferDto) {
    const ground = await this.ground.read(tx, shopId, revisionId);
    const target = targetOf(ground, { machineId, lensId });
    const { steps } = ground.record.revision.content;
    const result = transferSetting({ steps, source: asTransferPlace(ground.source), target: asTransferPlace(target), choices });
    return { ground, target, result };
  }
}
