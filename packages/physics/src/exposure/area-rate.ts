import { requirePositive } from '../arguments/require-positive';

const UM_PER_MM = 1000;

/**
 * Area covered per second by one scan, beam on.          rate = v h
 *
 * @param speedMmPerS    scan speed v, mm/s, finite, > 0
 * @param lineSpacingUm  distance h of neighbouring lines, um, finite, > 0
 * @returns area rate, mm^2/s; jumps, delays and further scans come on top (filledRectangleTime)
 * @throws RangeError naming the argument and its value, if out of range
 * Valid while the beam marks; at constant speed.
 * Source: definition; docs/science/scanning.md
 */
export function areaRate(speedMmPerS: number, lineSpacingUm: number): number {
  requirePositive({ speedMmPerS, lineSpacingUm });
  return (speedMmPerS * lineSpacingUm) / UM_PER_MM;
}
