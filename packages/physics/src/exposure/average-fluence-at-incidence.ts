import { requireAtLeast } from '../arguments/require-at-least';
import { averageFluence } from './average-fluence';

/**
 * Average fluence on a surface that the beam meets at an angle.          F = 4 E cos(theta) / (pi d^2)
 *
 * @param pulseEnergyMj     pulse energy, mJ, finite, >= 0
 * @param spotDiameterUm    1/e^2 diameter across the beam, um, finite, > 0
 * @param incidenceAngleDeg angle between beam and surface normal, deg, 0 <= angle < 90
 * @returns average fluence over the ellipse on the surface, J/cm^2
 * @throws RangeError naming the argument and its value, if out of range
 * Valid while the depth of focus covers the tilt of the spot.
 * Source: projection of the spot on the surface; docs/science/pulses.md
 */
export function averageFluenceAtIncidence(pulseEnergyMj: number, spotDiameterUm: number, incidenceAngleDeg: number): number {
  requireAtLeast(0, { incidenceAngleDeg });
  if (incidenceAngleDeg >= 90) throw new RangeError(`incidenceAngleDeg must be below 90, but is ${incidenceAngleDeg}`);
  return averageFluence(pulseEnergyMj, spotDiameterUm) * Math.cos((incidenceAngleDeg * Math.PI) / 180);
}
