import { requireFinite } from '../arguments/require-finite';
import { requirePositive } from '../arguments/require-positive';

/**
 * 1/e^2 spot diameter on a surface away from the focal plane.          d(z) = d0 sqrt(1 + (z/zR)^2)
 *
 * @param spotDiameterUm    1/e^2 diameter in focus, um, finite, > 0
 * @param rayleighLengthMm  Rayleigh length, mm, finite, > 0
 * @param focusOffsetMm     distance z of the surface from the focal plane, mm, finite, either sign
 * @returns spot diameter at z, um
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a paraxial beam without astigmatism: both signs of z give the same spot.
 * Source: ISO 11146-1; docs/science/beam.md
 */
export function spotDiameterAtOffset(spotDiameterUm: number, rayleighLengthMm: number, focusOffsetMm: number): number {
  requirePositive({ spotDiameterUm, rayleighLengthMm });
  requireFinite({ focusOffsetMm });
  return spotDiameterUm * Math.hypot(1, focusOffsetMm / rayleighLengthMm);
}
