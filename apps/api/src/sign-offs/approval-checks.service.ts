import { Injectable } from '@nestjs/common';
import { roleAtLeast } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { CalibrationsService } from '../machines/calibrations.service';
import { type ApprovalCheck, blocksApproval, blocksSubmit, inReadingOrder } from '../recipes/approval-check';
import type { ApprovalFacts } from '../recipes/approval-facts';
import { RecipeRevisionsService } from '../recipes/recipe-revisions.service';
import { type RevisionChecks, revisionChecks } from '../recipes/revision-checks';
import { hashOfRecord } from '../recipes/revision-records.service';
import type { RevisionRecord } from '../recipes/stored-revision';
import { ShopsService } from '../shops/shops.service';
import type { ApprovalChecksDto } from './dto/checks.dto';
import { type Signer, signerChecks } from './sign-offs.policy';
import { SignOffsRepository } from './sign-offs.repository';

export type Weighed = RevisionChecks & { readonly record: RevisionRecord; readonly facts: ApprovalFacts };

/** Weighs a revision by everything that its approval needs. */
@Injectable()
export class ApprovalChecksService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly revisions: RecipeRevisionsService,
    private readonly calibrations: CalibrationsService,
    private readonly shops: ShopsService,
    private readonly signOffs: SignOffsRepository,
  ) {}

  /** Every check for whoever looks: those of the revision and, for whoever could sign, those of the signer. */
  async get(actor: Actor, id: string): Promise<ApprovalChecksDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const weighed = await this.weigh(tx, actor.shopId, id);
      const { record, confirmation, facts } = weighed;
      const signer = await this.signerOf(tx, actor);
      const leads = roleAtLeast(actor.role, 'lead');
      const checks = [...weighed.items, ...(leads ? signerChecks(signer, toSign(record), facts.policy.authorMaySign) : [])];
      return {
        items: inReadingOrder(checks),
        confirmation: {
          markCount: confirmation.count,
          neededCount: facts.policy.minimumConfirmationMarks,
          notCountingCount: confirmation.marks.length - confirmation.counting.length,
          lots: [...confirmation.lots],
          dayCount: confirmation.dayCount,
          spreads: [...confirmation.spreads],
        },
        maySubmit: record.revision.state === 'draft' && !checks.some(blocksSubmit),
        mayApprove: leads && record.revision.state === 'in_review' && !checks.some(blocksApproval),
        contentHash: hashOfRecord(record),
      };
    });
  }

  /** The checks of the revision itself, inside the transaction of an act. */
  async weigh(tx: Tx, shopId: string, id: string, acknowledgedByAuthor?: readonly string[]): Promise<Weighed> {
    const record = await this.revisions.getRecord(tx, shopId, id);
    const { policy } = await this.shops.getRow(tx, shopId);
    const facts: ApprovalFacts = {
      record,
      policy,
      now: new Date(),
      current: await this.currentOf(tx, shopId, record),
      readings: await this.calibrations.readingsOf(tx, shopId, [record.recipe.machine.id]),
      mates: await this.revisions.approvedMates(tx, shopId, record),
      acknowledgedByAuthor: acknowledgedByAuthor ?? record.revision.acknowledgedCautionIds,
    };
    return { ...revisionChecks(facts), record, facts };
  }

  async signerOf(tx: Tx, { shopId, memberId }: Actor): Promise<Signer> {
    return { memberId, signsFor: await this.signOffs.signsFor(tx, shopId, memberId) };
  }

  private async currentOf(tx: Tx, shopId: string, { ladder, revision }: RevisionRecord): Promise<ApprovalFacts['current']> {
    const current = ladder.find(({ state, id }) => state === 'approved' && id !== revision.id);
    if (current === undefined) return null;
    const { basis, confirmation, runs } = await this.revisions.getRecord(tx, shopId, current.id);
    const moments = [...[...basis, ...confirmation].map(({ coupon }) => coupon.markedAt), ...runs.map(({ startedAt }) => startedAt)];
    const known = moments.filter((moment) => moment !== null).map((moment) => moment.getTime());
    return {
      number: current.number,
      steps: current.content.steps,
      newestEvidenceAt: known.length === 0 ? null : new Date(Math.max(...known)),
    };
  }
}

export const toSign = ({ revision, recipe }: RevisionRecord) => ({
  createdBy: revision.createdBy,
  editorIds: revision.editorIds,
  effectId: recipe.effect.id,
  sourceKind: recipe.machine.sourceKind,
});

/** Only cautions that stand beside the work can have been read for it; each counts once. */
export const readForIt = ({ cautions }: Pick<RevisionRecord, 'cautions'>, ids: readonly string[]): string[] =>
  cautions.map(({ id }) => id).filter((id) => ids.includes(id));

/** What a signature keeps of the checks, for whoever reads it years later. */
export function keptChecks(items: readonly ApprovalCheck[], { confirmation, facts }: Weighed) {
  const { count, lots, dayCount, spreads } = confirmation;
  return { items: inReadingOrder(items), confirmation: { count, lots, dayCount, spreads }, policy: facts.policy };
}
