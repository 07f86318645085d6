import { requireWithin } from '../arguments/require-within';
import type { LinearRgb, Srgb } from './colour';

const FULL_SCALE = 255;
const LINEAR_UP_TO = 0.04045;

/**
 * Linear light of an sRGB colour.          c <= 0.04045: c/12.92, else ((c + 0.055)/1.055)^2.4, c = code/255
 *
 * @param colour  sRGB code values, each 0 to 255
 * @returns linear light, each channel 0 to 1
 * @throws RangeError naming the channel and its value, if out of range
 * Valid for pictures in sRGB; one in another colour space is converted first.
 * Source: IEC 61966-2-1; docs/science/colour.md
 */
export function linearFromSrgb({ red, green, blue }: Srgb): LinearRgb {
  requireWithin(0, FULL_SCALE, { red, green, blue });
  return { red: decoded(red), green: decoded(green), blue: decoded(blue) };
}

function decoded(code: number): number {
  const share = code / FULL_SCALE;
  return share <= LINEAR_UP_TO ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
}
