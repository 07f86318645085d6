import { requirePositive } from '../arguments/require-positive';

/** Exact by definition of the inch (1959). */
export const MM_PER_INCH = 25.4;

export type SpacingUnits = { inch: number; linesPerInch: number; linesPerCm: number; linesPerMm: number };

/**
 * A line spacing in the other units that panels use.   h/25.4;  25.4/h;  10/h;  1/h
 *
 * @param spacingMm distance of neighbouring lines, mm, finite, > 0
 * @returns the spacing in inches and the line densities per inch, centimetre and millimetre
 * @throws RangeError naming the argument and its value
 * Valid for even spacings.
 * Source: inch = 25.4 mm exactly; docs/science/units.md
 */
export function spacingUnits(spacingMm: number): SpacingUnits {
  requirePositive({ spacingMm });
  return { inch: spacingMm / MM_PER_INCH, linesPerInch: MM_PER_INCH / spacingMm, linesPerCm: 10 / spacingMm, linesPerMm: 1 / spacingMm };
}
