export type Point = { readonly x: number; readonly y: number };
export type Matrix3 = readonly [number, number, number, number, number, number, number, number, number];

export type View = {
  readonly widthPx: number;
  readonly heightPx: number;
  /** Turn of the plate in the picture, degrees clockwise. */
  readonly turnDeg: number;
  /** Tilt of the camera about the horizontal and the vertical axis of the picture, degrees. */
  readonly tiltXDeg: number;
  readonly tiltYDeg: number;
  /** Share of the picture's smaller side that the plate may fill, 0 to 1. */
  readonly fill: number;
  /** Distance of the lens in plate diagonals: small means strong perspective. */
  readonly distance: number;
  /** Where the middle of the plate sits, as a shift in shares of the picture. */
  readonly shiftX: number;
  readonly shiftY: number;
};

/** Pinhole view of the flat plate: the matrix that takes plate millimetres to picture pixels. */
export function plateToPicture(widthMm: number, heightMm: number, view: View): Matrix3 {
  const raw = pinhole(widthMm, heightMm, view);
  const corners = plateCorners(widthMm, heightMm).map((corner) => project(raw, corner));
  const [left, right] = [Math.min(...corners.map((corner) => corner.x)), Math.max(...corners.map((corner) => corner.x))];
  const [top, bottom] = [Math.min(...corners.map((corner) => corner.y)), Math.max(...corners.map((corner) => corner.y))];
  const zoom = view.fill * Math.min(view.widthPx / (right - left), view.heightPx / (bottom - top));
  const moveX = view.widthPx * (0.5 + view.shiftX) - (zoom * (left + right)) / 2;
  const moveY = view.heightPx * (0.5 + view.shiftY) - (zoom * (top + bottom)) / 2;
  return multiply([zoom, 0, moveX, 0, zoom, moveY, 0, 0, 1], raw);
}

/** Top left, top right, bottom right, bottom left of the plate, mm. */
export function plateCorners(widthMm: number, heightMm: number): readonly Point[] {
  return [
    { x: 0, y: 0 },
    { x: widthMm, y: 0 },
    { x: widthMm, y: heightMm },
    { x: 0, y: heightMm },
  ];
}

export function project(matrix: Matrix3, { x, y }: Point): Point {
  const depth = matrix[6] * x + matrix[7] * y + matrix[8];
  return { x: (matrix[0] * x + matrix[1] * y + matrix[2]) / depth, y: (matrix[3] * x + matrix[4] * y + matrix[5]) / depth };
}

/** Inverse by cofactors; a view of a plate from in front is never singular. */
export function inverse([a, b, c, d, e, f, g, h, i]: Matrix3): Matrix3 {
  const determinant = a * (e * i - f * h) - b * (d * i - f * g) + c * (d * h - e * g);
  const cofactors = [
    e * i - f * h,
    c * h - b * i,
    b * f - c * e,
    f * g - d * i,
    a * i - c * g,
    c * d - a * f,
    d * h - e * g,
    b * g - a * h,
    a * e - b * d,
  ];
  const [p, q, r, s, t, u, v, w, x] = cofactors.map((cofactor) => cofactor / determinant);
  return [p ?? 0, q ?? 0, r ?? 0, s ?? 0, t ?? 0, u ?? 0, v ?? 0, w ?? 0, x ?? 0];
}

function pinhole(widthMm: number, heightMm: number, view: View): Matrix3 {
  const away = view.distance * Math.hypot(widthMm, heightMm);
  const radian = Math.PI / 180;
  const [turn, tiltX, tiltY] = [view.turnDeg * radian, view.tiltXDeg * radian, view.tiltYDeg * radian];
  const [cosTurn, sinTurn] = [Math.cos(turn), Math.sin(turn)];
  // The plate is turned in its own plane first, then tilted about the picture's axes; the plate has no height, so column 3 drops out.
  const flat: Matrix3 = [cosTurn, -sinTurn, 0, sinTurn, cosTurn, 0, 0, 0, 1];
  const tilted: Matrix3 = [
    Math.cos(tiltY),
    Math.sin(tiltY) * Math.sin(tiltX),
    0,
    0,
    Math.cos(tiltX),
    0,
    -Math.sin(tiltY) / away,
    (Math.cos(tiltY) * Math.sin(tiltX)) / away,
    1,
  ];
  const centred: Matrix3 = [1, 0, -widthMm / 2, 0, 1, -heightMm / 2, 0, 0, 1];
  return multiply(tilted, multiply(flat, centred));
}

function multiply(left: Matrix3, right: Matrix3): Matrix3 {
  const cell = (row: number, column: number) =>
    [0, 1, 2].reduce((sum, k) => sum + (left[row * 3 + k] ?? 0) * (right[k * 3 + column] ?? 0), 0);
  return [cell(0, 0), cell(0, 1), cell(0, 2), cell(1, 0), cell(1, 1), cell(1, 2), cell(2, 0), cell(2, 1), cell(2, 2)];
}
