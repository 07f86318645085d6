import { requirePositive } from '../arguments/require-positive';

export type TaperDevelopment = {
  readonly slantMm: number;
  readonly halfAngleDeg: number;
  readonly sectorDeg: number;
  /** Radii of the flat ring sector; null for a cylinder, which unrolls to a rectangle. */
  readonly smallRadiusMm: number | null;
  readonly largeRadiusMm: number | null;
};

/**
 * Flat development of a tapered part.          l = sqrt((r2 - r1)^2 + H^2); sector = 360 (r2 - r1)/l; R = r l/(r2 - r1)
 *
 * @param smallEndRadiusMm  radius r1 of the small end, mm, finite, > 0
 * @param largeEndRadiusMm  radius r2 of the large end, mm, finite, >= r1
 * @param heightMm          height H, mm, finite, > 0
 * @returns slant length and radii of the sector, mm; half angle of the cone and angle of the sector, deg
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a frustum of a right cone.
 * Source: plane geometry; docs/science/round-parts.md
 */
export function taperDevelopment(smallEndRadiusMm: number, largeEndRadiusMm: number, heightMm: number): TaperDevelopment {
  requirePositive({ smallEndRadiusMm, largeEndRadiusMm, heightMm });
  const growthMm = largeEndRadiusMm - smallEndRadiusMm;
  if (growthMm < 0) throw new RangeError(`largeEndRadiusMm must be at least ${smallEndRadiusMm}, but is ${largeEndRadiusMm}`);
  const slantMm = Math.hypot(growthMm, heightMm);
  return {
    slantMm,
    halfAngleDeg: (Math.atan2(growthMm, heightMm) * 180) / Math.PI,
    sectorDeg: (360 * growthMm) / slantMm,
    smallRadiusMm: growthMm === 0 ? null : (smallEndRadiusMm * slantMm) / growthMm,
    largeRadiusMm: growthMm === 0 ? null : (largeEndRadiusMm * slantMm) / growthMm,
  };
}
