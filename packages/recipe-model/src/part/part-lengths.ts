import { type DecimalSign, MM_PER_INCH } from '@proofplate/physics';
import { showNumber } from '../panel/show-number';
import type { EnteredLength, LengthUnit } from './entered-part';

/** Digits of a worked-out length in a sentence. */
const SHOWN_DIGITS = 4;

/** Millimetres of a typed length.          1 in = 25.4 mm exactly */
export function lengthMm({ value, unit }: EnteredLength): number {
  return unit === 'in' ? value * MM_PER_INCH : value;
}

/** Millimetres in the unit that a person reads. */
export function lengthIn(mm: number, unit: LengthUnit): number {
  return unit === 'in' ? mm / MM_PER_INCH : mm;
}

/** "62.83 mm", "2.474 in": for a sentence. */
export function lengthWords(mm: number, unit: LengthUnit, decimalSign: DecimalSign = '.'): string {
  return `${showNumber(Number(lengthIn(mm, unit).toPrecision(SHOWN_DIGITS)), decimalSign)} ${unit}`;
}
