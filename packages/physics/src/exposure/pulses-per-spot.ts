import { requirePositive } from '../arguments/require-positive';

/**
 * Pulses that fall on one spot diameter along a line.          N = d f / v
 *
 * @param speedMmPerS     scan speed v, mm/s, finite, > 0
 * @param frequencyKhz    pulse frequency f, kHz, finite, > 0
 * @param spotDiameterUm  1/e^2 diameter d on the work, um, finite, > 0
 * @returns number of pulses, not rounded; below 1 for separated dots
 * @throws RangeError naming the argument and its value, if out of range
 * Valid at constant speed.
 * Source: Weber et al., Appl. Phys. A (2018), 10.1007/s00339-018-2040-4; docs/science/scanning.md
 */
export function pulsesPerSpot(speedMmPerS: number, frequencyKhz: number, spotDiameterUm: number): number {
  requirePositive({ speedMmPerS, frequencyKhz, spotDiameterUm });
  return (spotDiameterUm * frequencyKhz) / speedMmPerS;
}
