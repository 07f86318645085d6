import type { RectMm, StrokesMm } from '@proofplate/imaging';
import { type Lab, type LinearRgb, labToLinearRgb, linearRgbToLab } from './colour';

// Taken out of Math once: the look-up of a global costs more than the call where a test runner wraps it.
const { ceil, floor, hypot, max, min, sqrt } = Math;

/** A flat plate as it would be scanned: linear light, three values per pixel, row by row, plate axes. */
export type PlateRaster = { readonly widthPx: number; readonly heightPx: number; readonly pxPerMm: number; readonly rgb: Float32Array };

/** Pixels of a rectangle and how much of each it covers. */
type Visit = (index: number, cover: number, xMm: number, yMm: number) => void;

/** Lays colour over a pixel; opacity 1 replaces it. */
export function blend(raster: PlateRaster, index: number, colour: LinearRgb, opacity: number, factor = 1): void {
  for (let channel = 0; channel < 3; channel += 1) {
    const at = index * 3 + channel;
    raster.rgb[at] = (raster.rgb[at] ?? 0) * (1 - opacity) + (colour[channel] ?? 0) * factor * opacity;
  }
}

/** Calls back for every pixel within `marginMm` of a rectangle; cover falls off over one pixel at the edge. */
export function visitRect(raster: PlateRaster, rect: RectMm, marginMm: number, visit: Visit): void {
  const { pxPerMm, widthPx, heightPx } = raster;
  const left = max(0, floor((rect.xMm - marginMm) * pxPerMm));
  const right = min(widthPx - 1, ceil((rect.xMm + rect.widthMm + marginMm) * pxPerMm));
  const top = max(0, floor((rect.yMm - marginMm) * pxPerMm));
  const bottom = min(heightPx - 1, ceil((rect.yMm + rect.heightMm + marginMm) * pxPerMm));
  for (let y = top; y <= bottom; y += 1) {
    const yMm = (y + 0.5) / pxPerMm;
    const down = covered(yMm, rect.yMm, rect.heightMm, pxPerMm);
    for (let x = left; x <= right; x += 1) {
      const xMm = (x + 0.5) / pxPerMm;
      visit(y * widthPx + x, down * covered(xMm, rect.xMm, rect.widthMm, pxPerMm), xMm, yMm);
    }
  }
}

/** Fills areas with a mark whose brightness flickers a little, as a burnt area does. */
export function fillAreas(raster: PlateRaster, areas: readonly RectMm[], lab: Lab, flicker: () => number): void {
  const colour = labToLinearRgb(lab);
  // Covers are added up first: two bars that share an edge within a pixel leave no seam.
  const covers = new Map<number, number>();
  for (const area of areas) {
    visitRect(raster, area, 0.1, (index, cover) => {
      if (cover > 0) {
        covers.set(index, (covers.get(index) ?? 0) + cover);
      }
    });
  }
  for (const [index, cover] of covers) {
    blend(raster, index, colour, min(1, cover), flicker());
  }
}

/** Follows pen strokes with a round pen. */
export function drawStrokes(raster: PlateRaster, strokes: StrokesMm, penMm: number, lab: Lab, flicker: () => number): void {
  const colour = labToLinearRgb(lab);
  for (const stroke of strokes) {
    const xs = stroke.map((point) => point.xMm);
    const ys = stroke.map((point) => point.yMm);
    const [xMm, yMm] = [min(...xs), min(...ys)];
    const box = { xMm, yMm, widthMm: max(...xs) - xMm, heightMm: max(...ys) - yMm };
    visitRect(raster, box, penMm, (index, _, atXMm, atYMm) => {
      const cover = clamp((penMm / 2 - distanceMm(stroke, atXMm, atYMm)) * raster.pxPerMm + 0.5);
      if (cover > 0) {
        blend(raster, index, colour, cover, flicker());
      }
    });
  }
}

/** Mean colour of the inner part of a rectangle and the spread of L* in it, taken over blocks of 0.1 mm as a camera would see them. */
export function measureRect(raster: PlateRaster, rect: RectMm, insetMm: number): { lab: Lab; evenness: number } {
  const inner = {
    xMm: rect.xMm + insetMm,
    yMm: rect.yMm + insetMm,
    widthMm: rect.widthMm - 2 * insetMm,
    heightMm: rect.heightMm - 2 * insetMm,
  };
  const blockMm = max(0.1, 2 / raster.pxPerMm);
  const blocks = new Map<number, [number, number, number, number]>();
  visitRect(raster, inner, 0, (index, cover, xMm, yMm) => {
    if (cover < 1) {
      return;
    }
    const key = floor((yMm - inner.yMm) / blockMm) * 1024 + floor((xMm - inner.xMm) / blockMm);
    const block = blocks.get(key) ?? [0, 0, 0, 0];
    blocks.set(key, block);
    for (let channel = 0; channel < 3; channel += 1) {
      block[channel] = (block[channel] ?? 0) + (raster.rgb[index * 3 + channel] ?? 0);
    }
    block[3] += 1;
  });
  const means = [...blocks.values()].map(([red, green, blue, count]): LinearRgb => [red / count, green / count, blue / count]);
  const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / max(1, values.length);
  const lightness = means.map((colour) => linearRgbToLab(colour)[0]);
  const centre = mean(lightness);
  return {
    lab: linearRgbToLab([
      mean(means.map((colour) => colour[0])),
      mean(means.map((colour) => colour[1])),
      mean(means.map((colour) => colour[2])),
    ]),
    evenness: sqrt(mean(lightness.map((value) => (value - centre) ** 2))),
  };
}

export function clamp(value: number): number {
  return min(1, max(0, value));
}

function covered(atMm: number, startMm: number, lengthMm: number, pxPerMm: number): number {
  return clamp(min(atMm - startMm, startMm + lengthMm - atMm) * pxPerMm + 0.5);
}

function distanceMm(stroke: StrokesMm[number], xMm: number, yMm: number): number {
  let nearest = Number.POSITIVE_INFINITY;
  for (let index = 1; index < stroke.length; index += 1) {
    const from = stroke[index - 1];
    const to = stroke[index];
    if (from === undefined || to === undefined) {
      continue;
    }
    const [dx, dy] = [to.xMm - from.xMm, to.yMm - from.yMm];
    const along = clamp(((xMm - from.xMm) * dx + (yMm - from.yMm) * dy) / (dx * dx + dy * dy || 1));
    nearest = min(nearest, hypot(xMm - from.xMm - along * dx, yMm - from.yMm - along * dy));
  }
  return nearest;
}
