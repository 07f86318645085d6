import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';

const UM2_PER_MM2 = 1e6;

/**
 * Power of a continuous beam over the area of the 1/e^2 spot.          I = 4 P / (pi d^2)
 *
 * @param powerW          power at the workpiece, W, finite, >= 0
 * @param spotDiameterUm  1/e^2 diameter on the work, um, finite, > 0
 * @returns average irradiance, W/mm^2; on the axis of a Gaussian spot it is twice as much
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a continuous beam; with pulses it says nothing about the irradiance within a pulse.
 * Source: ISO 11145 (power density); docs/science/pulses.md
 */
export function averageIrradiance(powerW: number, spotDiameterUm: number): number {
  requireAtLeast(0, { powerW });
  requirePositive({ spotDiameterUm });
  return ((4 * powerW) / (Math.PI * spotDiameterUm ** 2)) * UM2_PER_MM2;
}
