import { requirePositive } from '../arguments/require-positive';

/**
 * Overlap of neighbouring pulses along a line.          PO = 1 - v / (f d)
 *
 * @param speedMmPerS     scan speed v, mm/s, finite, > 0
 * @param frequencyKhz    pulse frequency f, kHz, finite, > 0
 * @param spotDiameterUm  1/e^2 diameter d on the work, um, finite, > 0
 * @returns share of the diameter; negative for separated dots, never clamped
 * @throws RangeError naming the argument and its value, if out of range
 * Valid at constant speed; a length ratio, not the shared area.
 * Source: definition, as in Lazov et al., Materials 18 (2025) 5037; docs/science/scanning.md
 */
export function pulseOverlap(speedMmPerS: number, frequencyKhz: number, spotDiameterUm: number): number {
  requirePositive({ speedMmPerS, frequencyKhz, spotDiameterUm });
  return 1 - speedMmPerS / (frequencyKhz * spotDiameterUm);
}
