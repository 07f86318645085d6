import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';

const GW_PER_CM2_PER_KW_PER_UM2 = 100;

/**
 * Irradiance on the axis of a Gaussian spot at the peak of the pulse.          I0 = 2 P / (pi w^2), w = d/2
 *
 * @param peakPowerKw     peak power of the pulse, kW, finite, >= 0; gaussianPeakPower for a Gaussian pulse
 * @param spotDiameterUm  1/e^2 diameter on the work, um, finite, > 0
 * @returns peak irradiance, GW/cm^2
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a Gaussian spot.
 * Source: Siegman, Lasers (1986); docs/science/pulses.md
 */
export function peakIrradiance(peakPowerKw: number, spotDiameterUm: number): number {
  requireAtLeast(0, { peakPowerKw });
  requirePositive({ spotDiameterUm });
  return ((8 * peakPowerKw) / (Math.PI * spotDiameterUm ** 2)) * GW_PER_CM2_PER_KW_PER_UM2;
}
