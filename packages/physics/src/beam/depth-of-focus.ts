import { requirePositive } from '../arguments/require-positive';

/**
 * Depth over which the spot area at most doubles, both sides of the focus together.          DOF = 2 zR
 *
 * @param rayleighLengthMm  Rayleigh length, mm, finite, > 0
 * @returns total depth, mm
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a paraxial beam. For a tighter tolerance use depthForSpotGrowth or depthForFluenceLoss.
 * Source: ISO 11146-1; docs/science/beam.md
 */
export function depthOfFocus(rayleighLengthMm: number): number {
  requirePositive({ rayleighLengthMm });
  return 2 * rayleighLengthMm;
}
