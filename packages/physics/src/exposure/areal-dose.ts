import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';
import { requireWhole } from '../arguments/require-whole';

export type FilledExposure = {
  readonly powerW: number;
  readonly speedMmPerS: number;
  readonly lineSpacingUm: number;
  readonly scans: number;
};

const UM_PER_MM = 1000;

/**
 * Energy per area of a fill, summed over all its scans.          dose = n P / (v h)
 *
 * @param mark.powerW         average power at the workpiece, W, finite, >= 0
 * @param mark.speedMmPerS    scan speed v, mm/s, finite, > 0
 * @param mark.lineSpacingUm  distance h of neighbouring lines, um, finite, > 0
 * @param mark.scans          scans n over the area in all, whole, >= 1: a crossed pass counts two
 * @returns areal dose, J/mm^2 (x 100 is J/cm^2)
 * @throws RangeError naming the argument and its value, if out of range
 * Valid as a mean over an area much larger than the spot; see coverageRipple for its evenness.
 * Source: energy balance (dose x area = power x beam-on time); docs/science/scanning.md
 */
export function arealDose({ powerW, speedMmPerS, lineSpacingUm, scans }: FilledExposure): number {
  requireAtLeast(0, { powerW });
  requirePositive({ speedMmPerS, lineSpacingUm });
  requireWhole({ scans });
  return (scans * powerW * UM_PER_MM) / (speedMmPerS * lineSpacingUm);
}
