import { Injectable } from '@nestjs/common';
import type { Caution, CautionSubject } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { DoseCautionService } from '../coupons/dose-caution.service';
import type { Tx } from '../database/unit-of-work';
import { isGeneralCaution, orderedCautionsForAny } from '../materials/caution-order';
import { CautionsService, subjectsOf } from '../materials/cautions.service';
import { PhotosService } from '../photos/photos.service';
import { ShopsService } from '../shops/shops.service';
import type { RecipeRevisionDto, RevisionBriefDto, RevisionRecipeDto } from './dto/recipe-revision.dto';
import { toRevisionBriefDto, toRevisionDto } from './recipe-revisions.mapper';
import { revisionActions } from './recipe-revisions.policy';
import { RecipeRevisionsRepository } from './recipe-revisions.repository';
import { RevisionNotFoundError } from './recipes.errors';
import { RevisionEvidenceRepository } from './revision-evidence.repository';
import { hashOfRevision } from './revision-hash';
import type { EvidenceKind, EvidencePhoto, KeyIds, LinkedCell, RevisionCaution, RevisionHead, RevisionRecord } from './stored-revision';

/** A revision in review as the queue shows it. */
export type QueuedRevision = {
  readonly recipe: RevisionRecipeDto;
  readonly revision: RevisionBriefDto;
  readonly isOwn: boolean;
  readonly hasCurrent: boolean;
  readonly allowedActions: string[];
};

/** Reads revisions whole, any number of them in the same few queries. */
@Injectable()
export class RevisionRecordsService {
  constructor(
    private readonly revisions: RecipeRevisionsRepository,
    private readonly evidence: RevisionEvidenceRepository,
    private readonly cautions: CautionsService,
    private readonly photos: PhotosService,
    private readonly shops: ShopsService,
    private readonly doseCautions: DoseCautionService,
  ) {}

  /** @throws RevisionNotFoundError also for another shop's revision */
  async get(tx: Tx, shopId: string, id: string): Promise<RevisionRecord> {
    const [record] = await this.list(tx, shopId, [id]);
    if (record === undefined) throw new RevisionNotFoundError();
    return record;
  }

  /** In the order of the ids. @throws RevisionNotFoundError for an id that the shop does not have */
  async list(tx: Tx, shopId: string, ids: readonly string[]): Promise<RevisionRecord[]> {
    const heads = await this.revisions.heads(tx, shopId, ids);
    const recipeIds = [...new Set(heads.map(({ recipe }) => recipe.id))];
    const ladder = await this.revisions.ladders(tx, shopId, recipeIds);
    const signOffs = await this.revisions.signOffs(
      tx,
      shopId,
      ladder.map(({ id }) => id),
    );
    const linked = await this.evidence.linked(tx, shopId, ids);
    const runs = await this.evidence.runs(tx, shopId, ids);
    const cautions = await this.cautionsOf(tx, shopId, heads);
    return ids.map((id) => {
      const head = heads.find(({ revision }) => revision.id === id);
      const brief = ladder.find((rung) => rung.id === id);
      if (head === undefined || brief === undefined) throw new RevisionNotFoundError();
      const ofKind = (kind: EvidenceKind) => linked.filter((cell: LinkedCell) => cell.revisionId === id && cell.kind === kind);
      return {
        ...head,
        brief,
        ladder: ladder.filter(({ recipeId }) => recipeId === head.recipe.id),
        signOffs,
        basis: ofKind('basis'),
        confirmation: ofKind('confirmation'),
        runs: runs.filter(({ revisionId }) => revisionId === id),
        cautions: cautions.get(id) ?? [],
      };
    });
  }

  /** The policy of the shop is read once for all of them. */
  async toDtos(tx: Tx, actor: Actor, records: readonly RevisionRecord[]): Promise<RecipeRevisionDto[]> {
    const { policy } = await this.shops.getRow(tx, actor.shopId);
    const dtos: RecipeRevisionDto[] = [];
    for (const record of records) {
      const doseCaution = await this.doseCautions.find(tx, actor.shopId, keyIdsOf(record.recipe));
      const { authorMaySign } = policy;
      const photoUrls = (photo: EvidencePhoto) => this.photos.urlsOf(photo);
      dtos.push(toRevisionDto(record, { actor, authorMaySign, photoUrls, contentHash: hashOfRecord(record), doseCaution }));
    }
    return dtos;
  }

  async toQueued(tx: Tx, actor: Actor, records: readonly RevisionRecord[]): Promise<QueuedRevision[]> {
    const { policy } = await this.shops.getRow(tx, actor.shopId);
    return records.map(({ revision, recipe, brief, ladder, signOffs }) => ({
      recipe,
      revision: toRevisionBriefDto(
        brief,
        signOffs.filter(({ revisionId }) => revisionId === revision.id),
      ),
      isOwn: revision.createdBy === actor.memberId,
      hasCurrent: ladder.some(({ state }) => state === 'approved'),
      allowedActions: revisionActions(actor, revision, policy.authorMaySign),
    }));
  }

  async getDto(tx: Tx, actor: Actor, id: string): Promise<RecipeRevisionDto> {
    const [dto] = await this.toDtos(tx, actor, await this.list(tx, actor.shopId, [id]));
    if (dto === undefined) throw new RevisionNotFoundError();
    return dto;
  }

  /**
   * Those of its own material and of every material of the group that it covers. One query for all: the shop's cautions are few, and
   * each revision picks those that apply to it.
   */
  private async cautionsOf(tx: Tx, shopId: string, heads: readonly RevisionHead[]): Promise<Map<string, RevisionCaution[]>> {
    const all = await this.cautions.allCautions(tx, shopId);
    const groupIds = heads.flatMap((head) => groupIdOf(head) ?? []);
    const covered = await this.cautions.coveredMaterials(tx, shopId, groupIds);
    const applying = (head: RevisionHead) => {
      const ofGroup = covered.filter(({ groupId }) => groupId === groupIdOf(head));
      return orderedCautionsForAny(subjectsOf(subjectOf(head), ofGroup), all);
    };
    return new Map(heads.map((head) => [head.revision.id, applying(head).map(toRevisionCaution)]));
  }
}

function toRevisionCaution(caution: Caution): RevisionCaution {
  const { id, level, subject, text, source } = caution;
  return { id, level, subject, text, source, isGeneral: isGeneralCaution(caution) };
}

const groupIdOf = ({ revision }: RevisionHead) => revision.content.scope.materialGroupId;

function subjectOf({ revision, recipe }: RevisionHead): CautionSubject {
  const { scope, limits } = revision.content;
  return {
    family: recipe.material.family,
    materialId: recipe.material.id,
    finishId: recipe.finish.id,
    sourceKind: recipe.machine.sourceKind,
    effectKey: recipe.effect.key,
    roundPart: scope.partDiameterMm !== undefined || limits.partDiameterMm !== undefined,
  };
}

/** The hash of the record as it stands in the database. */
export function hashOfRecord({ revision, recipe, basis, confirmation }: RevisionRecord): string {
  return hashOfRevision(revision, keyIdsOf(recipe), {
    basisCellIds: basis.map(({ cellId }) => cellId),
    confirmationCellIds: confirmation.map(({ cellId }) => cellId),
  });
}

export const keyIdsOf = ({ material, finish, effect, machine, lens }: RevisionRecord['recipe']): KeyIds => ({
  materialId: material.id,
  finishId: finish.id,
  effectId: effect.id,
  machineId: machine.id,
  lensId: lens.id,
});
