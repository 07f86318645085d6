export type PointMm = { readonly xMm: number; readonly yMm: number };

/** Glyphs stand on a raster 8 wide and 12 high; two glyphs are 3 apart. */
const GLYPH_WIDTH = 8;
const GLYPH_HEIGHT = 12;
const GLYPH_SPACING = 3;

/**
 * Own single-line capitals, so that the artwork needs no font on the machine. A point is two hexadecimal digits, x then y
 * (y down); a bar lifts the pen.
 */
const STROKES: Readonly<Record<string, string>> = {
  A: '0c 40 8c|19 79',
  B: '0c 00 60 82 84 66 06|66 88 8a 6c 0c',
  C: '82 60 20 02 0a 2c 6c 8a',
  D: '0c 00 50 83 89 5c 0c',
  E: '80 00 0c 8c|06 66',
  F: '80 00 0c|06 66',
  G: '82 60 20 02 0a 2c 6c 8a 87 57',
  H: '00 0c|80 8c|06 86',
  I: '20 60|40 4c|2c 6c',
  J: '80 8a 6c 2c 0a',
  K: '00 0c|80 08|35 8c',
  L: '00 0c 8c',
  M: '0c 00 46 80 8c',
  N: '0c 00 8c 80',
  O: '20 60 82 8a 6c 2c 0a 02 20',
  P: '0c 00 60 82 84 66 06',
  Q: '20 60 82 8a 6c 2c 0a 02 20|59 8c',
  R: '0c 00 60 82 84 66 06|46 8c',
  S: '82 60 20 02 04 26 66 88 8a 6c 2c 0a',
  T: '00 80|40 4c',
  U: '00 0a 2c 6c 8a 80',
  V: '00 4c 80',
  W: '00 2c 46 6c 80',
  X: '00 8c|80 0c',
  Y: '00 46 80|46 4c',
  Z: '00 80 0c 8c',
  '0': '30 50 72 7a 5c 3c 1a 12 30',
  '1': '22 40 4c|2c 6c',
  '2': '02 20 60 82 84 0c 8c',
  '3': '02 20 60 82 84 66 36|66 88 8a 6c 2c 0a',
  '4': '6c 60 08 88',
  '5': '80 00 05 65 87 8a 6c 2c 0a',
  '6': '60 30 04 0a 2c 6c 8a 88 66 26 08',
  '7': '00 80 3c',
  '8': '20 60 82 84 66 26 04 02 20|26 08 0a 2c 6c 8a 88 66',
  '9': '2c 5c 88 82 60 20 02 04 26 66 84',
  '-': '16 76',
};

/**
 * Width of a line of lettering.                                 w = h (8 n + 3 (n - 1)) / 12
 *
 * @param text     1 or more of A to Z, 0 to 9 and hyphen
 * @param heightMm height of the capitals, mm, finite, > 0
 * @returns width from the first to the last glyph's box, mm
 * @throws RangeError if the text is empty or holds a character without a glyph, or the height is out of range
 * Source: own lettering
 */
export function letteringWidthMm(text: string, heightMm: number): number {
  requireLettering(text, heightMm);
  return (heightMm * (text.length * (GLYPH_WIDTH + GLYPH_SPACING) - GLYPH_SPACING)) / GLYPH_HEIGHT;
}

/**
 * Pen strokes of a line of lettering, box at the origin: x 0 to letteringWidthMm, y 0 to heightMm downwards.
 *
 * @param text     1 or more of A to Z, 0 to 9 and hyphen
 * @param heightMm height of the capitals, mm, finite, > 0
 * @returns polylines of two or more points, mm
 * @throws RangeError if the text is empty or holds a character without a glyph, or the height is out of range
 * Source: own lettering
 */
export function letteringStrokesMm(text: string, heightMm: number): readonly (readonly PointMm[])[] {
  requireLettering(text, heightMm);
  const unitMm = heightMm / GLYPH_HEIGHT;
  return [...text].flatMap((glyph, index) => {
    const offset = index * (GLYPH_WIDTH + GLYPH_SPACING);
    return STROKES[glyph].split('|').map((stroke) => stroke.split(' ').map((point) => place(point, offset, unitMm)));
  });
}

function place(point: string, offset: number, unitMm: number): PointMm {
  return { xMm: (offset + Number.parseInt(point.slice(0, 1), 16)) * unitMm, yMm: Number.parseInt(point.slice(1), 16) * unitMm };
}

function requireLettering(text: string, heightMm: number): void {
  const missing = [...text].find((glyph) => !Object.hasOwn(STROKES, glyph));
  if (text === '' || missing !== undefined) {
    throw new RangeError(`text must be letters A to Z, digits and hyphens, got ${JSON.stringify(text)}`);
  }
  if (!(heightMm > 0 && Number.isFinite(heightMm))) {
    throw new RangeError(`heightMm must be a finite number above 0, got ${heightMm}`);
  }
}
