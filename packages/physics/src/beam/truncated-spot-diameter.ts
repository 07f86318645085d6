import { requirePositive } from '../arguments/require-positive';
import { type FocusedBeam, focusedSpotDiameter } from './focused-spot-diameter';

const UNTRUNCATED = 4 / Math.PI;

/**
 * 1/e^2 diameter of the focal spot behind an aperture that cuts the beam.          d0 = APO M^2 lambda f / D
 *
 * @param beam               wavelength nm, focal length mm, beam diameter mm (all > 0), M^2 (>= 1)
 * @param apodisationFactor  APO, finite, > 0: 4/pi when nothing is cut, 1.83 when the aperture is as wide as the beam
 * @returns spot diameter, um
 * @throws RangeError naming the argument and its value, if out of range
 * Valid like focusedSpotDiameter; the factor comes from the maker's table of the optics in use.
 * Source: printed tables of lens makers (aperture/beam 2.0: 1.27, 1.0: 1.83); docs/science/beam.md
 */
export function truncatedSpotDiameter(beam: FocusedBeam, apodisationFactor: number): number {
  requirePositive({ apodisationFactor });
  return (focusedSpotDiameter(beam) * apodisationFactor) / UNTRUNCATED;
}
