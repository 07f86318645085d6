import { requireFinite } from '../arguments/require-finite';
import { requirePositive } from '../arguments/require-positive';

/**
 * Fluence at a distance from the focus over the fluence in focus.          F(z)/F(0) = 1 / (1 + (z/zR)^2)
 *
 * @param rayleighLengthMm  Rayleigh length, mm, finite, > 0
 * @param focusOffsetMm     distance z of the surface from the focal plane, mm, finite, either sign
 * @returns ratio, 0 < ratio <= 1
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a Gaussian beam; the same ratio for peak and average fluence.
 * Source: ISO 11146-1 (propagation of widths); docs/science/beam.md
 */
export function fluenceRatioAtOffset(rayleighLengthMm: number, focusOffsetMm: number): number {
  requirePositive({ rayleighLengthMm });
  requireFinite({ focusOffsetMm });
  return 1 / (1 + (focusOffsetMm / rayleighLengthMm) ** 2);
}
