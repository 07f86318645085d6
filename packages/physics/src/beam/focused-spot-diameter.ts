import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';

export type FocusedBeam = {
  readonly wavelengthNm: number;
  readonly focalLengthMm: number;
  readonly beamDiameterMm: number;
  readonly m2: number;
};

const NM_PER_UM = 1000;

/**
 * 1/e^2 diameter of the focal spot of a collimated beam.          d0 = 4 M^2 lambda f / (pi D)
 *
 * @param beam.wavelengthNm    wavelength, nm, finite, > 0
 * @param beam.focalLengthMm   focal length f, mm, finite, > 0
 * @param beam.beamDiameterMm  1/e^2 diameter D of the beam at the lens, mm, finite, > 0
 * @param beam.m2              beam propagation ratio M^2, finite, >= 1
 * @returns spot diameter, um
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a paraxial (f/D of 4 or more), untruncated, aberration-free focus.
 * Source: ISO 11146-1; docs/science/beam.md
 */
export function focusedSpotDiameter({ wavelengthNm, focalLengthMm, beamDiameterMm, m2 }: FocusedBeam): number {
  requirePositive({ wavelengthNm, focalLengthMm, beamDiameterMm });
  requireAtLeast(1, { m2 });
  return (4 * m2 * wavelengthNm * focalLengthMm) / (Math.PI * beamDiameterMm * NM_PER_UM);
}
