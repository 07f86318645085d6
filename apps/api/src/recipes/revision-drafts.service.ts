import { Injectable } from '@nestjs/common';
import { isEditable, type RevisionContent } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { type FieldProblem, InvalidError, StaleError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { isRewritten, withEditor } from './draft-editors';
import { DraftEntryService } from './draft-entry.service';
import { DraftRepositories } from './draft-repositories';
import type { SetEvidenceDto } from './dto/evidence.dto';
import type { RecipeRevisionDto } from './dto/recipe-revision.dto';
import type { UpdateRevisionDto } from './dto/update-revision.dto';
import { mayEditDraft } from './recipe-revisions.policy';
import { DraftCitedError, NotYourDraftError, RevisionNotFoundError, RevisionStateError } from './recipes.errors';
import { RevisionRecordsService } from './revision-records.service';
import type { EvidenceCell, EvidenceKind, StoredRevision } from './stored-revision';

/** Editing drafts: nothing else can be edited. */
@Injectable()
export class RevisionDraftsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly repositories: DraftRepositories,
    private readonly records: RevisionRecordsService,
    private readonly entry: DraftEntryService,
    private readonly ledger: LedgerService,
  ) {}

  async update(actor: Actor, id: string, version: number, dto: UpdateRevisionDto): Promise<RecipeRevisionDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.lockDraft(tx, actor, id, { version });
      const change = await this.entry.read(tx, actor, before, dto);
      const editorIds = isRewritten(before, { ...before, ...change }) ? withEditor(before, actor.memberId) : before.editorIds;
      await this.repositories.revisions.updateDraft(tx, { shopId: actor.shopId, id }, { ...change, editorIds });
      if (change.content !== undefined) await this.mirrorScope(tx, actor.shopId, before, change.content);
      await this.record(tx, actor, before, { action: 'revision.changed', before: told(before), after: told({ ...before, ...change }) });
      return this.records.getDto(tx, actor, id);
    });
  }

  /** Throws a draft away; one that a coupon or a run was made for stays. */
  async remove(actor: Actor, id: string, version: number): Promise<void> {
    await this.unitOfWork.run(actor, async (tx) => {
      const before = await this.lockDraft(tx, actor, id, { version });
      if (await this.repositories.recipes.isCited(tx, actor.shopId, id)) throw new DraftCitedError();
      await this.repositories.evidence.unlinkAll(tx, actor.shopId, id);
      await this.repositories.revisions.deleteDraft(tx, { shopId: actor.shopId, id });
      await this.record(tx, actor, before, { action: 'revision.discarded', before: told(before) });
    });
  }

  async setEvidence(actor: Actor, id: string, version: number, dto: SetEvidenceDto): Promise<RecipeRevisionDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.lockDraft(tx, actor, id, { version });
      const { basisCellIds, confirmationCellIds } = dto;
      const cells = await this.repositories.evidence.cells(tx, actor.shopId, [...basisCellIds, ...confirmationCellIds]);
      refuseUnusable(dto, cells);
      await this.repositories.evidence.unlinkAll(tx, actor.shopId, id);
      const linksOf = (ids: readonly string[], kind: EvidenceKind) =>
        cells
          .filter(({ cellId }) => ids.includes(cellId))
          .map(({ cellId, coupon }) => ({ revisionId: id, couponId: coupon.id, cellId, kind }));
      const links = [...linksOf(basisCellIds, 'basis'), ...linksOf(confirmationCellIds, 'confirmation')];
      await this.repositories.evidence.link(tx, actor.shopId, actor.memberId, links);
      await this.repositories.revisions.updateDraft(tx, { shopId: actor.shopId, id }, { editorIds: withEditor(before, actor.memberId) });
      await this.record(tx, actor, before, { action: 'revision.evidence-set', after: { basisCellIds, confirmationCellIds } });
      return this.records.getDto(tx, actor, id);
    });
  }

  private async lockDraft(tx: Tx, actor: Actor, id: string, { version }: { version: number }): Promise<StoredRevision> {
    const found = await this.repositories.revisions.find(tx, actor.shopId, id);
    // recipe before revision, in the order of signing: an edit and a submission at the same moment must not wait for each other
    if (found !== undefined) await this.repositories.recipes.lock(tx, actor.shopId, found.recipeId);
    const draft = await this.repositories.revisions.lock(tx, actor.shopId, id);
    if (draft === undefined) throw new RevisionNotFoundError();
    if (!isEditable(draft.state)) {
      const current = await this.records.getDto(tx, actor, id);
      throw new RevisionStateError('A submitted revision never changes. Propose a change: a new draft copies it.', current);
    }
    if (!mayEditDraft(actor, draft)) throw new NotYourDraftError('or a lead changes a draft');
    if (draft.version !== version) throw new StaleError(await this.records.getDto(tx, actor, id));
    return draft;
  }

  /** Until anything was submitted the finder's columns follow the draft; afterwards they follow what was approved. */
  private async mirrorScope(tx: Tx, shopId: string, { recipeId }: StoredRevision, { scope }: RevisionContent): Promise<void> {
    const ladder = await this.repositories.revisions.ladders(tx, shopId, [recipeId]);
    if (ladder.every(({ number }) => number === null)) await this.repositories.recipes.update(tx, { shopId, id: recipeId }, { scope });
  }

  private async record(
    tx: Tx,
    actor: Actor,
    { id, recipeId }: StoredRevision,
    event: { action: string; before?: unknown; after?: unknown },
  ): Promise<void> {
    const recipe = await this.repositories.recipes.find(tx, actor.shopId, recipeId);
    const code = recipe === undefined ? {} : { subjectCode: recipe.code };
    await this.ledger.record(tx, { actor, subjectType: 'revision', subjectId: id, ...code, ...event });
  }
}

function refuseUnusable(dto: SetEvidenceDto, cells: readonly EvidenceCell[]): void {
  const problems = (['basisCellIds', 'confirmationCellIds'] as const).flatMap((list) =>
    dto[list].flatMap((id, index): FieldProblem[] => {
      const pointer = `#/${list}/${index}`;
      const cell = cells.find(({ cellId }) => cellId === id);
      if (cell === undefined) return [{ pointer, detail: 'This cell is not in the shop. Choose it again.' }];
      if (!cell.isMarked) return [{ pointer, detail: `${cell.coupon.code} ${cell.address} was not marked. Choose another cell.` }];
      if (list === 'basisCellIds' && cell.coupon.isProof) return [{ pointer, detail: proofAsBasis(cell) }];
      const isTwice = list === 'confirmationCellIds' && dto.basisCellIds.includes(id);
      return isTwice ? [{ pointer, detail: `${cell.coupon.code} ${cell.address} is the basis; a proof is a later mark.` }] : [];
    }),
  );
  if (problems.length > 0) throw new InvalidError('Some cells cannot be cited.', problems);
}

const proofAsBasis = ({ coupon, address }: EvidenceCell) =>
  `${coupon.code} ${address} was marked to prove a setting that was there already. Choose a cell of a coupon on which settings were tried out.`;

/** What the ledger keeps of a draft. */
function told({ content, calibrationId, reason, route, grounds, effectiveFrom, reviewDue, acknowledgedCautionIds }: StoredRevision) {
  return { content, calibrationId, reason, route, grounds, effectiveFrom, reviewDue, acknowledgedCautionIds };
}
