import { requireFinite } from '../arguments/require-finite';
import { requirePositive } from '../arguments/require-positive';

export type FocusReach = {
  /** How far the surface may rise towards the lens. */
  readonly towardsLensMm: number;
  /** How far it may fall away from the lens. */
  readonly awayFromLensMm: number;
};

/**
 * How far a surface may leave its distance from the focal plane until the spot's area has changed by a given factor, up or down.
 *          |t| <= sqrt(k (1 + t0^2) - 1) and, where it is real, |t| >= sqrt((1 + t0^2)/k - 1), with t = z/zR on the side of t0 = z0/zR
 *
 * @param rayleighLengthMm  Rayleigh length zR, mm, finite, > 0
 * @param focusOffsetMm     distance z0 of the surface from the focal plane, mm, finite; positive: farther from the lens
 * @param areaFactor        largest change k of the spot's area, finite, > 1: (1 + p)^2 for a growth p, 1/(1 - q) for a fluence loss q
 * @returns way towards the lens and away from it, mm; in focus both are half of depthForSpotGrowth or depthForFluenceLoss
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a paraxial Gaussian beam without astigmatism.
 * Source: ISO 11146-1, solved for z; docs/science/round-parts.md
 */
export function focusReach(rayleighLengthMm: number, focusOffsetMm: number, areaFactor: number): FocusReach {
  requirePositive({ rayleighLengthMm, areaFactor });
  requireFinite({ focusOffsetMm });
  if (areaFactor <= 1) throw new RangeError(`areaFactor must be above 1, but is ${areaFactor}`);
  const offset = Math.abs(focusOffsetMm) / rayleighLengthMm;
  const area = 1 + offset ** 2;
  const outer = Math.sqrt(areaFactor * area - 1);
  // Differences of near numbers as quotients: no cancellation far out of focus.
  const outwards = ((areaFactor - 1) * area) / (outer + offset);
  const innerSquared = area / areaFactor - 1;
  const inwards = innerSquared > 0 ? ((1 - 1 / areaFactor) * area) / (offset + Math.sqrt(innerSquared)) : offset + outer;
  const [away, towards] = focusOffsetMm >= 0 ? [outwards, inwards] : [inwards, outwards];
  return { towardsLensMm: towards * rayleighLengthMm, awayFromLensMm: away * rayleighLengthMm };
}
