import { requirePositive } from '../arguments/require-positive';

/**
 * Depth over which the spot grows by at most a given share.          2 zR sqrt((1 + p)^2 - 1)
 *
 * @param rayleighLengthMm  Rayleigh length, mm, finite, > 0
 * @param growth            allowed growth p of the diameter as a share (0.05 is 5 %), finite, > 0
 * @returns total depth on both sides of the focus, mm
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a paraxial beam.
 * Source: ISO 11146-1, solved for z; docs/science/beam.md
 */
export function depthForSpotGrowth(rayleighLengthMm: number, growth: number): number {
  requirePositive({ rayleighLengthMm, growth });
  // (1 + p)^2 - 1 written as p (2 + p): no cancellation for a small growth.
  return 2 * rayleighLengthMm * Math.sqrt(growth * (2 + growth));
}
