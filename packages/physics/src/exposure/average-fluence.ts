import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';

const J_PER_CM2_PER_MJ_PER_UM2 = 1e5;

/**
 * Pulse energy over the area of the 1/e^2 spot.          F = 4 E / (pi d^2)
 *
 * @param pulseEnergyMj   pulse energy, mJ, finite, >= 0
 * @param spotDiameterUm  1/e^2 diameter on the work, um, finite, > 0
 * @returns average fluence, J/cm^2; half of peakFluence
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a round spot; all energy is spread over the 1/e^2 disc, which holds 86 % of a Gaussian pulse.
 * Source: ISO 11145 (energy density); docs/science/pulses.md
 */
export function averageFluence(pulseEnergyMj: number, spotDiameterUm: number): number {
  requireAtLeast(0, { pulseEnergyMj });
  requirePositive({ spotDiameterUm });
  return ((4 * pulseEnergyMj) / (Math.PI * spotDiameterUm ** 2)) * J_PER_CM2_PER_MJ_PER_UM2;
}
