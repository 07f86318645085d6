import { requirePositive } from '../arguments/require-positive';
import { requireWithin } from '../arguments/require-within';

/**
 * Modulation of one module of a two-dimensional code.          MOD = 2 |R - GT| / SC
 *
 * @param moduleReflectance  reflectance R of the module, linear light, finite, >= 0
 * @param globalThreshold    threshold GT = (Rmax + Rmin) / 2, finite, >= 0
 * @param contrast           symbol contrast SC, finite, > 0
 * @returns modulation; 1 for a module at Rmax or Rmin
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for reflectances of a calibrated verifier; from a photo it is an estimate.
 * Source: ISO/IEC 15415; docs/science/contrast.md
 */
export function moduleModulation(moduleReflectance: number, globalThreshold: number, contrast: number): number {
  requireWithin(0, Number.POSITIVE_INFINITY, { moduleReflectance, globalThreshold });
  requirePositive({ contrast });
  return (2 * Math.abs(moduleReflectance - globalThreshold)) / contrast;
}
