import { PANEL_UNITS } from '@proofplate/physics';
import { type ChangeSide, type DoseCaution, showNumber, stepsDiff } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import type { PhotoUrlsDto } from '../photos/dto/photo.dto';
import type { RecipeRevisionDto, RevisionBriefDto, StepChangeDto } from './dto/recipe-revision.dto';
import type { SignOffDto } from './dto/sign-off.dto';
import { type MapPhoto, toEvidenceCellDto, toEvidenceRunDto } from './evidence.mapper';
import { revisionActions } from './recipe-revisions.policy';
import { revisionNumbers } from './step-numbers';
import type { RevisionBrief, RevisionRecord, StoredSignOff } from './stored-revision';

export type RevisionMapping = {
  readonly actor: Pick<Actor, 'role' | 'memberId'>;
  readonly authorMaySign: boolean;
  readonly photoUrls: (photo: Parameters<MapPhoto>[0]) => PhotoUrlsDto | null;
  readonly contentHash: string;
  readonly doseCaution: DoseCaution | null;
};

export function toRevisionDto(
  record: RevisionRecord,
  { actor, authorMaySign, photoUrls, contentHash, doseCaution }: RevisionMapping,
): RecipeRevisionDto {
  const { revision, recipe, profile, calibration, brief, signOffs } = record;
  const { steps, setUpSteps, limits, scope } = revision.content;
  const reference = comparedWith(record);
  const signOffsOf = (id: string) => signOffs.filter(({ revisionId }) => revisionId === id);
  const { id, number, physicalNumber, physical, panel } = profile;
  return {
    ...toRevisionBriefDto(brief, signOffsOf(revision.id)),
    recipe,
    ...{ steps, setUpSteps, limits, scope },
    profile: { id, number, physicalNumber, isPresent: physicalNumber === record.presentPhysicalNumber, physical, panel },
    calibration: calibration === null ? null : { id: calibration.id, measuredOn: calibration.measuredOn, meter: calibration.meter },
    grounds: revision.grounds,
    groundsBy: revision.groundsBy === null ? null : { id: revision.groundsBy, name: record.groundsByName ?? '' },
    evidence: {
      basis: record.basis.map((cell) => toEvidenceCellDto(cell, steps, photoUrls)),
      confirmation: record.confirmation.map((cell) => toEvidenceCellDto(cell, steps, photoUrls)),
      runs: record.runs.map((run) => toEvidenceRunDto(run, record)),
    },
    cautions: record.cautions.map((caution) => ({ ...caution, isAcknowledged: revision.acknowledgedCautionIds.includes(caution.id) })),
    changes: reference === undefined ? [] : toStepChangeDtos(reference, brief),
    comparedWith: reference === undefined ? null : toRevisionBriefDto(reference, signOffsOf(reference.id)),
    ...revisionNumbers(steps, { physical, panel, optics: record.optics }, doseCaution),
    optics: { ...record.optics },
    doseCaution,
    contentHash,
    version: revision.version,
    allowedActions: revisionActions(actor, revision, authorMaySign),
  };
}

export function toRevisionBriefDto(brief: RevisionBrief, signOffs: readonly StoredSignOff[]): RevisionBriefDto {
  const { id, number, state, route, reason, basedOnId, isReviewOverdue } = brief;
  return {
    ...{ id, number, state, route, reason, basedOnId, isReviewOverdue },
    author: { id: brief.createdBy, name: brief.authorName },
    createdAt: brief.createdAt.toISOString(),
    submittedAt: isoOf(brief.submittedAt),
    approvedAt: isoOf(brief.approvedAt),
    supersededAt: isoOf(brief.supersededAt),
    withdrawnAt: isoOf(brief.withdrawnAt),
    effectiveFrom: isoOf(brief.effectiveFrom),
    reviewDue: isoOf(brief.reviewDue),
    signOffs: signOffs.map(toSignOffDto),
  };
}

export function toSignOffDto({ revisionId: _, signedAt, ...signOff }: StoredSignOff): SignOffDto {
  const { id, memberId, printedName, role, meaning, comment, contentHash, ledgerHashBefore, method, isByAuthor } = signOff;
  return {
    ...{ id, memberId, printedName, role, meaning, comment, contentHash, ledgerHashBefore, method, isByAuthor },
    signedAt: signedAt.toISOString(),
  };
}

/** What a reader wants the changes counted from: the approved revision, or the one before where this one was approved itself. */
function comparedWith({ revision, ladder }: RevisionRecord): RevisionBrief | undefined {
  const approved = ladder.find(({ state }) => state === 'approved');
  if (approved !== undefined && approved.id !== revision.id && isUnderWay(revision.state)) return approved;
  const wasCurrent = ladder.filter(({ approvedAt, id }) => approvedAt !== null && id !== revision.id);
  return wasCurrent.find(({ number }) => number !== null && (revision.number === null || number < revision.number));
}

const isUnderWay = (state: string) => ['draft', 'in_review', 'returned', 'scheduled'].includes(state);

function toStepChangeDtos(before: RevisionBrief, after: RevisionBrief): StepChangeDto[] {
  return stepsDiff(before.content.steps, after.content.steps).map(({ changes, ...step }) => ({
    ...step,
    changes: changes.map(({ item, label, class: itemClass, change, before: earlier, after: later, size }) => ({
      ...{ item, label, class: itemClass, change, size },
      before: sideText(earlier),
      after: sideText(later),
    })),
  }));
}

/** A side of a change as people read it. */
export function sideText(side: ChangeSide | null): string | null {
  if (side === null) return null;
  if (side.kind === 'word') return side.word;
  if (side.kind === 'number') return `${showNumber(side.value)} ${side.symbol}`;
  const { value, unit } = side.value.entered;
  return `${showNumber(value)} ${PANEL_UNITS[unit].symbol}`;
}

const isoOf = (moment: Date | null) => moment?.toISOString() ?? null;
