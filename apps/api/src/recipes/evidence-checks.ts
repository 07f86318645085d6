import { hasEssentialChange, isCitable, type RouteKind } from '@proofplate/recipe-model';
import type { ShopPolicy } from '../shops/shop-policy';
import { type ApprovalCheck, check } from './approval-check';
import { type ApprovalFacts, isSameWork } from './approval-facts';
import { type Confirmation, countOf } from './confirmation';
import type { EvidenceCell, RevisionRecord } from './stored-revision';

const MOST_NAMED = 6;

export function basisCheck(record: RevisionRecord): ApprovalCheck {
  const sealed = record.basis.filter(({ coupon, isMarked }) => isMarked && isCitable(coupon.state));
  const fitting = sealed.filter((cell) => isSameWork(cell, record));
  const proofs = record.basis.filter(({ coupon }) => coupon.isProof);
  if (proofs.length > 0) {
    const found = `${namesOf(proofs)}: equal cells that prove a setting, not cells that one comes from.`;
    return check('basis', 'Basis', { passes: false, found, wayOut: 'Take them out of the basis, and cite the cells that were tried out.' });
  }
  const passes = fitting.length > 0;
  const found = passes
    ? `${namesOf(fitting)}, sealed.`
    : record.basis.length === 0
      ? 'No cell is cited.'
      : sealed.length === 0
        ? `${namesOf(record.basis)}: the coupon is not sealed.`
        : `${namesOf(sealed)}: another material, finish, effect, machine or lens, or the machine was changed since, or nobody knows.`;
  return check('basis', 'Basis', { passes, found, wayOut: 'Cite a cell of a sealed coupon of the same work.' });
}

export function confirmationCheck(confirmation: Confirmation, { minimumConfirmationMarks }: ShopPolicy, route: RouteKind): ApprovalCheck {
  const { marks, count } = confirmation;
  const left = marks.filter(({ faults }) => faults.length > 0);
  const named = left.slice(0, MOST_NAMED).map(({ name, faults }) => `${name}: ${faults.join(', ')}.`);
  const more = left.length > MOST_NAMED ? [`${left.length - MOST_NAMED} more do not count.`] : [];
  const numbers = confirmation.spreads.map(
    ({ label, n, lowest, highest, mean }) => `${label} ${shown(lowest)} to ${shown(highest)}, mean ${shown(mean)} (n = ${n}).`,
  );
  const summary = `${count} of ${minimumConfirmationMarks} marks count, ${counted(confirmation.lots.length, 'lot')}, ${counted(confirmation.dayCount, 'day')}.`;
  return check('confirmation', 'Confirmation', {
    passes: count >= minimumConfirmationMarks,
    found: [summary, ...numbers, ...named, ...more].join(' '),
    wayOut:
      route === 'transferred'
        ? 'Mark and seal a coupon on this machine with exactly these parameters.'
        : 'Mark and seal a later coupon with exactly these parameters, or finish a confirmation run.',
  });
}

/** An essential change needs marks that are newer than what the approved revision rests on. */
export function newConfirmationCheck({ record, current, policy }: ApprovalFacts, { counting }: Confirmation): ApprovalCheck {
  const title = 'New confirmation for an essential change';
  const steps = record.revision.content.steps;
  if (current === null || !hasEssentialChange(current.steps, steps)) {
    return check('new-confirmation', title, { passes: true, found: 'Nothing essential changed; earlier marks may be cited.' });
  }
  const since = current.newestEvidenceAt;
  const newer = counting.filter(({ madeAt }) => since === null || (madeAt !== null && madeAt > since));
  const count = countOf(newer, steps.length);
  const passes = count >= policy.minimumConfirmationMarks;
  return check('new-confirmation', title, {
    passes,
    found: `${count} of ${policy.minimumConfirmationMarks} marks are newer than the evidence of revision ${current.number ?? ''}.`,
    wayOut: 'Mark and seal a new confirmation coupon.',
  });
}

export function criteriaCheck(record: RevisionRecord): ApprovalCheck {
  const coupons = couponsOf(record);
  const without = coupons.filter(({ criteria }) => criteria === null || criteria.length === 0).map(({ code }) => code);
  const late = coupons
    .filter(
      ({ criteriaRecordedAt, firstLookedAt }) =>
        criteriaRecordedAt !== null && firstLookedAt !== null && criteriaRecordedAt > firstLookedAt,
    )
    .map(({ code }) => code);
  const faults = [
    ...(without.length === 0 ? [] : [`No criteria were recorded for ${without.join(', ')}.`]),
    ...(late.length === 0 ? [] : [`The criteria of ${late.join(', ')} were recorded after somebody had looked.`]),
  ];
  return check('criteria', 'Criteria before inspection', {
    passes: faults.length === 0,
    found: faults.length === 0 ? 'Recorded before anybody looked.' : faults.join(' '),
    wayOut: 'Cite a coupon whose criteria were recorded first.',
  });
}

export function photoCheck(record: RevisionRecord, { photoRequired }: ShopPolicy): ApprovalCheck {
  const cells = [...record.basis, ...record.confirmation];
  const missing = [...new Set(cells.filter(({ photo }) => photo === null).map(({ coupon }) => coupon.code))];
  return check('photo', 'Photo', {
    passes: missing.length === 0,
    isAdvisory: !photoRequired,
    found: missing.length === 0 ? 'Every cited coupon has one.' : `${missing.join(', ')} has no photo that is ready.`,
    wayOut: 'Cite coupons that were photographed before they were sealed.',
  });
}

function couponsOf({ basis, confirmation }: RevisionRecord): EvidenceCell['coupon'][] {
  return [...new Map([...basis, ...confirmation].map(({ coupon }) => [coupon.id, coupon])).values()];
}

function namesOf(cells: readonly EvidenceCell[]): string {
  const names = cells.slice(0, MOST_NAMED).map(({ coupon, address }) => `${coupon.code} ${address}`);
  return cells.length > MOST_NAMED ? `${names.join(', ')} and ${cells.length - MOST_NAMED} more` : names.join(', ');
}

const DIGITS = 4;
const shown = (value: number) => String(Number(value.toPrecision(DIGITS)));
const counted = (count: number, word: string) => `${count} ${count === 1 ? word : `${word}s`}`;
