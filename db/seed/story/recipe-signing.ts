import { schema } from '@proofplate/db';
import { and, eq } from 'drizzle-orm';
import { authored, type Turn } from '../stage/stage';
import { keptChecks, type ProvedMark } from './approval-checks';
import { type Cast, effectOf, type Person } from './cast';
import { careIds } from './coupon-planning';
import { type DraftRecord, hashOf } from './recipe-drafting';
import type { RecipeSpec } from './recipe-specs';
import type { CouponRecord } from './records';

const { revision, revisionEvidence, signOff } = schema;

const MS_PER_DAY = 24 * 60 * 60 * 1000;

/** The cells of a proof become the confirmation of the draft that they prove. */
export async function linkProof(turn: Turn, record: DraftRecord, proof: CouponRecord): Promise<ProvedMark[]> {
  const confirmationCellIds = proof.cells.map(({ id }) => id);
  const links = confirmationCellIds.map((cellId) => ({
    ...authored(turn),
    revisionId: record.id,
    couponId: proof.id,
    cellId,
    kind: 'confirmation',
  }));
  await turn.tx.insert(revisionEvidence).values(links);
  record.confirmationCellIds.push(...confirmationCellIds);
  await turn.tx.update(revision).set({ version: 2 }).where(isRevision(turn, record));
  const after = { basisCellIds: record.basis.map(({ cellId }) => cellId), confirmationCellIds };
  await turn.tell({ action: 'revision.evidence-set', ...subjectOf(record), after });
  const day = proof.markedAt?.toISOString().slice(0, 10) ?? '';
  return proof.cells.map(({ measured }) => ({ lot: proof.lot, day, measured }));
}

export type Signing = {
  readonly cast: Cast;
  readonly recipe: RecipeSpec;
  readonly record: DraftRecord;
  readonly person: Person;
  readonly marks: readonly ProvedMark[];
};

export async function submit(turn: Turn, signing: Signing, number: number): Promise<void> {
  const { record } = signing;
  const contentHash = hashOf(record);
  const acknowledgedCautionIds = acknowledgedBy(signing);
  const change = { state: 'in_review', number, contentHash, acknowledgedCautionIds, submittedAt: turn.at, version: 3 };
  await turn.tx.update(revision).set(change).where(isRevision(turn, record));
  const checks = keptChecks(groundsOf(turn, signing, acknowledgedCautionIds.length));
  const comment = record.spec.comment ?? '';
  await sign(turn, signing, {
    meaning: 'submitted for review',
    method: 'session',
    action: 'revision.submitted',
    comment,
    contentHash,
    acknowledgedCautionIds,
    checks,
    after: { state: 'in_review', number },
  });
  Object.assign(record, { number, contentHash, state: 'in_review' });
}

export async function approve(turn: Turn, signing: Signing, current: DraftRecord | undefined, comment: string): Promise<void> {
  const { record, cast } = signing;
  const effectiveFrom = record.spec.effectiveFrom === undefined ? undefined : new Date(record.spec.effectiveFrom);
  const state = effectiveFrom === undefined ? 'approved' : 'scheduled';
  if (current !== undefined && state === 'approved') await supersede(turn, current);
  const from = effectiveFrom ?? turn.at;
  const reviewDue =
    record.spec.reviewDue === undefined
      ? new Date(from.getTime() + cast.policy.reviewEveryDays * MS_PER_DAY)
      : new Date(record.spec.reviewDue);
  await turn.tx.update(revision).set({ state, approvedAt: turn.at, reviewDue, version: 4 }).where(isRevision(turn, record));
  const acknowledgedCautionIds = acknowledgedBy(signing);
  const checks = keptChecks(groundsOf(turn, signing, acknowledgedCautionIds.length), signing.person);
  const contentHash = record.contentHash ?? '';
  const action = `revision.${state}`;
  await sign(turn, signing, {
    meaning: 'approved',
    method: 'password',
    action,
    comment,
    contentHash,
    acknowledgedCautionIds,
    checks,
    after: { state, number: record.number },
  });
  record.state = state;
}

/** Sends it back to its author, or takes an approved one out of use. */
export async function refuse(turn: Turn, signing: Signing, act: 'returned' | 'withdrawn', comment: string): Promise<void> {
  const { record } = signing;
  const moments = act === 'withdrawn' ? { withdrawnAt: turn.at } : {};
  await turn.tx
    .update(revision)
    .set({ state: act, ...moments, version: 5 })
    .where(isRevision(turn, record));
  const method = act === 'withdrawn' ? 'password' : 'session';
  const kept = { contentHash: record.contentHash ?? '', acknowledgedCautionIds: [], checks: null };
  await sign(turn, signing, {
    meaning: act,
    method,
    action: `revision.${act}`,
    comment,
    ...kept,
    after: { state: act, number: record.number },
  });
  record.state = act;
}

async function supersede(turn: Turn, current: DraftRecord): Promise<void> {
  await turn.tx.update(revision).set({ state: 'superseded', supersededAt: turn.at, version: 5 }).where(isRevision(turn, current));
  const states = { before: { state: 'approved' }, after: { state: 'superseded', number: current.number } };
  await turn.tell({ action: 'revision.superseded', ...subjectOf(current), ...states });
  current.state = 'superseded';
}

type Signature = Pick<typeof signOff.$inferInsert, 'meaning' | 'method' | 'contentHash' | 'checks'> & {
  readonly action: string;
  readonly comment: string;
  readonly acknowledgedCautionIds: string[];
  readonly after: Readonly<Record<string, unknown>>;
};

async function sign(turn: Turn, { record, person }: Signing, { action, after, ...signature }: Signature): Promise<void> {
  const { memberId, name: printedName, role } = person;
  const isByAuthor = memberId === record.authorId;
  const signed = { memberId, printedName, role, isByAuthor, ledgerHashBefore: turn.ledgerHash(), signedAt: turn.at };
  await turn.tx.insert(signOff).values({ shopId: turn.shopId, id: turn.newId(), revisionId: record.id, ...signature, ...signed });
  const { meaning, comment, contentHash, method } = signature;
  await turn.tell({
    ...{ action, ...subjectOf(record), before: { state: record.state } },
    after: { ...after, signature: { meaning, comment, contentHash, method, printedName, role, isByAuthor } },
  });
}

const subjectOf = ({ id, recipeCode }: DraftRecord) => ({ subjectType: 'revision', subjectId: id, subjectCode: recipeCode });
const isRevision = ({ shopId }: Turn, { id }: DraftRecord) => and(eq(revision.shopId, shopId), eq(revision.id, id));

const isRound = ({ limits, scope }: RecipeSpec) => limits.partDiameterMm !== undefined || scope.partDiameterMm !== undefined;
const acknowledgedBy = ({ cast, recipe }: Signing) => careIds(cast, recipe, isRound(recipe));

function groundsOf({ at }: Turn, { cast, recipe, record, marks }: Signing, cautionCount: number) {
  const { reason, route = 'coupons', grounds } = record.spec;
  return {
    ...{ route, reason, cautionCount, marks, at, calibratedOn: record.calibratedOn, policy: cast.policy },
    stepCount: record.content.steps.length,
    basis: record.basis.map(({ name }) => name),
    criteria: effectOf(cast, recipe.effect).criteria,
    grounds: grounds === undefined ? '' : `${cast.people[grounds.by].name}: ${grounds.text}`,
    machineName: cast.benches[recipe.bench].name,
  };
}
