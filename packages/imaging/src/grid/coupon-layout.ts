import { ARUCO_MODULES_PER_SIDE, type FiducialId } from './aruco-4x4';
import { cellAddress, MAX_COLUMNS, MAX_ROWS, rowLetter } from './cell-address';
import { letteringWidthMm } from './single-line-lettering';

/** Axis-parallel rectangle on the plate; origin at the plate's top left corner, x to the right, y down, in mm. */
export type RectMm = { readonly xMm: number; readonly yMm: number; readonly widthMm: number; readonly heightMm: number };

export type LayoutCell = { readonly address: string; readonly row: number; readonly column: number; readonly rect: RectMm };
export type LayoutFiducial = { readonly id: FiducialId; readonly rect: RectMm; readonly quietZone: RectMm };
export type LayoutLabel = { readonly text: string; readonly rect: RectMm };

/** Everything that is burnt on, or kept free on, one coupon. All geometry in mm. */
export type CouponLayout = {
  readonly version: string;
  readonly reference: string;
  readonly rows: number;
  readonly columns: number;
  readonly cellMm: number;
  readonly gapMm: number;
  readonly plate: { readonly widthMm: number; readonly heightMm: number };
  readonly cells: readonly LayoutCell[];
  /** Clockwise from the top left: ids 0, 1, 2, 3. */
  readonly fiducials: readonly LayoutFiducial[];
  readonly rowLetters: readonly LayoutLabel[];
  readonly columnNumbers: readonly LayoutLabel[];
  /** Place of the readable code; the lettering is scaled to fit. */
  readonly codePlace: RectMm;
  /** Place of the Data Matrix, its quiet zone of one module included. */
  readonly dataMatrixPlace: RectMm;
  /** Ground that is never marked: what contrast is measured against. */
  readonly groundPatch: RectMm;
  /** Where a neutral grey card is laid for the photograph. */
  readonly neutralCard: RectMm;
};

export type CouponLayoutOptions = {
  readonly rows: number;
  readonly columns: number;
  readonly cellMm?: number;
  readonly gapMm?: number;
  readonly reference: string;
};

/** Changes whenever any place on the plate moves, so that an old photograph is measured with its own layout. */
export const COUPON_LAYOUT_VERSION = 'coupon-layout/1';

const MODULE_MM = 1.2;
const FIDUCIAL_MM = ARUCO_MODULES_PER_SIDE * MODULE_MM;
const QUIET_MM = MODULE_MM;
const EDGE_MM = 1.2;
const BAND_MM = FIDUCIAL_MM + 2 * QUIET_MM;
const MARGIN_MM = EDGE_MM + BAND_MM + 1.2;
/** More room below the cells: the heat-tinted rim of the last row must not reach the unmarked ground patch. */
const FOOT_MM = 2.4;
const CODE_HEIGHT_MM = 2.6;
const CODE_WIDTH_MM = 14.4;
const FOOT_GAP_MM = 1.2;
const GROUND_HEIGHT_MM = BAND_MM - CODE_HEIGHT_MM - FOOT_GAP_MM;
const LABEL_HEIGHT_MM = 2.4;
const LABEL_GAP_MM = 1.4;
/** The foot holds code, neutral card and Data Matrix side by side; a narrower grid is centred above it. */
const LEAST_CONTENT_MM = CODE_WIDTH_MM + 2 * (BAND_MM + FOOT_GAP_MM);
const REFERENCE = /^[\x21-\x7e]{1,40}$/;

/**
 * Geometry of a test coupon: plate, cells, corner marks, labels, code, Data Matrix, bare ground and card place.
 *
 * plate width = max(grid width, 36 mm) + 24 mm;  plate height = grid height + 26.4 mm;  grid = n cellMm + (n - 1) gapMm
 *
 * @param options.rows      rows of cells, 1 to 26, lettered A to Z downwards
 * @param options.columns   columns of cells, 1 to 26, numbered from 1 across
 * @param options.cellMm    side of a cell, mm, 1 to 30 (default 5)
 * @param options.gapMm     bare strip between cells, mm, 0.3 to 10 (default 1.2)
 * @param options.reference what the Data Matrix carries: 1 to 40 printable ASCII characters without space
 * @returns the layout, mm; every place lies on the plate and no two overlap
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for flat plates seen from the front.
 * Source: own layout; docs/science/coupon-layout.md
 */
export function couponLayout(options: CouponLayoutOptions): CouponLayout {
  const { rows, columns, cellMm = 5, gapMm = 1.2, reference } = options;
  requireCount('rows', rows, MAX_ROWS);
  requireCount('columns', columns, MAX_COLUMNS);
  requireBetween('cellMm', cellMm, 1, 30);
  requireBetween('gapMm', gapMm, 0.3, 10);
  if (!REFERENCE.test(reference)) {
    throw new RangeError(`reference must be 1 to 40 printable ASCII characters without space, got ${JSON.stringify(reference)}`);
  }
  const pitchMm = cellMm + gapMm;
  const gridWidthMm = columns * pitchMm - gapMm;
  const contentMm = Math.max(gridWidthMm, LEAST_CONTENT_MM);
  const plate = { widthMm: mm(contentMm + 2 * MARGIN_MM), heightMm: mm(rows * pitchMm - gapMm + 2 * MARGIN_MM + FOOT_MM) };
  const left = MARGIN_MM + (contentMm - gridWidthMm) / 2;
  const cells = Array.from({ length: rows * columns }, (_, index) => {
    const row = Math.floor(index / columns);
    const column = index % columns;
    return {
      address: cellAddress(row, column),
      row,
      column,
      rect: rect(left + column * pitchMm, MARGIN_MM + row * pitchMm, cellMm, cellMm),
    };
  });
  return {
    version: COUPON_LAYOUT_VERSION,
    reference,
    rows,
    columns,
    cellMm,
    gapMm,
    plate,
    cells,
    fiducials: fiducials(plate.widthMm, plate.heightMm),
    ...labels(rows, columns, cellMm, gapMm, left),
    ...foot(plate.widthMm, plate.heightMm),
  };
}

function fiducials(widthMm: number, heightMm: number): LayoutFiducial[] {
  const near = EDGE_MM + QUIET_MM;
  const right = widthMm - near - FIDUCIAL_MM;
  const bottom = heightMm - near - FIDUCIAL_MM;
  const clockwise: readonly (readonly [FiducialId, number, number])[] = [
    [0, near, near],
    [1, right, near],
    [2, right, bottom],
    [3, near, bottom],
  ];
  return clockwise.map(([id, xMm, yMm]) => ({
    id,
    rect: rect(xMm, yMm, FIDUCIAL_MM, FIDUCIAL_MM),
    quietZone: rect(xMm - QUIET_MM, yMm - QUIET_MM, BAND_MM, BAND_MM),
  }));
}

function labels(rows: number, columns: number, cellMm: number, gapMm: number, left: number) {
  const pitchMm = cellMm + gapMm;
  const widest = letteringWidthMm(String(columns), 1);
  // All labels of a plate share one height: the largest that leaves air between two neighbours in both directions.
  const heightMm = Math.min(LABEL_HEIGHT_MM, 0.8 * pitchMm, (0.85 * pitchMm) / widest);
  const place = (text: string, centreXMm: number, centreYMm: number): LayoutLabel => {
    const widthMm = letteringWidthMm(text, heightMm);
    return { text, rect: rect(centreXMm - widthMm / 2, centreYMm - heightMm / 2, widthMm, heightMm) };
  };
  const letterX = left - LABEL_GAP_MM - letteringWidthMm('A', heightMm) / 2;
  const numberY = MARGIN_MM - LABEL_GAP_MM - heightMm / 2;
  return {
    rowLetters: Array.from({ length: rows }, (_, row) => place(rowLetter(row), letterX, MARGIN_MM + row * pitchMm + cellMm / 2)),
    columnNumbers: Array.from({ length: columns }, (_, column) => place(String(column + 1), left + column * pitchMm + cellMm / 2, numberY)),
  };
}

function foot(widthMm: number, heightMm: number) {
  const top = heightMm - EDGE_MM - BAND_MM;
  const dataMatrixX = widthMm - MARGIN_MM - BAND_MM;
  return {
    groundPatch: rect(MARGIN_MM, top, CODE_WIDTH_MM, GROUND_HEIGHT_MM),
    codePlace: rect(MARGIN_MM, top + BAND_MM - CODE_HEIGHT_MM, CODE_WIDTH_MM, CODE_HEIGHT_MM),
    neutralCard: rect(dataMatrixX - FOOT_GAP_MM - BAND_MM, top, BAND_MM, BAND_MM),
    dataMatrixPlace: rect(dataMatrixX, top, BAND_MM, BAND_MM),
  };
}

function rect(xMm: number, yMm: number, widthMm: number, heightMm: number): RectMm {
  return { xMm: mm(xMm), yMm: mm(yMm), widthMm: mm(widthMm), heightMm: mm(heightMm) };
}

/** Whole tenths of a micrometre: artwork and measuring then agree to the last digit on every platform. */
function mm(value: number): number {
  return Math.round(value * 10_000) / 10_000;
}

function requireCount(name: string, value: number, limit: number): void {
  if (!Number.isInteger(value) || value < 1 || value > limit) {
    throw new RangeError(`${name} must be a whole number from 1 to ${limit}, got ${value}`);
  }
}

function requireBetween(name: string, value: number, least: number, most: number): void {
  if (!(value >= least && value <= most)) {
    throw new RangeError(`${name} must be between ${least} and ${most} mm, got ${value}`);
  }
}
