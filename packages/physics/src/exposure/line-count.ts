import { requirePositive } from '../arguments/require-positive';

const UM_PER_MM = 1000;
/** 10 mm / 0.05 mm is 199.99999999999997 in binary: without this the last line would be lost. */
const ROUNDING_ALLOWANCE = 1e-9;

/**
 * Lines that fill a height, both edges marked.          n = floor(H / h + 1e-9) + 1
 *
 * @param heightMm       height of the area across the lines, mm, finite, > 0
 * @param lineSpacingUm  distance of neighbouring lines, um, finite, > 0
 * @returns number of lines, >= 1
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for straight lines parallel to an edge.
 * Source: convention of docs/science/marking-time.md
 */
export function lineCount(heightMm: number, lineSpacingUm: number): number {
  requirePositive({ heightMm, lineSpacingUm });
  return Math.floor((heightMm * UM_PER_MM) / lineSpacingUm + ROUNDING_ALLOWANCE) + 1;
}
