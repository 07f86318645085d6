import { couponLayout, type RectMm } from '@proofplate/imaging';

export type Point = { readonly x: number; readonly y: number };
/** A part of the upright picture, as fractions of its width and height. */
export type Cut = { readonly x: number; readonly y: number; readonly width: number; readonly height: number };
export type Plate = {
  readonly rows: number;
  readonly columns: number;
  readonly cellMm: number;
  readonly gapMm: number;
  readonly rowIndex: number;
  readonly columnIndex: number;
};

/** Bare ground around the cell, in cells: an eye judges a mark against what it stands on. */
const GROUND_AROUND_CELL = 0.2;

/**
 * Where a cell lies in a photo of its plate, with a rim of bare ground.
 *
 * @param corners plate corners clockwise from the origin mark, as fractions of the upright picture
 * @returns smallest upright rectangles around the cell, the cell with its rim, and the plate; undefined for corners that outline no plate
 */
export function cellCut(plate: Plate, corners: readonly Point[]): { cell: Cut; withGround: Cut; plate: Cut } | undefined {
  const { rows, columns, cellMm, gapMm, rowIndex, columnIndex } = plate;
  const layout = couponLayout({ rows, columns, cellMm, gapMm, reference: '-' });
  const place = projection(corners);
  const rect = layout.cells.find(({ row, column }) => row === rowIndex && column === columnIndex)?.rect;
  if (place === undefined || rect === undefined) return undefined;
  const { widthMm, heightMm } = layout.plate;
  const around = (area: RectMm) => boundsOf(cornersOf(area).map(({ x, y }) => place({ x: x / widthMm, y: y / heightMm })));
  return {
    cell: around(rect),
    withGround: around(grown(rect, GROUND_AROUND_CELL * cellMm)),
    plate: boundsOf(corners),
  };
}

/**
 * Projective map of the unit square onto four corners.
 * Source: P. Heckbert, Fundamentals of Texture Mapping and Image Warping, 1989, 2.2.3
 */
function projection(corners: readonly Point[]): ((point: Point) => Point) | undefined {
  const [a, b, c, d] = corners;
  if (a === undefined || b === undefined || c === undefined || d === undefined) return undefined;
  const [dx1, dx2, sx] = [b.x - c.x, d.x - c.x, a.x - b.x + c.x - d.x];
  const [dy1, dy2, sy] = [b.y - c.y, d.y - c.y, a.y - b.y + c.y - d.y];
  const determinant = dx1 * dy2 - dx2 * dy1;
  if (determinant === 0) return undefined;
  const g = (sx * dy2 - dx2 * sy) / determinant;
  const h = (dx1 * sy - sx * dy1) / determinant;
  return ({ x: u, y: v }) => {
    const w = g * u + h * v + 1;
    return {
      x: ((b.x - a.x + g * b.x) * u + (d.x - a.x + h * d.x) * v + a.x) / w,
      y: ((b.y - a.y + g * b.y) * u + (d.y - a.y + h * d.y) * v + a.y) / w,
    };
  };
}

function cornersOf({ xMm, yMm, widthMm, heightMm }: RectMm): Point[] {
  const [right, bottom] = [xMm + widthMm, yMm + heightMm];
  return [
    { x: xMm, y: yMm },
    { x: right, y: yMm },
    { x: right, y: bottom },
    { x: xMm, y: bottom },
  ];
}

function grown({ xMm, yMm, widthMm, heightMm }: RectMm, byMm: number): RectMm {
  return { xMm: xMm - byMm, yMm: yMm - byMm, widthMm: widthMm + 2 * byMm, heightMm: heightMm + 2 * byMm };
}

function boundsOf(points: readonly Point[]): Cut {
  const [xs, ys] = [points.map(({ x }) => x), points.map(({ y }) => y)];
  const [x, y] = [Math.min(...xs), Math.min(...ys)];
  return { x, y, width: Math.max(...xs) - x, height: Math.max(...ys) - y };
}
