import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { ConflictError, type FieldProblem, InvalidError, NotFoundError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { asMeasured } from './calibration-checks';
import { DraftEntryService } from './draft-entry.service';
import { DraftGroundService } from './draft-ground.service';
import { DraftRecipeService } from './draft-recipe.service';
import { DraftRepositories } from './draft-repositories';
import { DraftStoreService } from './draft-store.service';
import type { CreateDraftDto, CreateRecipeDto, RecipeFromCellDto } from './dto/create-recipe.dto';
import type { RecipeRevisionDto } from './dto/recipe-revision.dto';
import { enterSteps, scopeAsStored, withPower } from './entered-content';
import { firstContent, purposeOf } from './first-content';
import type { NewDraft } from './recipe-revisions.repository';
import { CouponNotMarkedError, RecipeNotFoundError, RevisionNotFoundError } from './recipes.errors';
import type { KeyNames } from './recipes.repository';
import { RevisionRecordsService } from './revision-records.service';
import type { EvidenceCell, RevisionBrief } from './stored-revision';

/** Beginning drafts: from a cell, from elsewhere, from an earlier revision. */
@Injectable()
export class RecipeDraftingService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly repositories: DraftRepositories,
    private readonly draftRecipes: DraftRecipeService,
    private readonly ground: DraftGroundService,
    private readonly records: RevisionRecordsService,
    private readonly entry: DraftEntryService,
    private readonly store: DraftStoreService,
  ) {}

  /** A draft with exactly what a cell was marked with, resting on that cell. */
  async fromCell(actor: Actor, dto: RecipeFromCellDto): Promise<RecipeRevisionDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const cell = await this.cellToDraftFrom(tx, actor.shopId, dto);
      const { keys } = cell.coupon;
      const { names, mounting, effectKey } = await this.ground.read(tx, actor.shopId, keys);
      const content = firstContent([{ purpose: purposeOf(effectKey), parameters: cell.parameters, pauseAfterS: 0 }], mounting);
      const isSameMachine = mounting.physicalNumber === cell.coupon.physicalNumber;
      const recipeId =
        dto.recipeId === undefined
          ? await this.store.addRecipe(tx, actor, { ...keys, title: titleOf(dto.title, names), scope: content.scope })
          : await this.draftRecipes.recipeToDraftFor(tx, actor, dto.recipeId, keys);
      const draft: NewDraft = {
        recipeId,
        content,
        // a panel that was only relabelled since is the one that people look at
        profileId: isSameMachine ? mounting.profileId : cell.coupon.profileId,
        calibrationId: cell.coupon.calibrationId,
        reason: `From ${cell.address} of ${cell.coupon.code}.`,
        basedOnId: null,
        route: 'coupons',
      };
      const id = await this.store.addDraft(tx, actor, draft, [{ couponId: cell.coupon.id, cellId: cell.cellId, kind: 'basis' }]);
      return this.records.getDto(tx, actor, id);
    });
  }

  /** A recipe whose first setting does not come from a coupon. */
  async create(actor: Actor, dto: CreateRecipeDto): Promise<RecipeRevisionDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const { materialId, finishId, effectId, machineId, lensId, route, reason } = dto;
      const keys = { materialId, finishId, effectId, machineId, lensId };
      const { names, mounting, calibration } = await this.ground.read(tx, actor.shopId, keys);
      const measured = calibration === undefined ? {} : { calibration: asMeasured(calibration) };
      const { result: steps, problems } = enterSteps({ panel: mounting.panel, physical: mounting.physical, ...measured }, dto.steps);
      refuse([...problems, ...(dto.scope == null ? [] : await this.entry.scopeProblems(tx, actor.shopId, dto.scope))]);
      const content = firstContent(steps, mounting, dto.scope == null ? {} : scopeAsStored(dto.scope));
      const recipeId = await this.store.addRecipe(tx, actor, { ...keys, title: titleOf(dto.title, names), scope: content.scope });
      const { profileId } = mounting;
      const calibrationId = calibration?.id ?? null;
      const id = await this.store.addDraft(tx, actor, { recipeId, content, profileId, calibrationId, reason, basedOnId: null, route }, []);
      return this.records.getDto(tx, actor, id);
    });
  }

  /** A draft that copies an earlier revision; what was signed stays as it is. */
  async createDraft(actor: Actor, recipeId: string, dto: CreateDraftDto): Promise<RecipeRevisionDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const recipe = await this.repositories.recipes.lock(tx, actor.shopId, recipeId);
      if (recipe === undefined) throw new RecipeNotFoundError();
      await this.draftRecipes.refuseSecondDraft(tx, actor, recipeId);
      const source = sourceOf(await this.repositories.revisions.ladders(tx, actor.shopId, [recipeId]), dto.basedOnRevisionId);
      const { mounting, calibration } = await this.ground.read(tx, actor.shopId, recipe);
      const { profile } = await this.records.get(tx, actor.shopId, source.id);
      const isSameMachine = profile.physicalNumber === mounting.physicalNumber;
      const measured = calibration === undefined ? {} : { calibration: asMeasured(calibration) };
      const steps = withPower({ panel: mounting.panel, physical: mounting.physical, ...measured }, source.content.steps);
      const draft: NewDraft = {
        recipeId,
        content: { ...source.content, steps },
        profileId: mounting.profileId,
        calibrationId: calibration?.id ?? source.calibrationId,
        reason: dto.reason ?? '',
        basedOnId: source.id,
        // a lead's grounds were written for the setting as it was, so they are written anew
        route: source.route,
      };
      const links = isSameMachine ? await this.store.linksOf(tx, actor.shopId, source.id) : [];
      const id = await this.store.addDraft(tx, actor, draft, links);
      return this.records.getDto(tx, actor, id);
    });
  }

  private async cellToDraftFrom(tx: Tx, shopId: string, { couponId, cellId }: RecipeFromCellDto): Promise<EvidenceCell> {
    const [cell] = await this.repositories.evidence.cells(tx, shopId, [cellId]);
    if (cell === undefined || cell.coupon.id !== couponId)
      throw new NotFoundError('This cell is not on a coupon of the shop. Go back to Coupons.');
    const { code, state, isProof } = cell.coupon;
    if (isProof) throw new ConflictError(`${code} proves a setting that is there already. Propose a change of its recipe instead.`);
    if (state === 'planned') throw new CouponNotMarkedError(`${code} is not marked yet. Mark it first.`);
    if (!cell.isMarked) throw new CouponNotMarkedError(`${cell.address} of ${code} was skipped. Choose a cell that was marked.`);
    return cell;
  }
}

function titleOf(given: string | undefined, { materialId, finishId, effectId }: KeyNames): string {
  return given === undefined || given === '' ? `${materialId}, ${finishId}: ${effectId}` : given;
}

/** The named revision; without one the approved, else the newest that is no draft, else the newest. */
function sourceOf(ladder: readonly RevisionBrief[], id: string | undefined): RevisionBrief {
  const numbered = ladder.filter(({ number }) => number !== null);
  const source =
    id === undefined
      ? (numbered.find(({ state }) => state === 'approved') ?? numbered[0] ?? ladder[0])
      : ladder.find((rung) => rung.id === id);
  if (source === undefined) throw new RevisionNotFoundError();
  return source;
}

function refuse(problems: readonly FieldProblem[]): void {
  if (problems.length === 0) return;
  throw new InvalidError(
    problems.length === 1 ? 'One field needs another look.' : `${problems.length} fields need another look.`,
    problems,
  );
}
