import type { RectMm } from '@proofplate/imaging';
import { type Lab, labToLinearRgb } from './colour';
import type { Ground } from './grounds';
import { fractalNoise, planeNoise, type Random } from './noise';
import { blend, type PlateRaster, visitRect } from './plate-raster';
import type { ShadeField } from './surface-texture';

// Taken out of Math once: the look-up of a global costs more than the call where a test runner wraps it.
const { exp, hypot, max, min, sin } = Math;

/** What the beam left besides colour, each from 0 (none) to 1 (as bad as it gets). */
export type CellTexture = {
  /** Pits, slag and soot of too much energy. */
  readonly overburn: number;
  /** Lines of the fill that can be seen one by one. */
  readonly banding: number;
  /** Cloudy, patchy colour. */
  readonly mottle: number;
  /** Heat-tinted rim outside the cell. */
  readonly halo: number;
};

export type BurntCell = { readonly rect: RectMm; readonly lab: Lab; readonly texture: CellTexture };

const PLACING_ERROR_MM = 0.03;

/** Burns one cell into the plate: tinted rim, even colour, lines of the fill, clouds, pits and a slightly heavier edge. */
export function burnCell(raster: PlateRaster, bare: ShadeField, ground: Ground, cell: BurntCell, random: Random): void {
  const rect = {
    ...cell.rect,
    xMm: cell.rect.xMm + (random() - 0.5) * 2 * PLACING_ERROR_MM,
    yMm: cell.rect.yMm + (random() - 0.5) * 2 * PLACING_ERROR_MM,
  };
  tintRim(raster, ground, rect, cell.texture.halo, random);
  const colour = labToLinearRgb(cell.lab);
  const factorAt = cellFactor(raster, bare, cell, random);
  visitRect(raster, rect, 0.1, (index, cover, xMm, yMm) => {
    if (cover > 0) {
      const edgeMm = min(xMm - rect.xMm, rect.xMm + rect.widthMm - xMm, yMm - rect.yMm, rect.yMm + rect.heightMm - yMm);
      blend(raster, index, colour, cover, factorAt(index, xMm, yMm, edgeMm));
    }
  });
}

function tintRim(raster: PlateRaster, ground: Ground, rect: RectMm, halo: number, random: Random): void {
  if (halo <= 0) {
    return;
  }
  const tint = labToLinearRgb(ground.rimLab);
  const reachMm = 0.12 + 0.5 * halo;
  const wander = planeNoise(random);
  visitRect(raster, rect, 3 * reachMm, (index, _, xMm, yMm) => {
    const outX = max(rect.xMm - xMm, xMm - rect.xMm - rect.widthMm, 0);
    const outY = max(rect.yMm - yMm, yMm - rect.yMm - rect.heightMm, 0);
    const distanceMm = hypot(outX, outY) * (1 + 0.25 * wander(xMm * 1.3, yMm * 1.3));
    const opacity = ground.rim * (0.25 + 0.75 * halo) * exp(-((distanceMm / reachMm) ** 1.3));
    if (opacity > 0.004) {
      blend(raster, index, tint, opacity);
    }
  });
}

function cellFactor(raster: PlateRaster, bare: ShadeField, cell: BurntCell, random: Random) {
  const { overburn, banding, mottle } = cell.texture;
  const cloud = planeNoise(random);
  const pit = planeNoise(random);
  const lineMm = max(0.22, 2.6 / raster.pxPerMm);
  const lineDepth = 0.025 + 0.2 * banding;
  const phase = random() * Math.PI * 2;
  const edgeDepth = cell.lab[0] < 50 ? 0.22 : 0.1;
  const grip = 0.35 * (1 - 0.6 * overburn);
  return (index: number, xMm: number, yMm: number, edgeMm: number): number => {
    const line = lineDepth * sin((yMm / lineMm) * 2 * Math.PI + phase + 0.5 * cloud(xMm * 0.6, yMm * 2));
    const clouds = (0.04 + 0.34 * mottle) * fractalNoise(cloud, xMm * 1.1, yMm * 1.9, 3);
    const pits = overburn * pitting(pit, xMm, yMm);
    const grain = (0.05 + 0.14 * overburn) * (random() - 0.5) + grip * ((bare.shade[index] ?? 1) - 1);
    const edge = edgeMm < 0.14 ? -edgeDepth * (1 - edgeMm / 0.14) : 0;
    return max(0.08, 1 + line + clouds + pits + grain + edge);
  };
}

/** Craters and frozen melt: dark pits and bright beads, both a few tenths of a millimetre wide. */
function pitting(noise: (x: number, y: number) => number, xMm: number, yMm: number): number {
  const height = fractalNoise(noise, xMm * 3.4, yMm * 3.4, 3);
  const slope = height - fractalNoise(noise, xMm * 3.4 + 0.22, yMm * 3.4 + 0.22, 3);
  return 1.15 * slope + 0.55 * height + (height > 0.42 ? 0.5 : 0) - (height < -0.42 ? 0.4 : 0);
}
