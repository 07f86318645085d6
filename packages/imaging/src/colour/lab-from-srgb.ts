import type { Lab, Srgb } from './colour';
import { labFromXyz } from './lab-from-xyz';
import { linearFromSrgb } from './linear-from-srgb';
import { xyzFromLinearRgb } from './xyz-from-linear-rgb';

/**
 * CIELAB of an sRGB colour.          labFromXyz(xyzFromLinearRgb(linearFromSrgb(colour)))
 *
 * @param colour  sRGB code values, each 0 to 255
 * @returns L*a*b* for COLOUR_WHITE (D65, 2° observer)
 * @throws RangeError naming the channel and its value, if out of range
 * Valid as far as the picture is: a camera's colours are an estimate until a reference card in the same picture corrects them.
 * Source: IEC 61966-2-1, CIE 15; docs/science/colour.md
 */
export function labFromSrgb(colour: Srgb): Lab {
  return labFromXyz(xyzFromLinearRgb(linearFromSrgb(colour)));
}
