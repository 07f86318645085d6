import { hasEssentialChange, isCitable, type MarkStep, QUANTITIES } from '@proofplate/recipe-model';
import { criterionResults, essentialDifferences, meetsAll, stepsMarkedBy } from './evidence-judgement';
import type { EvidenceCell, EvidenceRun, RunMeasurement } from './stored-revision';

/** One mark that was made to prove a setting again. */
export type ConfirmationMark = {
  /** Coupon and cell, or run and piece, as people call them. */
  readonly name: string;
  readonly madeAt: Date | null;
  readonly lot: string;
  readonly values: readonly { quantity: string; unit: string; value: number }[];
  /** Mark steps of the setting that it proves, from 0. */
  readonly provesSteps: readonly number[];
  /** Why it does not count; empty: it counts. */
  readonly faults: readonly string[];
};

export type Spread = { quantity: string; label: string; unit: string; n: number; lowest: number; highest: number; mean: number };

export type Confirmation = {
  readonly marks: readonly ConfirmationMark[];
  readonly counting: readonly ConfirmationMark[];
  /** Marks of the whole setting; of several steps the one that was proved least decides. */
  readonly count: number;
  readonly lots: readonly string[];
  readonly dayCount: number;
  readonly spreads: readonly Spread[];
};

export type ConfirmationInput = {
  readonly revisionId: string;
  readonly steps: readonly MarkStep[];
  readonly basis: readonly EvidenceCell[];
  readonly confirmation: readonly EvidenceCell[];
  readonly runs: readonly EvidenceRun[];
  readonly isSameWork: (cell: EvidenceCell) => boolean;
};

/** Every mark that was made to prove the setting again, with the reason where it does not count. */
export function confirmationOf(input: ConfirmationInput): Confirmation {
  const basisMarkedAt = latest(input.basis.map(({ coupon }) => coupon.markedAt));
  const marks = [
    ...input.confirmation.map((cell) => cellMark(cell, input)),
    ...input.runs.flatMap((run) => runMarks(run, input, basisMarkedAt)),
  ];
  const counting = marks.filter(({ faults }) => faults.length === 0);
  return {
    marks,
    counting,
    count: countOf(counting, input.steps.length),
    lots: [...new Set(counting.map(({ lot }) => lot))],
    dayCount: new Set(counting.map(({ madeAt }) => madeAt?.toISOString().slice(0, 10))).size,
    spreads: spreadsOf(counting),
  };
}

/** How often the whole setting was proved. */
export function countOf(counting: readonly ConfirmationMark[], stepCount: number): number {
  const perStep = Array.from({ length: stepCount }, (_, step) => counting.filter(({ provesSteps }) => provesSteps.includes(step)).length);
  return stepCount === 0 ? 0 : Math.min(...perStep);
}

/** True for a mark on a later coupon than the ones that a setting comes from. */
export function isLaterThanBasis({ coupon }: Pick<EvidenceCell, 'coupon'>, basis: readonly Pick<EvidenceCell, 'coupon'>[]): boolean {
  const isBasisCoupon = basis.some((own) => own.coupon.id === coupon.id);
  return !isBasisCoupon && isLater(coupon.markedAt, latest(basis.map((own) => own.coupon.markedAt)));
}

function cellMark(cell: EvidenceCell, input: ConfirmationInput): ConfirmationMark {
  const { coupon } = cell;
  const results = criterionResults(coupon.criteria ?? [], cell.measurements);
  const differences = essentialDifferences(cell.parameters, input.steps, coupon.unknownFields);
  const faults = [
    ...(cell.isMarked ? [] : ['it was skipped']),
    ...(isCitable(coupon.state) ? [] : ['its coupon is not sealed']),
    ...(input.isSameWork(cell) ? [] : ['its coupon is of other material, finish, effect, machine or lens']),
    ...(isLaterThanBasis(cell, input.basis) ? [] : ['its coupon is not later than the one that the setting comes from']),
    ...(differences.length === 0 ? [] : [`it differs in ${differences.join(', ').toLowerCase()}`]),
    ...severalStepsFault(cell, input),
    ...criterionFaults(meetsAll(results)),
  ];
  const values = results.flatMap(({ criterion, value }) =>
    value === null ? [] : [{ quantity: criterion.quantity, unit: criterion.unit, value }],
  );
  const provesSteps = stepsMarkedBy(cell.parameters, input.steps);
  return { name: `${coupon.code} ${cell.address}`, madeAt: coupon.markedAt, lot: coupon.lot, values, provesSteps, faults };
}

/** A cell holds one step, so of several steps it proves the whole only if its coupon was planned to prove this very revision. */
function severalStepsFault({ coupon }: EvidenceCell, { steps, revisionId }: ConfirmationInput): string[] {
  if (steps.length <= 1 || coupon.confirmsRevisionId === revisionId) return [];
  return ['its coupon was not planned to prove all steps of this revision'];
}

function runMarks(run: EvidenceRun, input: ConfirmationInput, basisMarkedAt: Date | null): ConfirmationMark[] {
  const criteria = input.basis.find(({ coupon }) => coupon.criteria !== null)?.coupon.criteria ?? [];
  const isSameSetting = run.steps !== null && !hasEssentialChange(input.steps, run.steps);
  const ofRun = [
    ...(isSameSetting ? [] : ['the run used other essential parameters']),
    ...(run.hasBadResult ? ['the run has a bad result'] : []),
    ...(isLater(run.startedAt, basisMarkedAt) ? [] : ['the run is not later than the coupon that the setting comes from']),
  ];
  return piecesOf(run.measurements).map(({ piece, measurements }) => {
    const measured = measurements.map((measurement) => ({ ...measurement, grade: null }));
    const results = criterionResults(criteria, measured);
    const values = measurements.map(({ quantity, unit, value }) => ({ quantity, unit, value }));
    return {
      name: `${run.code}, piece ${piece}`,
      madeAt: run.startedAt,
      lot: run.lot,
      values,
      provesSteps: input.steps.map((_, step) => step),
      faults: [...ofRun, ...criterionFaults(meetsAll(results))],
    };
  });
}

function piecesOf(measurements: readonly RunMeasurement[]) {
  const pieces = [...new Set(measurements.map(({ piece }) => piece))].sort((a, b) => a - b);
  return pieces.map((piece) => ({ piece, measurements: measurements.filter((measurement) => measurement.piece === piece) }));
}

function criterionFaults(meets: boolean | null): string[] {
  if (meets === null) return ['no acceptance criteria were recorded'];
  return meets ? [] : ['it does not meet every criterion'];
}

function spreadsOf(marks: readonly ConfirmationMark[]): Spread[] {
  const all = marks.flatMap(({ values }) => values);
  const kinds = new Map(all.map(({ quantity, unit }) => [`${quantity} ${unit}`, { quantity, unit }]));
  return [...kinds.values()].map(({ quantity, unit }) => {
    const values = all.filter((measured) => measured.quantity === quantity && measured.unit === unit).map(({ value }) => value);
    return {
      quantity,
      label: labelOf(quantity),
      unit,
      n: values.length,
      lowest: Math.min(...values),
      highest: Math.max(...values),
      mean: values.reduce((sum, value) => sum + value, 0) / values.length,
    };
  });
}

const labelOf = (quantity: string) => Object.entries(QUANTITIES).find(([key]) => key === quantity)?.[1].label ?? quantity;

function latest(dates: readonly (Date | null)[]): Date | null {
  const known = dates.filter((date) => date !== null).map((date) => date.getTime());
  return known.length === 0 ? null : new Date(Math.max(...known));
}

/** A mark of unknown date is never later; where the date of the basis is not known, every dated mark is. */
const isLater = (madeAt: Date | null, than: Date | null) => madeAt !== null && (than === null || madeAt > than);
