import { requirePositive } from '../arguments/require-positive';
import { requireWhole } from '../arguments/require-whole';
import type { DerivedNumber } from '../exposure/derived/derived-number';
import { indexNumbers } from './set-up/index-numbers';
import type { PartOptics, RoundPart } from './set-up/round-part';
import { type StripLimit, stripOf } from './set-up/strip-numbers';
import { taperNumbers } from './set-up/taper-numbers';
import { wrapNumbers, wrapOf } from './set-up/wrap-numbers';

export type RoundPartSetUp = {
  /** The artwork is mirrored, once, in one place: an inner surface turns the other way under the beam. */
  readonly isMirrored: boolean;
  /** What ends the widest strip; null where no strip is known. */
  readonly stripLimit: StripLimit | null;
  readonly numbers: readonly DerivedNumber[];
};

/**
 * All measures that set a round part up on a rotary axis: wrap and artwork, the strip that stays in focus, index steps, cone.
 *          formulas in each entry
 *
 * @param part    part and artwork, mm and degrees, finite, > 0 (a wall may be 0, a seam has either sign); an allowance is a share in
 *                (0, 1), steepestEdgeDeg in (0, 90), indexSteps and stepsPerTurn whole
 * @param optics  spot as in derivedNumbers, focus offsets of the mark steps (none: in focus), side of the marking field
 * @returns the same keys in the same order for every part. What an unknown or the shape rules out has no value but `missingBecause`
 * @throws RangeError naming the argument and its value, if out of range: a wall of half the diameter, a small end larger than the
 *         large one, artwork longer than the surface, a gap as long as the circumference
 * Valid as each entry's formula. On a cone the strip is worked out at the wider end of the artwork, with the part tilted so that the
 * marked line lies level. Whether the head reaches into a part is not judged.
 * Source: plane geometry, ISO 11146-1; docs/science/round-parts.md
 */
export function roundPartSetUp(part: RoundPart, optics: PartOptics): RoundPartSetUp {
  requireRanges(part);
  const wrap = wrapOf(part);
  const strip = stripOf(part, optics, wrap);
  return {
    isMirrored: part.side === 'inside',
    stripLimit: 'limit' in strip.widest ? strip.widest.limit : null,
    numbers: [...wrapNumbers(part, wrap), ...strip.numbers, ...indexNumbers(part, wrap, strip), ...taperNumbers(part)],
  };
}

function requireRanges({ lengthMm, artworkHeightMm, artwork, allowance, steepestEdgeDeg, indexSteps, stepsPerTurn }: RoundPart): void {
  requirePositive({ lengthMm, artworkHeightMm, allowanceShare: allowance.share });
  if ('widthMm' in artwork) requirePositive({ artworkWidthMm: artwork.widthMm });
  if (allowance.share >= 1) throw new RangeError(`allowanceShare must be below 1, but is ${allowance.share}`);
  if (steepestEdgeDeg !== undefined) {
    requirePositive({ steepestEdgeDeg });
    if (steepestEdgeDeg >= 90) throw new RangeError(`steepestEdgeDeg must be below 90, but is ${steepestEdgeDeg}`);
  }
  if (indexSteps !== undefined) requireWhole({ indexSteps });
  if (stepsPerTurn !== undefined) requireWhole({ stepsPerTurn });
}
