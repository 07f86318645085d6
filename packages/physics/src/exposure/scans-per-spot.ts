import { requirePositive } from '../arguments/require-positive';

/**
 * Lines of one scan that cross one spot diameter.          N = d / h
 *
 * @param lineSpacingUm   distance h of neighbouring lines, um, finite, > 0
 * @param spotDiameterUm  1/e^2 diameter d on the work, um, finite, > 0
 * @returns number of lines, not rounded
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for straight, even lines.
 * Source: Weber et al., Appl. Phys. A (2018), 10.1007/s00339-018-2040-4; docs/science/scanning.md
 */
export function scansPerSpot(lineSpacingUm: number, spotDiameterUm: number): number {
  requirePositive({ lineSpacingUm, spotDiameterUm });
  return spotDiameterUm / lineSpacingUm;
}
