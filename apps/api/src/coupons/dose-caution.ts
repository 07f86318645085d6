import { OUTCOME_LABELS, type Outcome } from '@proofplate/recipe-model';
import { cellDose } from './cell-dose';
import type { SpoiltCell } from './coupon-plans.repository';
import type { DoseCautionDto } from './dto/coupon.dto';

/**
 * The dose from which cells are flagged: as typed, else the lowest one that spoilt a cell on this ground before. There is no number of
 * our own: what a material stands is known only from what was burnt.
 */
export function doseCaution(typed: number | null, spoilt: readonly SpoiltCell[]): DoseCautionDto | null {
  if (typed !== null) return { doseJPerMm2: typed, source: 'The dose entered in this plan' };
  const known = spoilt.flatMap((cell) => {
    const { value } = cellDose(cell.parameters);
    return value === null ? [] : [{ cell, value }];
  });
  const lowest = known.reduce<(typeof known)[number] | undefined>(
    (low, next) => (low === undefined || next.value < low.value ? next : low),
    undefined,
  );
  if (lowest === undefined) return null;
  const { code, address, outcome } = lowest.cell;
  // a rating's outcome comes from this list only
  const word = OUTCOME_LABELS[outcome as Outcome].toLowerCase();
  return { doseJPerMm2: lowest.value, source: `${address} of ${code}, same material and finish, came out ${word} at this dose` };
}
