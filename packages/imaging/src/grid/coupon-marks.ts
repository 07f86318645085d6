import { ARUCO_MODULES_PER_SIDE, arucoModules } from './aruco-4x4';
import type { CouponLayout, LayoutLabel, RectMm } from './coupon-layout';
import { letteringStrokesMm, letteringWidthMm, type PointMm } from './single-line-lettering';

/** What the laser does to the ground: darkens a bright one, or brightens a dark one. */
export type MarkPolarity = 'dark on bright' | 'bright on dark';

export type StrokesMm = readonly (readonly PointMm[])[];

/** Everything that is burnt besides the cells, on the plate's own axes, mm. */
export type CouponMarks = {
  /** One list of areas per corner mark, in the order of the layout's fiducials. */
  readonly cornerMarks: readonly (readonly RectMm[])[];
  readonly dataMatrix: readonly RectMm[];
  readonly rowLetters: readonly StrokesMm[];
  readonly columnNumbers: readonly StrokesMm[];
  readonly code: StrokesMm;
  /** Four angles that show where the neutral card is laid. */
  readonly cardAngles: StrokesMm;
};

export type CouponMarksOptions = {
  readonly layout: CouponLayout;
  readonly code: string;
  /** Data Matrix without quiet zone, true = dark module. */
  readonly dataMatrixModules: readonly (readonly boolean[])[];
  readonly polarity: MarkPolarity;
};

const CARD_ANGLE_MM = 1.2;
const SMALLEST_SYMBOL = 8;
const LARGEST_SYMBOL = 52;

/**
 * Areas and pen strokes of everything on a coupon besides its cells.
 *
 * Where the laser darkens the ground, the dark modules are burnt. Where it brightens the ground, the bright modules and the
 * quiet zone are burnt instead, so that corner marks and code read dark on bright in every photograph.
 *
 * @param options.layout            layout of the coupon, mm
 * @param options.code              readable code: letters A to Z, digits and hyphens
 * @param options.dataMatrixModules 8 to 52 rows of as many booleans, true = dark, without quiet zone
 * @param options.polarity          what the laser does to the ground
 * @returns areas and polylines, mm, inside the places of the layout
 * @throws RangeError naming the argument, if the code holds another character or the Data Matrix is not square or out of range
 * Source: own layout; docs/science/coupon-layout.md
 */
export function couponMarks(options: CouponMarksOptions): CouponMarks {
  const { layout, code, dataMatrixModules, polarity } = options;
  requireSquare(dataMatrixModules);
  const symbolModuleMm = layout.dataMatrixPlace.widthMm / (dataMatrixModules.length + 2);
  return {
    cornerMarks: layout.fiducials.map((mark) =>
      burntAreas(arucoModules(mark.id), mark.quietZone, mark.rect.widthMm / ARUCO_MODULES_PER_SIDE, polarity),
    ),
    dataMatrix: burntAreas(dataMatrixModules, layout.dataMatrixPlace, symbolModuleMm, polarity),
    rowLetters: layout.rowLetters.map(labelStrokes),
    columnNumbers: layout.columnNumbers.map(labelStrokes),
    code: codeStrokes(code, layout.codePlace),
    cardAngles: cardAngles(layout.neutralCard),
  };
}

function burntAreas(modules: readonly (readonly boolean[])[], place: RectMm, moduleMm: number, polarity: MarkPolarity): RectMm[] {
  const bare = modules[0].map(() => false);
  const framed = [bare, ...modules, bare].map((row) => [false, ...row, false]);
  const burnt = framed.map((row) => row.map((dark) => dark === (polarity === 'dark on bright')));
  return burnt.flatMap((row, rowIndex) =>
    runs(row).map(({ start, end }) => ({
      xMm: tidy(place.xMm + start * moduleMm),
      yMm: tidy(place.yMm + rowIndex * moduleMm),
      widthMm: tidy((end - start) * moduleMm),
      heightMm: tidy(moduleMm),
    })),
  );
}

/** Neighbouring modules become one bar: fewer starts and stops of the beam, no seams inside a bar. */
function runs(row: readonly boolean[]): { start: number; end: number }[] {
  return row.flatMap((burnt, start) => {
    if (!burnt || row[start - 1] === true) {
      return [];
    }
    const length = row.slice(start).indexOf(false);
    return [{ start, end: length === -1 ? row.length : start + length }];
  });
}

function labelStrokes(label: LayoutLabel): StrokesMm {
  return moved(letteringStrokesMm(label.text, label.rect.heightMm), label.rect.xMm, label.rect.yMm);
}

function codeStrokes(code: string, place: RectMm): StrokesMm {
  const heightMm = Math.min(place.heightMm, place.widthMm / letteringWidthMm(code, 1));
  return moved(letteringStrokesMm(code, heightMm), place.xMm, place.yMm + place.heightMm - heightMm);
}

function cardAngles({ xMm, yMm, widthMm, heightMm }: RectMm): StrokesMm {
  return [0, 1].flatMap((right) =>
    [0, 1].map((bottom) => {
      const corner = { xMm: xMm + right * widthMm, yMm: yMm + bottom * heightMm };
      const inX = right === 1 ? -CARD_ANGLE_MM : CARD_ANGLE_MM;
      const inY = bottom === 1 ? -CARD_ANGLE_MM : CARD_ANGLE_MM;
      return moved(
        [
          [
            { xMm: inX, yMm: 0 },
            { xMm: 0, yMm: 0 },
            { xMm: 0, yMm: inY },
          ],
        ],
        corner.xMm,
        corner.yMm,
      )[0];
    }),
  );
}

function moved(strokes: StrokesMm, byXMm: number, byYMm: number): StrokesMm {
  return strokes.map((stroke) => stroke.map((point) => ({ xMm: tidy(point.xMm + byXMm), yMm: tidy(point.yMm + byYMm) })));
}

function tidy(valueMm: number): number {
  return Math.round(valueMm * 10_000) / 10_000;
}

function requireSquare(modules: readonly (readonly boolean[])[]): void {
  const size = modules.length;
  if (size < SMALLEST_SYMBOL || size > LARGEST_SYMBOL || modules.some((row) => row.length !== size)) {
    throw new RangeError(`dataMatrixModules must be square, ${SMALLEST_SYMBOL} to ${LARGEST_SYMBOL} modules a side, got ${size} rows`);
  }
}
