import { requireWithin } from '../arguments/require-within';
import type { Lab } from './colour';

/**
 * Plain distance of two colours in L*a*b*.          dE*ab = sqrt(dL^2 + da^2 + db^2)
 *
 * @param one    L*a*b*, finite
 * @param other  L*a*b* for the same white, finite
 * @returns CIE 1976 colour difference dE*ab; not comparable with colourDifference2000
 * @throws RangeError naming the value, if not finite
 * Valid as a distance; it overrates differences of saturated colours.
 * Source: CIE 15, ISO/CIE 11664-4; docs/science/colour.md
 */
export function colourDifference76(one: Lab, other: Lab): number {
  requireWithin(Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY, { oneLightness: one.lightness, oneA: one.a, oneB: one.b });
  requireWithin(Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY, { otherLightness: other.lightness, otherA: other.a, otherB: other.b });
  return Math.hypot(one.lightness - other.lightness, one.a - other.a, one.b - other.b);
}
