import type { DecimalSign } from '@proofplate/physics';

/** Digits that people see of a converted number; what they typed has at most 15 and is shown whole. */
const SHOWN_DIGITS = 12;

/** A number for people: true minus, the locale's decimal sign, no grouping (a group would be refused when typed back). */
export function showNumber(value: number, decimalSign: DecimalSign = '.'): string {
  const plain = String(Number(value.toPrecision(SHOWN_DIGITS)));
  return plain.replace('-', '−').replace('.', decimalSign);
}
