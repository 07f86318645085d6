import { requirePositive } from '../arguments/require-positive';

/**
 * Highest average power of a pulsed source at a frequency.          P = min(P_rated, E_max f)
 *
 * @param ratedPowerW       rated average power, W, finite, > 0
 * @param maxPulseEnergyMj  highest pulse energy at the pulse width in use, mJ, finite, > 0
 * @param frequencyKhz      pulse frequency, kHz, finite, > 0
 * @returns power at 100 %, W; pulseEnergy of it is the highest pulse energy there
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for one pulse width, inside the frequency range of the source. A maker's limit, not a measured power.
 * Source: characteristic repetition rate, Hribar et al., Nanomaterials 12 (2022) 232; docs/science/pulses.md
 */
export function sourceLimitPower(ratedPowerW: number, maxPulseEnergyMj: number, frequencyKhz: number): number {
  requirePositive({ ratedPowerW, maxPulseEnergyMj, frequencyKhz });
  return Math.min(ratedPowerW, maxPulseEnergyMj * frequencyKhz);
}
