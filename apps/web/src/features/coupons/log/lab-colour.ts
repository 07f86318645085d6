/** CIE 1931, 2° observer, illuminant D65. */
const WHITE_D65 = [0.95047, 1, 1.08883] as const;
const EPSILON = 216 / 24389;
const KAPPA = 24389 / 27;
/** Linear sRGB from XYZ under D65; IEC 61966-2-1. */
const TO_RGB = [
  [3.2404542, -1.5371385, -0.4985314],
  [-0.969266, 1.8760108, 0.041556],
  [0.0556434, -0.2040259, 1.0572252],
] as const;

/** A measured colour as `#rrggbb`; what a screen cannot show is cut to its nearest channel values. */
export function labColour({ l, a, b }: { l: number; a: number; b: number }): string {
  const fy = (l + 16) / 116;
  const [whiteX, whiteY, whiteZ] = WHITE_D65;
  const x = whiteX * linear(fy + a / 500);
  const y = whiteY * (l > KAPPA * EPSILON ? fy ** 3 : l / KAPPA);
  const z = whiteZ * linear(fy - b / 200);
  const channels = TO_RGB.map(([toX, toY, toZ]) => channel(toX * x + toY * y + toZ * z));
  return `#${channels.map((value) => value.toString(16).padStart(2, '0')).join('')}`;
}

function linear(f: number): number {
  return f ** 3 > EPSILON ? f ** 3 : (116 * f - 16) / KAPPA;
}

function channel(value: number): number {
  const bent = value <= 0.0031308 ? 12.92 * value : 1.055 * value ** (1 / 2.4) - 0.055;
  return Math.round(255 * Math.min(1, Math.max(0, bent)));
}
