import { requirePositive } from '../arguments/require-positive';
import { requireWhole } from '../arguments/require-whole';

const UM_PER_MM = 1000;

/**
 * Way of the surface for one step of a rotary axis.          step = pi D / n
 *
 * @param diameterMm          diameter D of the part, mm, finite, > 0
 * @param stepsPerRevolution  steps n of one turn, gear included, whole, >= 1
 * @returns step at the surface, um
 * @throws RangeError naming the argument and its value, if out of range
 * Valid without slip and backlash.
 * Source: plane geometry; docs/science/round-parts.md
 */
export function rotaryResolution(diameterMm: number, stepsPerRevolution: number): number {
  requirePositive({ diameterMm });
  requireWhole({ stepsPerRevolution });
  return (Math.PI * diameterMm * UM_PER_MM) / stepsPerRevolution;
}
