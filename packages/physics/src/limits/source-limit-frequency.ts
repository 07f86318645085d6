import { requirePositive } from '../arguments/require-positive';

/**
 * Frequency at which a pulsed source passes from its energy limit to its power limit.          f0 = P_rated / E_max
 *
 * @param ratedPowerW       rated average power, W, finite, > 0
 * @param maxPulseEnergyMj  highest pulse energy at the pulse width in use, mJ, finite, > 0
 * @returns frequency f0, kHz; below it the pulse energy is the limit, above it the power
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for one pulse width: keep one value for each.
 * Source: characteristic repetition rate, Hribar et al., Nanomaterials 12 (2022) 232; docs/science/pulses.md
 */
export function sourceLimitFrequency(ratedPowerW: number, maxPulseEnergyMj: number): number {
  requirePositive({ ratedPowerW, maxPulseEnergyMj });
  return ratedPowerW / maxPulseEnergyMj;
}
