import { requirePositive } from '../arguments/require-positive';

const US_PER_UM_PER_MM_PER_S = 1000;

/**
 * Time in which the spot passes over a point of the line.          t = d / v
 *
 * @param spotDiameterUm  1/e^2 diameter d on the work, um, finite, > 0
 * @param speedMmPerS     scan speed v, mm/s, finite, > 0
 * @returns time, us
 * @throws RangeError naming the argument and its value, if out of range
 * Valid at constant speed.
 * Source: definition; docs/science/scanning.md
 */
export function interactionTime(spotDiameterUm: number, speedMmPerS: number): number {
  requirePositive({ spotDiameterUm, speedMmPerS });
  return (spotDiameterUm / speedMmPerS) * US_PER_UM_PER_MM_PER_S;
}
