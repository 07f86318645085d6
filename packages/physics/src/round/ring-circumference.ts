import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';

export type RingCircumference = {
  readonly outsideMm: number;
  readonly insideMm: number;
  readonly degreesPerMmOutside: number;
  readonly degreesPerMmInside: number;
};

/**
 * Circumference of a ring outside and inside, and the turn for one millimetre.          C = pi D; 360/(pi D); inside D - 2t
 *
 * @param outerDiameterMm  outer diameter D, mm, finite, > 0
 * @param wallMm           wall thickness t, mm, finite, 0 <= t < D/2
 * @returns circumferences, mm, and turns, deg/mm
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a round part. An inside mark turns the other way: mirror once, in one place.
 * Source: plane geometry; docs/science/round-parts.md
 */
export function ringCircumference(outerDiameterMm: number, wallMm: number): RingCircumference {
  requirePositive({ outerDiameterMm });
  requireAtLeast(0, { wallMm });
  if (wallMm >= outerDiameterMm / 2) throw new RangeError(`wallMm must be below half the diameter of ${outerDiameterMm}, but is ${wallMm}`);
  const outsideMm = Math.PI * outerDiameterMm;
  const insideMm = Math.PI * (outerDiameterMm - 2 * wallMm);
  return { outsideMm, insideMm, degreesPerMmOutside: 360 / outsideMm, degreesPerMmInside: 360 / insideMm };
}
