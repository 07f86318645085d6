import { requireWithin } from '../arguments/require-within';

/**
 * Michelson contrast of a mark and its ground.          K = |Rm - Rg| / (Rm + Rg)
 *
 * @param markReflectance    reflectance of the mark in linear light, finite, >= 0
 * @param groundReflectance  reflectance of the ground on the same scale, finite, >= 0, not both 0
 * @returns contrast, 0 to 1, the same for a dark and a light mark
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for linear light, never for the code values of a picture.
 * Source: Michelson, Studies in Optics (1927); docs/science/contrast.md
 */
export function michelsonContrast(markReflectance: number, groundReflectance: number): number {
  requireWithin(0, Number.POSITIVE_INFINITY, { markReflectance, groundReflectance });
  const sum = markReflectance + groundReflectance;
  if (sum === 0) throw new RangeError('groundReflectance must be above 0 where markReflectance is 0, but is 0');
  return Math.abs(markReflectance - groundReflectance) / sum;
}
