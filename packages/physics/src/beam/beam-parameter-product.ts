import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';

const NM_PER_MM_MRAD = 1000;

/**
 * Beam parameter product: waist radius times divergence half angle.          BPP = M^2 lambda / pi
 *
 * @param wavelengthNm  wavelength, nm, finite, > 0
 * @param m2            beam propagation ratio M^2, finite, >= 1
 * @returns beam parameter product, mm mrad (radius x half angle; diameter x full angle is four times as much)
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for any beam: M^2 holds what keeps it from the limit of diffraction.
 * Source: ISO 11145, ISO 11146-1; docs/science/beam.md
 */
export function beamParameterProduct(wavelengthNm: number, m2: number): number {
  requirePositive({ wavelengthNm });
  requireAtLeast(1, { m2 });
  return (m2 * wavelengthNm) / (Math.PI * NM_PER_MM_MRAD);
}
