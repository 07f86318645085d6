import { requirePositive } from '../arguments/require-positive';
import { requireWithin } from '../arguments/require-within';
import type { Lab } from './colour';

/** Weights of the viewing conditions; 1 each under the reference conditions. */
export type DifferenceWeights = { readonly kL?: number; readonly kC?: number; readonly kH?: number };

/** Hues that are exactly opposite must stay so whatever the last binary digit says: the mean hue flips there. */
const HUE_ROUNDING_DEG = 1e-12;
const DEG = Math.PI / 180;
const CHROMA_25_POWER_7 = 25 ** 7;

/**
 * CIEDE2000 difference of two colours.
 *          dE00 = sqrt((dL'/kL SL)^2 + (dC'/kC SC)^2 + (dH'/kH SH)^2 + RT (dC'/kC SC)(dH'/kH SH))
 *
 * @param one      L*a*b*, finite
 * @param other    L*a*b* for the same white, finite
 * @param weights  kL, kC, kH, finite, > 0; 1 unless said
 * @returns colour difference dE00; the same in either order
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for differences of a few units, which it was fitted to; larger ones rank, no more. Only two colours of one picture or one
 * instrument are comparable.
 * Source: ISO/CIE 11664-6; Sharma, Wu, Dalal, Color Res. Appl. 30 (2005) 21; docs/science/colour.md
 */
export function colourDifference2000(one: Lab, other: Lab, { kL = 1, kC = 1, kH = 1 }: DifferenceWeights = {}): number {
  requireColours(one, other);
  requirePositive({ kL, kC, kH });
  const [from, to] = stretched(one, other);
  const turnDeg = hueTurn(from, to);
  const deltaChroma = to.chroma - from.chroma;
  const deltaHue = 2 * Math.sqrt(from.chroma * to.chroma) * Math.sin((turnDeg * DEG) / 2);
  const meanLightness = (one.lightness + other.lightness) / 2;
  const meanChroma = (from.chroma + to.chroma) / 2;
  const meanHueDeg = meanHue(from, to);
  const fromMiddle = (meanLightness - 50) ** 2;
  const lightnessPart = (other.lightness - one.lightness) / (kL * (1 + (0.015 * fromMiddle) / Math.sqrt(20 + fromMiddle)));
  const chromaPart = deltaChroma / (kC * (1 + 0.045 * meanChroma));
  const huePart = deltaHue / (kH * (1 + 0.015 * meanChroma * hueWeight(meanHueDeg)));
  const turned = rotation(meanHueDeg, meanChroma) * chromaPart * huePart;
  return Math.sqrt(lightnessPart ** 2 + chromaPart ** 2 + huePart ** 2 + turned);
}

type Polar = { readonly chroma: number; readonly hueDeg: number };

/** a* stretched near the grey axis, then chroma and hue. */
function stretched(one: Lab, other: Lab): readonly [Polar, Polar] {
  const meanChroma = (Math.hypot(one.a, one.b) + Math.hypot(other.a, other.b)) / 2;
  const stretch = 1 + 0.5 * (1 - saturation(meanChroma));
  return [polar(stretch * one.a, one.b), polar(stretch * other.a, other.b)];
}

function polar(a: number, b: number): Polar {
  const angleDeg = Math.atan2(b, a) / DEG;
  return { chroma: Math.hypot(a, b), hueDeg: angleDeg < 0 ? angleDeg + 360 : angleDeg };
}

/** Way from one hue to the other, -180 to 180; none where one of them is grey. */
function hueTurn(from: Polar, to: Polar): number {
  if (from.chroma * to.chroma === 0) return 0;
  const wayDeg = to.hueDeg - from.hueDeg;
  if (Math.abs(wayDeg) <= 180 + HUE_ROUNDING_DEG) return wayDeg;
  return wayDeg > 0 ? wayDeg - 360 : wayDeg + 360;
}

function meanHue(from: Polar, to: Polar): number {
  const sumDeg = from.hueDeg + to.hueDeg;
  if (from.chroma * to.chroma === 0) return sumDeg;
  if (Math.abs(from.hueDeg - to.hueDeg) <= 180 + HUE_ROUNDING_DEG) return sumDeg / 2;
  return sumDeg < 360 ? (sumDeg + 360) / 2 : (sumDeg - 360) / 2;
}

function hueWeight(hueDeg: number): number {
  const cosine = (factor: number, offsetDeg: number) => Math.cos((factor * hueDeg + offsetDeg) * DEG);
  return 1 - 0.17 * cosine(1, -30) + 0.24 * cosine(2, 0) + 0.32 * cosine(3, 6) - 0.2 * cosine(4, -63);
}

/** Turns the tolerance ellipses of blue. */
function rotation(hueDeg: number, chroma: number): number {
  const angleDeg = 30 * Math.exp(-(((hueDeg - 275) / 25) ** 2));
  return -2 * saturation(chroma) * Math.sin(2 * angleDeg * DEG);
}

function saturation(chroma: number): number {
  const power = chroma ** 7;
  return Math.sqrt(power / (power + CHROMA_25_POWER_7));
}

function requireColours(one: Lab, other: Lab): void {
  const named = {
    oneLightness: one.lightness,
    oneA: one.a,
    oneB: one.b,
    otherLightness: other.lightness,
    otherA: other.a,
    otherB: other.b,
  };
  requireWithin(Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY, named);
}
