import type { RectMm } from '@proofplate/imaging';

/** A point as fractions of the upright picture. */
export type PhotoPoint = { x: number; y: number };

/** Row-major 3 × 3. */
type Matrix = readonly [number, number, number, number, number, number, number, number, number];

export type FlatView = {
  /** Corners of the plate in the picture, clockwise from the origin mark. */
  corners: readonly [PhotoPoint, PhotoPoint, PhotoPoint, PhotoPoint];
  plate: { widthMm: number; heightMm: number };
  /** The part of the plate that is shown. */
  region: RectMm;
  pxPerMm: number;
  /** Size in which the picture element is laid out, before the transform. */
  picturePx: { width: number; height: number };
};

/**
 * The CSS transform that lays a tilted photograph of a plate flat, so that the region fills a box of `region × pxPerMm` pixels.
 * Undefined where the corners do not span an area.
 */
export function flatteningTransform({ corners, plate, region, pxPerMm, picturePx }: FlatView): string | undefined {
  const toPlate = inverted(squareToCorners(corners));
  if (toPlate === undefined) return undefined;
  const fromPicture: Matrix = [1 / picturePx.width, 0, 0, 0, 1 / picturePx.height, 0, 0, 0, 1];
  const toBox: Matrix = [plate.widthMm * pxPerMm, 0, -region.xMm * pxPerMm, 0, plate.heightMm * pxPerMm, -region.yMm * pxPerMm, 0, 0, 1];
  const [a, b, c, d, e, f, g, h, i] = product(toBox, product(toPlate, fromPicture));
  if (![a, b, c, d, e, f, g, h, i].every(Number.isFinite) || i === 0) return undefined;
  // CSS counts by columns and has a third dimension, which stays as it is.
  const columns = [a, d, 0, g, b, e, 0, h, 0, 0, 1, 0, c, f, 0, i].map((entry) => Number((entry / i).toPrecision(9)));
  return `matrix3d(${columns.join(', ')})`;
}

/** Where a point of the picture lies on the plate, mm; for checks of the transform above. */
export function plateCoordinates(
  point: PhotoPoint,
  { corners, plate }: Pick<FlatView, 'corners' | 'plate'>,
): { xMm: number; yMm: number } | undefined {
  const matrix = inverted(squareToCorners(corners));
  if (matrix === undefined) return undefined;
  const [a, b, c, d, e, f, g, h, i] = matrix;
  const weight = g * point.x + h * point.y + i;
  return {
    xMm: ((a * point.x + b * point.y + c) / weight) * plate.widthMm,
    yMm: ((d * point.x + e * point.y + f) / weight) * plate.heightMm,
  };
}

/** Maps the unit square to four corners. Source: Heckbert, Fundamentals of texture mapping and image warping (1989), section 2.2.3. */
function squareToCorners([p0, p1, p2, p3]: FlatView['corners']): Matrix {
  const sumX = p0.x - p1.x + p2.x - p3.x;
  const sumY = p0.y - p1.y + p2.y - p3.y;
  const dx1 = p1.x - p2.x;
  const dy1 = p1.y - p2.y;
  const dx2 = p3.x - p2.x;
  const dy2 = p3.y - p2.y;
  const area = dx1 * dy2 - dx2 * dy1;
  const g = (sumX * dy2 - dx2 * sumY) / area;
  const h = (dx1 * sumY - sumX * dy1) / area;
  return [p1.x - p0.x + g * p1.x, p3.x - p0.x + h * p3.x, p0.x, p1.y - p0.y + g * p1.y, p3.y - p0.y + h * p3.y, p0.y, g, h, 1];
}

function inverted([a, b, c, d, e, f, g, h, i]: Matrix): Matrix | undefined {
  const determinant = a * (e * i - f * h) - b * (d * i - f * g) + c * (d * h - e * g);
  if (!Number.isFinite(determinant) || determinant === 0) return undefined;
  return [
    (e * i - f * h) / determinant,
    (c * h - b * i) / determinant,
    (b * f - c * e) / determinant,
    (f * g - d * i) / determinant,
    (a * i - c * g) / determinant,
    (c * d - a * f) / determinant,
    (d * h - e * g) / determinant,
    (b * g - a * h) / determinant,
    (a * e - b * d) / determinant,
  ];
}

function product(left: Matrix, right: Matrix): Matrix {
  const entry = (row: number, column: number) =>
    [0, 1, 2].reduce((sum, k) => sum + (left[row * 3 + k] ?? 0) * (right[k * 3 + column] ?? 0), 0);
  return [entry(0, 0), entry(0, 1), entry(0, 2), entry(1, 0), entry(1, 1), entry(1, 2), entry(2, 0), entry(2, 1), entry(2, 2)];
}
