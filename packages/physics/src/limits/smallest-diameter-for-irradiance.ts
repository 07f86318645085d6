import { requirePositive } from '../arguments/require-positive';

const W_PER_KW = 1000;
const MM_PER_CM = 10;

/**
 * Smallest beam diameter that keeps the peak irradiance of a Gaussian spot under a limit.          d = 2 sqrt(2 P / (pi I))
 *
 * @param peakPowerKw             peak power of the pulse, kW, finite, > 0
 * @param irradianceLimitWPerCm2  highest irradiance allowed on the beam axis, W/cm^2, finite, > 0
 * @returns 1/e^2 diameter, mm
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a Gaussian spot. A number for choosing optics by their maker's damage limit, not for judging what is safe.
 * Source: peak irradiance 2 P / (pi w^2) solved for w; docs/science/pulses.md
 */
export function smallestDiameterForIrradiance(peakPowerKw: number, irradianceLimitWPerCm2: number): number {
  requirePositive({ peakPowerKw, irradianceLimitWPerCm2 });
  return 2 * Math.sqrt((2 * peakPowerKw * W_PER_KW) / (Math.PI * irradianceLimitWPerCm2)) * MM_PER_CM;
}
