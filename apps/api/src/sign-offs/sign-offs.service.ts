import { Injectable } from '@nestjs/common';
import { nextRevisionState, type RevisionAction } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { StaleError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { blocksSubmit } from '../recipes/approval-check';
import type { RecipeRevisionDto } from '../recipes/dto/recipe-revision.dto';
import { RecipeRevisionsService } from '../recipes/recipe-revisions.service';
import { NotYourDraftError, RevisionStateError } from '../recipes/recipes.errors';
import { hashOfRecord } from '../recipes/revision-records.service';
import type { LockedRevision } from '../recipes/stored-revision';
import { ApprovalChecksService, keptChecks, readForIt } from './approval-checks.service';
import type { RecallRevisionDto, ReturnRevisionDto, SubmitRevisionDto } from './dto/sign-off-acts.dto';
import { SignOffLettersService } from './sign-off-letters.service';
import { ChecksFailError } from './sign-offs.errors';
import { SignaturesService } from './signatures.service';

/** Acts that need no password: submitting, recalling, sending back. */
@Injectable()
export class SignOffsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly revisions: RecipeRevisionsService,
    private readonly checks: ApprovalChecksService,
    private readonly signatures: SignaturesService,
    private readonly letters: SignOffLettersService,
  ) {}

  /** Gives the next number, freezes content and evidence, and asks the leads to look. */
  async submit(actor: Actor, id: string, version: number, dto: SubmitRevisionDto): Promise<RecipeRevisionDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const { revision, ladder } = await this.revisions.lockForSigning(tx, actor.shopId, id);
      await this.refuseJump(tx, actor, revision, 'submit');
      if (revision.createdBy !== actor.memberId) throw new NotYourDraftError('submits a draft');
      if (revision.version !== version) throw new StaleError(await this.revisions.getDto(tx, actor, id));
      const acknowledged = [...revision.acknowledgedCautionIds, ...dto.acknowledgedCautionIds];
      const weighed = await this.checks.weigh(tx, actor.shopId, id, acknowledged);
      const acknowledgedCautionIds = readForIt(weighed.record, acknowledged);
      const failing = weighed.items.filter(blocksSubmit);
      if (failing.length > 0) throw new ChecksFailError(failing);
      const contentHash = hashOfRecord(weighed.record);
      const number = Math.max(0, ...ladder.map((rung) => rung.number ?? 0)) + 1;
      await this.revisions.markSubmitted(tx, actor.shopId, id, { number, contentHash, acknowledgedCautionIds });
      const comment = dto.comment ?? '';
      await this.letters.submitted(tx, actor, { record: weighed.record, number }, comment);
      await this.signatures.sign(tx, actor, weighed.record, {
        ...{ meaning: 'submitted for review', method: 'session', action: 'revision.submitted' },
        ...{ comment, contentHash, acknowledgedCautionIds, checks: keptChecks(weighed.items, weighed) },
        after: { state: 'in_review', number },
      });
      return this.revisions.getDto(tx, actor, id);
    });
  }

  /** The author takes a revision back before anybody signed. */
  async recall(actor: Actor, id: string, { comment = '' }: RecallRevisionDto): Promise<RecipeRevisionDto> {
    return this.giveBack(actor, id, { act: 'recall', comment });
  }

  async returnToAuthor(actor: Actor, id: string, { comment }: ReturnRevisionDto): Promise<RecipeRevisionDto> {
    return this.giveBack(actor, id, { act: 'returnToAuthor', comment });
  }

  private async giveBack(
    actor: Actor,
    id: string,
    { act, comment }: { act: 'recall' | 'returnToAuthor'; comment: string },
  ): Promise<RecipeRevisionDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const { revision } = await this.revisions.lockForSigning(tx, actor.shopId, id);
      await this.refuseJump(tx, actor, revision, act);
      if (act === 'recall' && revision.createdBy !== actor.memberId) throw new NotYourDraftError('recalls a revision');
      const record = await this.revisions.getRecord(tx, actor.shopId, id);
      await this.revisions.markReturned(tx, actor.shopId, id);
      if (act === 'returnToAuthor') await this.letters.returned(tx, actor, { record, number: revision.number ?? 0 }, comment);
      const meaning = act === 'recall' ? 'recalled' : 'returned';
      const contentHash = revision.contentHash ?? hashOfRecord(record);
      const signature = { meaning, comment, contentHash, method: 'session', action: `revision.${meaning}` } as const;
      await this.signatures.sign(tx, actor, record, { ...signature, after: { state: 'returned', number: revision.number } });
      return this.revisions.getDto(tx, actor, id);
    });
  }

  private async refuseJump(tx: Tx, actor: Actor, { id, state }: LockedRevision, act: RevisionAction): Promise<void> {
    const moved = nextRevisionState(state, act);
    if (moved.kind === 'refused') throw new RevisionStateError(moved.message, await this.revisions.getDto(tx, actor, id));
  }
}
