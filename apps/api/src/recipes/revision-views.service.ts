import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { UnitOfWork } from '../database/unit-of-work';
import { PhotosService } from '../photos/photos.service';
import { comparisonRows } from './comparison';
import { isLaterThanBasis } from './confirmation';
import type { CompareQuery, ComparisonDto } from './dto/comparison.dto';
import type { EvidenceCandidatesDto } from './dto/evidence.dto';
import type { RecipeRevisionDto } from './dto/recipe-revision.dto';
import { toEvidenceCellDto } from './evidence.mapper';
import { essentialDifferences } from './evidence-judgement';
import { RevisionNotFoundError } from './recipes.errors';
import { RevisionEvidenceRepository } from './revision-evidence.repository';
import { keyIdsOf, RevisionRecordsService } from './revision-records.service';

const MOST_SHOWN = 100;

/** What people look at: one revision, several side by side, cells that a draft could cite. */
@Injectable()
export class RevisionViewsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly records: RevisionRecordsService,
    private readonly evidence: RevisionEvidenceRepository,
    private readonly photos: PhotosService,
  ) {}

  async get(actor: Actor, id: string): Promise<RecipeRevisionDto> {
    return this.unitOfWork.read(actor, (tx) => this.records.getDto(tx, actor, id));
  }

  async compare(actor: Actor, { ids, referenceId }: CompareQuery): Promise<ComparisonDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const records = await this.records.list(tx, actor.shopId, ids);
      const revisions = await this.records.toDtos(tx, actor, records);
      const reference =
        records.find(({ revision }) => revision.id === referenceId) ??
        records.find(({ revision }) => revision.state === 'approved') ??
        records[0];
      if (reference === undefined) throw new RevisionNotFoundError();
      return { revisions, referenceId: reference.revision.id, rows: comparisonRows(records, reference) };
    });
  }

  /** Cells that a draft could cite: the best of the same work that was tried out, and later ones with exactly its essential parameters. */
  async candidates(actor: Actor, id: string): Promise<EvidenceCandidatesDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const { recipe, revision, basis } = await this.records.get(tx, actor.shopId, id);
      const { steps } = revision.content;
      const cells = await this.evidence.candidates(tx, actor.shopId, keyIdsOf(recipe));
      const triedOut = cells.filter(({ coupon }) => !coupon.isProof);
      const same = cells.filter(
        (cell) => isLaterThanBasis(cell, basis) && essentialDifferences(cell.parameters, steps, cell.coupon.unknownFields).length === 0,
      );
      const toDto = (cell: (typeof cells)[number]) => toEvidenceCellDto(cell, steps, (photo) => this.photos.urlsOf(photo));
      return { basis: triedOut.slice(0, MOST_SHOWN).map(toDto), confirmation: same.slice(0, MOST_SHOWN).map(toDto) };
    });
  }
}
