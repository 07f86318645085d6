import { requirePositive } from '../arguments/require-positive';

/**
 * How far a flat graphic goes round a turned cylinder.          angle = 360 W/(pi D)
 *
 * @param diameterMm  diameter D, mm, finite, > 0
 * @param widthMm     width W of the graphic along the circumference, mm, finite, > 0
 * @returns angle, deg; overlap beyond a whole turn and gap left to it, mm (one of them is 0)
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a round part turned without slip.
 * Source: plane geometry; docs/science/round-parts.md
 */
export function wrapRoundCylinder(
  diameterMm: number,
  widthMm: number,
): { readonly angleDeg: number; readonly overlapMm: number; readonly gapMm: number } {
  requirePositive({ diameterMm, widthMm });
  const circumferenceMm = Math.PI * diameterMm;
  return {
    angleDeg: (360 * widthMm) / circumferenceMm,
    overlapMm: Math.max(0, widthMm - circumferenceMm),
    gapMm: Math.max(0, circumferenceMm - widthMm),
  };
}
