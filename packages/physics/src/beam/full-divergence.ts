import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';
import type { Waist } from './rayleigh-length';

/**
 * Full far-field divergence angle behind a waist.          Theta = 4 M^2 lambda / (pi d0)
 *
 * @param waist.spotDiameterUm  1/e^2 diameter in focus, um, finite, > 0
 * @param waist.wavelengthNm    wavelength, nm, finite, > 0
 * @param waist.m2              beam propagation ratio M^2, finite, >= 1
 * @returns full angle, mrad (nm/um is mrad); the half angle is half of it
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a paraxial beam.
 * Source: ISO 11146-1; docs/science/beam.md
 */
export function fullDivergence({ spotDiameterUm, wavelengthNm, m2 }: Waist): number {
  requirePositive({ spotDiameterUm, wavelengthNm });
  requireAtLeast(1, { m2 });
  return (4 * m2 * wavelengthNm) / (Math.PI * spotDiameterUm);
}
