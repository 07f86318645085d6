import { requirePositive } from '../arguments/require-positive';
import { requireWithin } from '../arguments/require-within';

/**
 * Weber contrast over the ground.          W = (Rm - Rg) / Rg
 *
 * @param markReflectance    reflectance of the mark in linear light, finite, >= 0
 * @param groundReflectance  reflectance of the ground on the same scale, finite, > 0
 * @returns contrast, signed: -1 to 0 for a dark mark, without upper end for a light one
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for linear light. Texts that divide by the lower of both reflectances mean weberContrastOverDarker.
 * Source: Weber's fraction, denominator the background; docs/science/contrast.md
 */
export function weberContrastOverGround(markReflectance: number, groundReflectance: number): number {
  requireWithin(0, Number.POSITIVE_INFINITY, { markReflectance });
  requirePositive({ groundReflectance });
  return (markReflectance - groundReflectance) / groundReflectance;
}

/**
 * Weber contrast over the darker of mark and ground.          W = |Rm - Rg| / min(Rm, Rg)
 *
 * @param markReflectance    reflectance of the mark in linear light, finite, > 0
 * @param groundReflectance  reflectance of the ground on the same scale, finite, > 0
 * @returns contrast, >= 0, without upper end
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for linear light. For a dark mark it differs from weberContrastOverGround: 3 against -0.75 for 0.2 on 0.8.
 * Source: Weber's fraction, denominator the lower luminance, as lighting texts print it; docs/science/contrast.md
 */
export function weberContrastOverDarker(markReflectance: number, groundReflectance: number): number {
  requirePositive({ markReflectance, groundReflectance });
  return Math.abs(markReflectance - groundReflectance) / Math.min(markReflectance, groundReflectance);
}
