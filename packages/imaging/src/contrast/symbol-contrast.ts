import { requireWithin } from '../arguments/require-within';

/**
 * Symbol contrast of a two-dimensional code.          SC = Rmax - Rmin
 *
 * @param highestReflectance  highest reflectance within symbol and quiet zone, linear light, finite, >= 0
 * @param lowestReflectance   lowest one, finite, >= 0, at most the highest
 * @returns symbol contrast, on the scale of the reflectances (1 is the diffuse white)
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for reflectances of a calibrated verifier; from a photo it is an estimate.
 * Source: ISO/IEC 15415; docs/science/contrast.md
 */
export function symbolContrast(highestReflectance: number, lowestReflectance: number): number {
  requireWithin(0, Number.POSITIVE_INFINITY, { highestReflectance });
  requireWithin(0, highestReflectance, { lowestReflectance });
  return highestReflectance - lowestReflectance;
}
