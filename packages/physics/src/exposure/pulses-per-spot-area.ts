import { requirePositive } from '../arguments/require-positive';
import { requireWhole } from '../arguments/require-whole';

export type PulsesOverArea = {
  readonly spotDiameterUm: number;
  readonly frequencyKhz: number;
  readonly speedMmPerS: number;
  readonly lineSpacingUm: number;
  readonly scans: number;
};

/**
 * Mean number of pulses that fall on the area of one spot in a fill.          N = n pi d^2 f / (4 v h)
 *
 * @param mark.spotDiameterUm  1/e^2 diameter d on the work, um, finite, > 0
 * @param mark.frequencyKhz    pulse frequency f, kHz, finite, > 0
 * @param mark.speedMmPerS     scan speed v, mm/s, finite, > 0
 * @param mark.lineSpacingUm   distance h of neighbouring lines, um, finite, > 0
 * @param mark.scans           scans n over the area in all, whole, >= 1: a crossed pass counts two
 * @returns mean number of pulses, not rounded
 * @throws RangeError naming the argument and its value, if out of range
 * Valid as a mean; where pitch or spacing exceed the spot the pulses do not cover the area.
 * Source: Weber et al., Appl. Phys. A (2018), 10.1007/s00339-018-2040-4; docs/science/scanning.md
 */
export function pulsesPerSpotArea({ spotDiameterUm, frequencyKhz, speedMmPerS, lineSpacingUm, scans }: PulsesOverArea): number {
  requirePositive({ spotDiameterUm, frequencyKhz, speedMmPerS, lineSpacingUm });
  requireWhole({ scans });
  return (scans * Math.PI * spotDiameterUm ** 2 * frequencyKhz) / (4 * speedMmPerS * lineSpacingUm);
}
