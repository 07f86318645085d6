import { requireFinite } from '../arguments/require-finite';
import { requirePositive } from '../arguments/require-positive';

export type FlatGraphicPoint = {
  /** Arc at which a point sent to x lands. */
  readonly arcMm: number;
  /** Place to send a point to, so that it lands at the arc x. */
  readonly compensatedMm: number;
  readonly localStretch: number;
  readonly fluenceFactor: number;
};

/**
 * A point of a flat graphic projected straight down on a cylinder.
 *          arc = R asin(x/R); x' = R sin(x/R); stretch 1/sqrt(1 - (x/R)^2); fluence factor sqrt(1 - (x/R)^2)
 *
 * @param radiusMm  radius R, mm, finite, > 0
 * @param offsetMm  distance x from the crown, mm, finite, |x| < R
 * @returns arc and compensated place, mm; stretch and fluence factor at x
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a beam parallel to the normal on the crown.
 * Source: plane geometry; docs/science/round-parts.md
 */
export function flatGraphicOnCylinder(radiusMm: number, offsetMm: number): FlatGraphicPoint {
  requirePositive({ radiusMm });
  requireFinite({ offsetMm });
  if (Math.abs(offsetMm) >= radiusMm) throw new RangeError(`offsetMm must lie inside the radius of ${radiusMm}, but is ${offsetMm}`);
  const ratio = offsetMm / radiusMm;
  const fluenceFactor = Math.sqrt((1 - ratio) * (1 + ratio));
  return {
    arcMm: radiusMm * Math.asin(ratio),
    compensatedMm: radiusMm * Math.sin(ratio),
    localStretch: 1 / fluenceFactor,
    fluenceFactor,
  };
}
