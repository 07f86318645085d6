/** Digits that a converted number keeps: 15 take away the last-bit noise of a product (0.07 × 1000) and cost at most 5e-16. */
const KEPT_DIGITS = 15;

/**
 * The number without the noise of binary products, so that 0.07 mm becomes 70 µm and not 70.00000000000001.
 *
 * @param value finite
 * @returns the value at 15 significant digits; relative change at most 5e-16
 * Valid for finite numbers; others come back as they are, nothing is thrown.
 * Source: own; docs/science/units.md
 */
export function tidy(value: number): number {
  return Number(value.toPrecision(KEPT_DIGITS));
}
