import type { DecimalSign } from '@proofplate/physics';
import { showNumber } from '../panel/show-number';
import type { Criterion } from './criteria';
import { QUANTITIES } from './measurements';

/**
 * True if a measured value meets the criterion; the limits themselves count as met.
 *
 * @param criterion recorded before inspection
 * @param value     measured, in the criterion's unit, finite
 * @returns false as well for a value that is no number and for a 'between' without its upper limit
 */
export function meetsCriterion(criterion: Criterion, value: number): boolean {
  if (!Number.isFinite(value)) return false;
  if (criterion.comparison === 'at least') return value >= criterion.value;
  if (criterion.comparison === 'at most') return value <= criterion.value;
  return criterion.upper !== undefined && value >= criterion.value && value <= criterion.upper;
}

/** The criterion in words: "Depth between 20 and 30 µm". */
export function criterionText({ quantity, comparison, value, upper, unit }: Criterion, decimalSign: DecimalSign = '.'): string {
  const { label } = QUANTITIES[quantity];
  const ending = unit === '1' ? '' : ` ${unit}`;
  if (comparison !== 'between') return `${label} ${comparison} ${showNumber(value, decimalSign)}${ending}`;
  return `${label} between ${showNumber(value, decimalSign)} and ${upper === undefined ? '?' : showNumber(upper, decimalSign)}${ending}`;
}
