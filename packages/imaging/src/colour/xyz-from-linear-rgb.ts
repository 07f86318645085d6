import { requireWithin } from '../arguments/require-within';
import type { LinearRgb, Xyz } from './colour';

/** sRGB primaries and white as exact ratios: the four decimals in print shift saturated colours by up to 0.02 in a* and b*. */
const X_ROW = [506752 / 1228815, 87881 / 245763, 12673 / 70218] as const;
const Y_ROW = [87098 / 409605, 175762 / 245763, 12673 / 175545] as const;
const Z_ROW = [7918 / 409605, 87881 / 737289, 1001167 / 1053270] as const;

/**
 * Tristimulus values of linear sRGB light.          (X, Y, Z) = M (R, G, B), white D65
 *
 * @param light  linear light, finite; below 0 or above 1 for colours beyond sRGB
 * @returns CIE 1931 XYZ, 2° observer, Y = 1 for white
 * @throws RangeError naming the channel and its value, if not finite
 * Valid for the primaries of sRGB (ITU-R BT.709) and D65.
 * Source: IEC 61966-2-1, matrix worked out from the chromaticities; docs/science/colour.md
 */
export function xyzFromLinearRgb({ red, green, blue }: LinearRgb): Xyz {
  requireWithin(Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY, { red, green, blue });
  const sum = (row: readonly [number, number, number]) => row[0] * red + row[1] * green + row[2] * blue;
  return { x: sum(X_ROW), y: sum(Y_ROW), z: sum(Z_ROW) };
}
