// Taken out of Math once: the look-up of a global costs more than the call where a test runner wraps it.
const { cbrt, max, min, round } = Math;

export type Lab = readonly [lightness: number, a: number, b: number];
export type LinearRgb = readonly [red: number, green: number, blue: number];

/** CIE standard illuminant D65, 2 degree observer, the white of sRGB. */
const WHITE = [0.95047, 1, 1.08883] as const;
const EPSILON = 6 / 29;
const ENCODE_STEPS = 4096;

/** CIELAB (D65) to linear sRGB, clipped to what a picture can hold. Source: IEC 61966-2-1; ISO/CIE 11664-4. */
export function labToLinearRgb([lightness, a, b]: Lab): LinearRgb {
  const fy = (lightness + 16) / 116;
  const x = WHITE[0] * decompress(fy + a / 500);
  const y = WHITE[1] * decompress(fy);
  const z = WHITE[2] * decompress(fy - b / 200);
  return [
    clip(3.2404542 * x - 1.5371385 * y - 0.4985314 * z),
    clip(-0.969266 * x + 1.8760108 * y + 0.041556 * z),
    clip(0.0556434 * x - 0.2040259 * y + 1.0572252 * z),
  ];
}

/** Linear sRGB to CIELAB (D65). Source: IEC 61966-2-1; ISO/CIE 11664-4. */
export function linearRgbToLab([red, green, blue]: LinearRgb): Lab {
  const fx = compress((0.4124564 * red + 0.3575761 * green + 0.1804375 * blue) / WHITE[0]);
  const fy = compress((0.2126729 * red + 0.7151522 * green + 0.072175 * blue) / WHITE[1]);
  const fz = compress((0.0193339 * red + 0.119192 * green + 0.9503041 * blue) / WHITE[2]);
  return [116 * fy - 16, 500 * (fx - fy), 200 * (fy - fz)];
}

/** Luminance factor of a lightness, 0 to 1. */
export function luminanceOf(lightness: number): number {
  return decompress((lightness + 16) / 116);
}

const ENCODED = Uint8ClampedArray.from({ length: ENCODE_STEPS + 1 }, (_, step) => {
  const value = step / ENCODE_STEPS;
  return 255 * (value <= 0.0031308 ? 12.92 * value : 1.055 * value ** (1 / 2.4) - 0.055);
});

/** Linear light 0 to 1 to an sRGB code value, through a table (a photograph has two million of them). */
export function encodeSrgb(linear: number): number {
  return ENCODED[round(clip(linear) * ENCODE_STEPS)] ?? 0;
}

function compress(t: number): number {
  return t > EPSILON ** 3 ? cbrt(t) : t / (3 * EPSILON ** 2) + 4 / 29;
}

function decompress(t: number): number {
  return t > EPSILON ? t ** 3 : 3 * EPSILON ** 2 * (t - 4 / 29);
}

function clip(value: number): number {
  return min(1, max(0, value));
}
