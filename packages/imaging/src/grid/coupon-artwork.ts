import type { CouponLayout, RectMm } from './coupon-layout';
import { couponMarks, type MarkPolarity, type StrokesMm } from './coupon-marks';

export type ArtworkCell = { readonly address: string; readonly runOrder: number };

export type CouponArtworkOptions = {
  readonly layout: CouponLayout;
  /** Cells to burn, each once; they are written in run order. Cells of the layout that are left out stay bare. */
  readonly cells: readonly ArtworkCell[];
  readonly code: string;
  readonly dataMatrixModules: readonly (readonly boolean[])[];
  readonly polarity: MarkPolarity;
};

/** Shape written for the pen: an area to fill or a line to follow. */
const FILL = 'fill="#000" stroke="none"';
const LINE = 'fill="none" stroke="#000" stroke-width="0.3" stroke-linecap="round" stroke-linejoin="round"';
const HAIRLINE = 'fill="none" stroke="#000" stroke-width="0.1"';

/**
 * SVG artwork of a coupon, one user unit = 1 mm. Everything black is burnt, except the group "outline", which is the plate's edge.
 *
 * Groups: outline, corner-marks (fiducial-0 to fiducial-3), row-letters, column-numbers, code, data-matrix, card-angles, cells
 * (one group per cell, cell-B4, in run order, with data-run-order).
 *
 * @param options.layout            layout of the coupon, mm
 * @param options.cells             cells with their run order, whole numbers ≥ 1, addresses and orders each unique
 * @param options.code              readable code: letters A to Z, digits and hyphens
 * @param options.dataMatrixModules square, true = dark, without quiet zone
 * @param options.polarity          what the laser does to the ground
 * @returns an SVG document; the same input gives the same text
 * @throws RangeError naming the argument, if a cell is not on the layout or given twice, or code or Data Matrix are out of range
 * Source: SVG 1.1 (W3C, 2011); docs/science/coupon-layout.md
 */
export function couponArtworkSvg(options: CouponArtworkOptions): string {
  const { layout, code, polarity } = options;
  const marks = couponMarks(options);
  const { widthMm, heightMm } = layout.plate;
  return [
    '<?xml version="1.0" encoding="UTF-8"?>',
    `<svg xmlns="http://www.w3.org/2000/svg" width="${widthMm}mm" height="${heightMm}mm" viewBox="0 0 ${widthMm} ${heightMm}">`,
    `<title>${escapeText(`Coupon ${code}`)}</title>`,
    `<desc>${escapeText(`${layout.version}; reference ${layout.reference}; ${polarity}; units mm`)}</desc>`,
    group('outline', HAIRLINE, [`<rect x="0" y="0" width="${widthMm}" height="${heightMm}"/>`]),
    group(
      'corner-marks',
      FILL,
      layout.fiducials.map((mark, index) => `<path id="fiducial-${mark.id}" d="${areas(marks.cornerMarks[index])}"/>`),
    ),
    group('row-letters', LINE, marks.rowLetters.flatMap(lines)),
    group('column-numbers', LINE, marks.columnNumbers.flatMap(lines)),
    group('code', LINE, lines(marks.code)),
    group('data-matrix', FILL, [`<path d="${areas(marks.dataMatrix)}"/>`]),
    group('card-angles', LINE, lines(marks.cardAngles)),
    group('cells', FILL, cellGroups(layout, options.cells)),
    '</svg>',
    '',
  ].join('\n');
}

function cellGroups(layout: CouponLayout, cells: readonly ArtworkCell[]): string[] {
  const rects = new Map(layout.cells.map((cell) => [cell.address, cell.rect]));
  requireUnique(cells);
  return [...cells]
    .sort((a, b) => a.runOrder - b.runOrder)
    .map(({ address, runOrder }) => {
      const rect = rects.get(address);
      if (rect === undefined) {
        throw new RangeError(`cells must be on the layout, got ${JSON.stringify(address)}`);
      }
      return `<g id="cell-${address}" data-run-order="${runOrder}"><rect x="${rect.xMm}" y="${rect.yMm}" width="${rect.widthMm}" height="${rect.heightMm}"/></g>`;
    });
}

function requireUnique(cells: readonly ArtworkCell[]): void {
  const wrong = cells.find(({ runOrder }) => !Number.isInteger(runOrder) || runOrder < 1);
  if (wrong !== undefined) {
    throw new RangeError(`cells must have whole run orders from 1, got ${wrong.runOrder} at ${wrong.address}`);
  }
  if (
    new Set(cells.map((cell) => cell.address)).size !== cells.length ||
    new Set(cells.map((cell) => cell.runOrder)).size !== cells.length
  ) {
    throw new RangeError('cells must have each address and each run order once');
  }
}

function group(id: string, attributes: string, children: readonly string[]): string {
  return [`<g id="${id}" ${attributes}>`, ...children, '</g>'].join('\n');
}

function areas(rects: readonly RectMm[]): string {
  return rects.map((rect) => `M${rect.xMm} ${rect.yMm}h${rect.widthMm}v${rect.heightMm}h${-rect.widthMm}z`).join('');
}

function lines(strokes: StrokesMm): string[] {
  return strokes.map((stroke) => `<polyline points="${stroke.map((point) => `${point.xMm},${point.yMm}`).join(' ')}"/>`);
}

function escapeText(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');
}
