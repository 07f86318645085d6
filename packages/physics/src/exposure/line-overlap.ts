import { requirePositive } from '../arguments/require-positive';

/**
 * Overlap of neighbouring lines of a fill.          LO = 1 - h / d
 *
 * @param lineSpacingUm   distance h of neighbouring lines, um, finite, > 0
 * @param spotDiameterUm  1/e^2 diameter d on the work, um, finite, > 0
 * @returns share of the diameter; negative for separated lines, never clamped
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for straight, even lines; a length ratio, not the shared area.
 * Source: definition; docs/science/scanning.md
 */
export function lineOverlap(lineSpacingUm: number, spotDiameterUm: number): number {
  requirePositive({ lineSpacingUm, spotDiameterUm });
  return 1 - lineSpacingUm / spotDiameterUm;
}
