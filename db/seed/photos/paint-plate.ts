import { type CouponLayout, couponMarks } from '@proofplate/imaging';
import { type BurntCell, burnCell, type CellTexture } from './burn-cell';
import { type Lab, labToLinearRgb } from './colour';
import type { Ground } from './grounds';
import type { Random } from './noise';
import { blend, drawStrokes, fillAreas, type PlateRaster, visitRect } from './plate-raster';
import { surfaceTexture } from './surface-texture';

export type PhotoCell = { readonly address: string; readonly lab: Lab; readonly texture?: Partial<CellTexture> };

export type PlateContent = {
  readonly layout: CouponLayout;
  readonly ground: Ground;
  readonly cells: readonly PhotoCell[];
  readonly code: string;
  readonly dataMatrixModules: readonly (readonly boolean[])[];
  readonly hasNeutralCard: boolean;
};

/** The neutral card: matt grey without colour. */
export const CARD_LAB: Lab = [66, 0, 0];
const PEN_MM = 0.34;
const CARD_TURN = 0.035;

/** Paints the flat plate: bare ground, cells, corner marks, letters, code and, where it lies there, the neutral card. */
export function paintPlate(content: PlateContent, pxPerMm: number, random: Random): PlateRaster {
  const { layout, ground } = content;
  const widthPx = Math.round(layout.plate.widthMm * pxPerMm);
  const heightPx = Math.round(layout.plate.heightMm * pxPerMm);
  const bare = surfaceTexture(ground.surface, ground.texture, { widthPx, heightPx, pxPerMm }, random);
  const raster = { widthPx, heightPx, pxPerMm, rgb: new Float32Array(widthPx * heightPx * 3) };
  const colour = labToLinearRgb(ground.lab);
  for (let index = 0; index < widthPx * heightPx; index += 1) {
    blend(raster, index, colour, 1, bare.shade[index]);
  }
  for (const cell of burntCells(layout, content.cells)) {
    burnCell(raster, bare, ground, cell, random);
  }
  burnMarks(raster, content, random);
  if (content.hasNeutralCard) {
    layCard(raster, layout, random);
  }
  return raster;
}

function burntCells(layout: CouponLayout, cells: readonly PhotoCell[]): BurntCell[] {
  const rects = new Map(layout.cells.map((cell) => [cell.address, cell.rect]));
  return cells.map(({ address, lab, texture }) => {
    const rect = rects.get(address);
    if (rect === undefined) {
      throw new RangeError(`cells must be on the layout, got ${JSON.stringify(address)}`);
    }
    return { rect, lab, texture: { overburn: 0, banding: 0, mottle: 0, halo: 0, ...texture } };
  });
}

function burnMarks(raster: PlateRaster, content: PlateContent, random: Random): void {
  const { layout, ground, code, dataMatrixModules } = content;
  const marks = couponMarks({ layout, code, dataMatrixModules, polarity: ground.brightens ? 'bright on dark' : 'dark on bright' });
  const flicker = () => 1 + 0.12 * (random() - 0.5);
  for (const areas of [...marks.cornerMarks, marks.dataMatrix]) {
    fillAreas(raster, areas, ground.markLab, flicker);
  }
  for (const strokes of [...marks.rowLetters, ...marks.columnNumbers, marks.code, marks.cardAngles]) {
    drawStrokes(raster, strokes, PEN_MM, ground.markLab, flicker);
  }
}

/** A small card, laid by hand and so a little askew, with its own soft shadow. */
function layCard(raster: PlateRaster, layout: CouponLayout, random: Random): void {
  const { neutralCard } = layout;
  const turn = (random() - 0.5) * 2 * CARD_TURN;
  const centreX = neutralCard.xMm + neutralCard.widthMm / 2;
  const centreY = neutralCard.yMm + neutralCard.heightMm / 2;
  const half = neutralCard.widthMm / 2 - 0.75;
  const colour = labToLinearRgb(CARD_LAB);
  const outside = (xMm: number, yMm: number) => {
    const [dx, dy] = [xMm - centreX, yMm - centreY];
    return Math.max(Math.abs(dx * Math.cos(turn) + dy * Math.sin(turn)), Math.abs(dy * Math.cos(turn) - dx * Math.sin(turn))) - half;
  };
  visitRect(raster, neutralCard, 0.3, (index, _, xMm, yMm) => {
    const shadow = 0.45 * Math.exp(-(Math.max(0, outside(xMm - 0.18, yMm - 0.22)) / 0.2));
    blend(raster, index, [0, 0, 0], outside(xMm - 0.18, yMm - 0.22) < 0.7 ? shadow : 0);
    const cover = Math.min(1, Math.max(0, 0.5 - outside(xMm, yMm) * raster.pxPerMm));
    blend(raster, index, colour, cover, 1 + 0.02 * (random() - 0.5));
  });
}
