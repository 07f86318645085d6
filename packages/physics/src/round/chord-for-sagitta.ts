import { requirePositive } from '../arguments/require-positive';

/**
 * Widest field across which a round surface falls away by a given depth.          c = 2 sqrt(2 R s - s^2)
 *
 * @param radiusMm   radius R of the surface, mm, finite, > 0
 * @param sagittaMm  depth s, mm, finite, 0 < s <= R
 * @returns chord, mm
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a cylinder marked from above without turning.
 * Source: plane geometry; docs/science/round-parts.md
 */
export function chordForSagitta(radiusMm: number, sagittaMm: number): number {
  requirePositive({ radiusMm, sagittaMm });
  if (sagittaMm > radiusMm) throw new RangeError(`sagittaMm must be at most the radius of ${radiusMm}, but is ${sagittaMm}`);
  return 2 * Math.sqrt(sagittaMm * (2 * radiusMm - sagittaMm));
}
