import { Injectable } from '@nestjs/common';
import { nextRevisionState, type RevisionAction } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import type { Tx } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { type ApprovalCheck, blocksApproval } from '../recipes/approval-check';
import type { RecipeRevisionDto } from '../recipes/dto/recipe-revision.dto';
import { RecipeRevisionsService } from '../recipes/recipe-revisions.service';
import { RevisionStateError, StaleRevisionError } from '../recipes/recipes.errors';
import { hashOfRecord } from '../recipes/revision-records.service';
import type { LockedRevision } from '../recipes/stored-revision';
import { ApprovalChecksService, keptChecks, readForIt, toSign, type Weighed } from './approval-checks.service';
import type { ApproveRevisionDto, WithdrawRevisionDto } from './dto/sign-off-acts.dto';
import { SignOffLettersService } from './sign-off-letters.service';
import { ChecksFailError, NotForThisProcessError, SelfApprovalError } from './sign-offs.errors';
import { maySignOwn, signerCautionsCheck, signsForProcess } from './sign-offs.policy';
import { SignaturesService } from './signatures.service';

/** What an approval and a withdrawal do inside their transaction, once the password was right. */
@Injectable()
export class SigningActsService {
  constructor(
    private readonly revisions: RecipeRevisionsService,
    private readonly checks: ApprovalChecksService,
    private readonly signatures: SignaturesService,
    private readonly letters: SignOffLettersService,
    private readonly ledger: LedgerService,
  ) {}

  async approve(tx: Tx, actor: Actor, id: string, dto: ApproveRevisionDto): Promise<RecipeRevisionDto> {
    const { revision, ladder } = await this.revisions.lockForSigning(tx, actor.shopId, id);
    await this.refuseJump(tx, actor, revision, revision.takesEffectLater ? 'approveLater' : 'approve');
    await this.refuseSecondScheduled(tx, actor, revision, ladder);
    const weighed = await this.checks.weigh(tx, actor.shopId, id);
    await this.refuseSigner(tx, actor, weighed);
    await this.refuseStale(tx, actor, weighed, dto.contentHash);
    const items = this.refuseFailing(weighed, dto.acknowledgedCautionIds);
    const { reviewEveryDays } = weighed.facts.policy;
    const { state, superseded } = await this.revisions.markApproved(tx, actor.shopId, { revision, ladder, reviewEveryDays });
    const { record } = weighed;
    const comment = dto.comment ?? '';
    await this.letters.approved(tx, actor, { record, number: revision.number ?? 0 }, comment);
    if (superseded !== undefined) await this.recordSuperseded(tx, actor, superseded, record.recipe.code);
    await this.signatures.sign(tx, actor, record, {
      ...{ meaning: 'approved', method: 'password', action: state === 'approved' ? 'revision.approved' : 'revision.scheduled' },
      ...{ comment, contentHash: dto.contentHash, acknowledgedCautionIds: readForIt(record, dto.acknowledgedCautionIds) },
      checks: keptChecks(items, weighed),
      after: { state, number: revision.number },
    });
    return this.revisions.getDto(tx, actor, id);
  }

  async withdraw(tx: Tx, actor: Actor, id: string, { reason }: WithdrawRevisionDto): Promise<RecipeRevisionDto> {
    const { revision, ladder } = await this.revisions.lockForSigning(tx, actor.shopId, id);
    await this.refuseJump(tx, actor, revision, 'withdraw');
    const staying = ladder.find((rung) => rung.state === 'approved' && rung.id !== id);
    const record = await this.revisions.getRecord(tx, actor.shopId, id);
    await this.revisions.markWithdrawn(tx, actor.shopId, id);
    await this.letters.withdrawn(tx, actor, { record, number: revision.number ?? 0 }, { reason, stayingNumber: staying?.number ?? null });
    await this.signatures.sign(tx, actor, record, {
      ...{ meaning: 'withdrawn', method: 'password', action: 'revision.withdrawn', comment: reason },
      contentHash: revision.contentHash ?? hashOfRecord(record),
      after: { state: 'withdrawn', number: revision.number },
    });
    return this.revisions.getDto(tx, actor, id);
  }

  private async refuseJump(tx: Tx, actor: Actor, { id, state }: LockedRevision, act: RevisionAction): Promise<void> {
    const moved = nextRevisionState(state, act);
    if (moved.kind === 'refused') throw new RevisionStateError(moved.message, await this.revisions.getDto(tx, actor, id));
  }

  private async refuseSecondScheduled(tx: Tx, actor: Actor, revision: LockedRevision, ladder: readonly LockedRevision[]): Promise<void> {
    const waiting = ladder.find(({ state }) => state === 'scheduled');
    if (!revision.takesEffectLater || waiting === undefined) return;
    const detail = `Revision ${waiting.number ?? ''} is approved already and takes effect later. Send this one back, or wait for that day.`;
    throw new RevisionStateError(detail, await this.revisions.getDto(tx, actor, revision.id));
  }

  private async refuseSigner(tx: Tx, actor: Actor, { record, facts }: Weighed): Promise<void> {
    const revision = toSign(record);
    if (!maySignOwn(actor, revision, facts.policy.authorMaySign)) throw new SelfApprovalError();
    const signer = await this.checks.signerOf(tx, actor);
    if (!signsForProcess(signer, revision))
      throw new NotForThisProcessError(`${record.recipe.effect.name} on ${record.recipe.machine.name}`);
  }

  /** The signature counts for what was shown, and what was shown must still be the record. */
  private async refuseStale(tx: Tx, actor: Actor, { record }: Weighed, shownHash: string): Promise<void> {
    const hash = hashOfRecord(record);
    if (shownHash === hash && record.revision.contentHash === hash) return;
    throw new StaleRevisionError(await this.revisions.getDto(tx, actor, record.revision.id));
  }

  private refuseFailing(weighed: Weighed, acknowledgedCautionIds: readonly string[]): ApprovalCheck[] {
    const items = [...weighed.items, signerCautionsCheck(weighed.record.cautions, acknowledgedCautionIds)];
    const failing = items.filter(blocksApproval);
    if (failing.length > 0) throw new ChecksFailError(failing);
    return items;
  }

  private async recordSuperseded(tx: Tx, actor: Actor, { id, number }: LockedRevision, subjectCode: string): Promise<void> {
    const subject = { subjectType: 'revision', subjectId: id, subjectCode };
    const states = { before: { state: 'approved' }, after: { state: 'superseded', number } };
    await this.ledger.record(tx, { actor, action: 'revision.superseded', ...subject, ...states });
  }
}
