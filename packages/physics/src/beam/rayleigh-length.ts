import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';

export type Waist = {
  readonly spotDiameterUm: number;
  readonly wavelengthNm: number;
  readonly m2: number;
};

/**
 * Distance from the focus at which the spot has twice its area.          zR = pi d0^2 / (4 M^2 lambda)
 *
 * @param waist.spotDiameterUm  1/e^2 diameter in focus, um, finite, > 0
 * @param waist.wavelengthNm    wavelength, nm, finite, > 0
 * @param waist.m2              beam propagation ratio M^2, finite, >= 1
 * @returns Rayleigh length, mm (um^2/nm is mm); the depth of focus 2 zR is depthOfFocus
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a paraxial beam.
 * Source: ISO 11146-1; docs/science/beam.md
 */
export function rayleighLength({ spotDiameterUm, wavelengthNm, m2 }: Waist): number {
  requirePositive({ spotDiameterUm, wavelengthNm });
  requireAtLeast(1, { m2 });
  return (Math.PI * spotDiameterUm ** 2) / (4 * m2 * wavelengthNm);
}
