import { requirePositive } from '../arguments/require-positive';

export type ScanField = {
  /** Side when each mirror may use the full angle. */
  readonly sideMm: number;
  /** Side when the corner of the field is what reaches the full angle. */
  readonly diagonalLimitedSideMm: number;
  /** Side behind a plain lens, which images by the tangent, for comparison. */
  readonly plainLensSideMm: number;
};

const HIGHEST_ANGLE_DEG = 90;

/**
 * Side of the square field of an f-theta lens.          2 f theta; sqrt(2) f theta; plain lens 2 f tan(theta)
 *
 * @param focalLengthMm    focal length f, mm, finite, > 0
 * @param opticalAngleDeg  largest optical angle to either side, deg, 0 < angle < 90: twice the mechanical mirror angle
 * @returns sides, mm
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for the place of the spot; its size grows away from the axis, which is not in the formula.
 * Source: definition of an f-theta lens, y = f theta; docs/science/caustic.md
 */
export function scanField(focalLengthMm: number, opticalAngleDeg: number): ScanField {
  requirePositive({ focalLengthMm, opticalAngleDeg });
  if (opticalAngleDeg >= HIGHEST_ANGLE_DEG)
    throw new RangeError(`opticalAngleDeg must be below ${HIGHEST_ANGLE_DEG}, but is ${opticalAngleDeg}`);
  const angle = (opticalAngleDeg * Math.PI) / 180;
  return {
    sideMm: 2 * focalLengthMm * angle,
    diagonalLimitedSideMm: Math.SQRT2 * focalLengthMm * angle,
    plainLensSideMm: 2 * focalLengthMm * Math.tan(angle),
  };
}
