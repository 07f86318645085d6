import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';

export type SpotAtIncidence = {
  readonly majorDiameterUm: number;
  readonly minorDiameterUm: number;
  readonly areaUm2: number;
  /** Fluence over the fluence at straight incidence. */
  readonly fluenceFactor: number;
};

/**
 * Spot on a surface that the beam meets at an angle.          major = d/cos(theta), area = pi d^2/(4 cos(theta)), F = F0 cos(theta)
 *
 * @param spotDiameterUm     1/e^2 diameter d across the beam, um, finite, > 0
 * @param incidenceAngleDeg  angle theta between beam and surface normal, deg, 0 <= theta < 90
 * @returns diameters, um; area, um^2; factor on peak and average fluence
 * @throws RangeError naming the argument and its value, if out of range
 * Valid while the depth of focus covers the tilt of the spot; absorption changes with the angle too.
 * Source: projection of the spot on the surface; docs/science/round-parts.md
 */
export function spotAtIncidence(spotDiameterUm: number, incidenceAngleDeg: number): SpotAtIncidence {
  requirePositive({ spotDiameterUm });
  requireAtLeast(0, { incidenceAngleDeg });
  if (incidenceAngleDeg >= 90) throw new RangeError(`incidenceAngleDeg must be below 90, but is ${incidenceAngleDeg}`);
  const fluenceFactor = Math.cos((incidenceAngleDeg * Math.PI) / 180);
  return {
    majorDiameterUm: spotDiameterUm / fluenceFactor,
    minorDiameterUm: spotDiameterUm,
    areaUm2: (Math.PI * spotDiameterUm ** 2) / (4 * fluenceFactor),
    fluenceFactor,
  };
}
