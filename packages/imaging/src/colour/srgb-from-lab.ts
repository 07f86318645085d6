import { requireWithin } from '../arguments/require-within';
import type { Lab, Srgb } from './colour';
import { COLOUR_WHITE } from './white-point';

const EDGE = 6 / 29;
const KAPPA = 24389 / 27;
const FULL_SCALE = 255;
const LINEAR_UP_TO = 0.0031308;
/** Inverse of the matrix of xyzFromLinearRgb, in exact ratios as well. */
const RED_ROW = [12831 / 3959, -329 / 214, -1974 / 3959] as const;
const GREEN_ROW = [-851781 / 878810, 1648619 / 878810, 36519 / 878810] as const;
const BLUE_ROW = [705 / 12673, -2585 / 12673, 705 / 667] as const;

/**
 * sRGB colour that shows a measured colour: inverse of labFromSrgb.          Y = Yn f^-1((L* + 16)/116), X and Z alike; then encoded
 *
 * @param colour  L*a*b* for COLOUR_WHITE (D65, 2° observer), finite
 * @returns sRGB code values, each 0 to 255, not rounded; what a screen cannot show is cut to its nearest channel values
 * @throws RangeError naming the value, if not finite
 * Valid for colours within sRGB; a cut one shows neither hue nor lightness truly.
 * Source: CIE 15, IEC 61966-2-1; docs/science/colour.md
 */
export function srgbFromLab({ lightness, a, b }: Lab): Srgb {
  requireWithin(Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY, { lightness, a, b });
  const fy = (lightness + 16) / 116;
  const xyz = [COLOUR_WHITE.x * expanded(fy + a / 500), COLOUR_WHITE.y * expanded(fy), COLOUR_WHITE.z * expanded(fy - b / 200)] as const;
  const channel = (row: readonly [number, number, number]) => encoded(row[0] * xyz[0] + row[1] * xyz[1] + row[2] * xyz[2]);
  return { red: channel(RED_ROW), green: channel(GREEN_ROW), blue: channel(BLUE_ROW) };
}

function expanded(f: number): number {
  return f > EDGE ? f ** 3 : (116 * f - 16) / KAPPA;
}

function encoded(light: number): number {
  const share = light <= LINEAR_UP_TO ? 12.92 * light : 1.055 * light ** (1 / 2.4) - 0.055;
  return FULL_SCALE * Math.min(1, Math.max(0, share));
}
