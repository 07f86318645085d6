import { requirePositive } from '../arguments/require-positive';
import { requireWithin } from '../arguments/require-within';
import type { Lab, Xyz } from './colour';
import { COLOUR_WHITE } from './white-point';

const EPSILON = 216 / 24389;
const KAPPA = 24389 / 27;

/**
 * CIELAB of tristimulus values.          L* = 116 f(Y/Yn) - 16; a* = 500 (f(X/Xn) - f(Y/Yn)); b* = 200 (f(Y/Yn) - f(Z/Zn))
 *          f(t) = t^(1/3) for t > 216/24389, else (24389/27 t + 16)/116
 *
 * @param colour  X, Y, Z, finite, scaled like the white
 * @param white   X, Y, Z of white, finite, > 0; COLOUR_WHITE unless said
 * @returns L*a*b* for that white
 * @throws RangeError naming the argument and its value, if out of range
 * Valid when colour and white were seen under the same light.
 * Source: CIE 15, ISO/CIE 11664-4, with the exact ratios; docs/science/colour.md
 */
export function labFromXyz({ x, y, z }: Xyz, white: Xyz = COLOUR_WHITE): Lab {
  requireWithin(Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY, { x, y, z });
  requirePositive({ whiteX: white.x, whiteY: white.y, whiteZ: white.z });
  const fx = compressed(x / white.x);
  const fy = compressed(y / white.y);
  const fz = compressed(z / white.z);
  return { lightness: 116 * fy - 16, a: 500 * (fx - fy), b: 200 * (fy - fz) };
}

function compressed(share: number): number {
  return share > EPSILON ? Math.cbrt(share) : (KAPPA * share + 16) / 116;
}
