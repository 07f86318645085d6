import type { Surface } from './grounds';
import { fractalNoise, planeNoise, type Random, smoothed, whiteNoise } from './noise';

// Taken out of Math once: the look-up of a global costs more than the call where a test runner wraps it.
const { abs, atan2, ceil, cos, exp, floor, hypot, max, round } = Math;

/** Relative brightness of the bare plate, mean about 1, one value per pixel, row by row. */
export type ShadeField = { readonly widthPx: number; readonly heightPx: number; readonly pxPerMm: number; readonly shade: Float32Array };

type Size = { readonly widthPx: number; readonly heightPx: number; readonly pxPerMm: number };
type Shade = (x: number, y: number) => number;

export function surfaceTexture(surface: Surface, strength: number, size: Size, random: Random): ShadeField {
  const shadeAt = shadeOf(surface, size, random);
  const shade = new Float32Array(size.widthPx * size.heightPx);
  for (let y = 0; y < size.heightPx; y += 1) {
    for (let x = 0; x < size.widthPx; x += 1) {
      shade[y * size.widthPx + x] = max(0.05, 1 + strength * shadeAt(x, y));
    }
  }
  return { ...size, shade };
}

function shadeOf(surface: Surface, size: Size, random: Random): Shade {
  switch (surface) {
    case 'brushed':
      return brushed(size, random);
    case 'blasted':
      return blasted(size, random);
    case 'turned':
      return turned(size, random);
    case 'coated':
      return coated(size, random);
    case 'glossy':
      return glossy(size, random);
    case 'riven':
      return riven(size, random);
  }
}

/** Scratches along x: streaks of three widths, each fading in and out along its length. */
function brushed({ widthPx, heightPx, pxPerMm }: Size, random: Random): Shade {
  const streaks = grooves(heightPx, pxPerMm, random);
  const knotsPerRow = ceil(widthPx / (5 * pxPerMm)) + 2;
  const knots = whiteNoise(heightPx * knotsPerRow, random);
  const knotPx = 5 * pxPerMm;
  return (x, y) => {
    const knot = floor(x / knotPx);
    const along = x / knotPx - knot;
    const start = y * knotsPerRow + knot;
    const fade = (knots[start] ?? 0) * (1 - along) + (knots[start + 1] ?? 0) * along;
    return (streaks[y] ?? 0) + 0.075 * fade + 0.035 * (random() - 0.5);
  };
}

/** Fine facing marks around a centre beside the plate, with the two bright fans that turned faces show. */
function turned({ widthPx, heightPx, pxPerMm }: Size, random: Random): Shade {
  const centreX = widthPx * (0.42 + 0.16 * random());
  const centreY = heightPx * (0.44 + 0.12 * random());
  const rings = grooves(ceil(hypot(widthPx, heightPx)) + 2, pxPerMm, random);
  const fan = planeNoise(random);
  const axis = random() * Math.PI;
  return (x, y) => {
    const radius = hypot(x - centreX, y - centreY);
    const angle = atan2(y - centreY, x - centreX);
    const ring = floor(radius);
    const groove = (rings[ring] ?? 0) * (1 - radius + ring) + (rings[ring + 1] ?? 0) * (radius - ring);
    const fade = fan(angle * 5 + 40, radius / (0.35 * pxPerMm));
    return 0.85 * groove + 0.05 * fade + 0.1 * cos(2 * (angle - axis)) + 0.03 * (random() - 0.5);
  };
}

/** Peened by beads: grain in two sizes without direction, and a faint cloud. */
function blasted({ pxPerMm }: Size, random: Random): Shade {
  const grain = planeNoise(random);
  const cloud = planeNoise(random);
  const finePerPx = 1 / max(1.2, 0.11 * pxPerMm);
  const cloudPerPx = 1 / (14 * pxPerMm);
  return (x, y) =>
    0.11 * grain(x * finePerPx, y * finePerPx) + 0.06 * fractalNoise(cloud, x * cloudPerPx, y * cloudPerPx, 2) + 0.1 * (random() - 0.5);
}

/** Powder coat: orange peel, lit from the upper left, with grains that glint. */
function coated({ pxPerMm }: Size, random: Random): Shade {
  const peel = planeNoise(random);
  const perPx = 1 / (0.5 * pxPerMm);
  // The lattice of the noise is turned against the plate, or its rows would show as a weave.
  const height = (x: number, y: number) => fractalNoise(peel, (0.8 * x + 0.6 * y) * perPx, (0.8 * y - 0.6 * x) * perPx, 2);
  const stepPx = 0.07 * pxPerMm;
  return (x, y) => {
    const slope = height(x, y) - height(x + stepPx, y + stepPx);
    return 0.5 * slope + 0.1 * (random() - 0.5) + (random() > 0.9985 ? 0.5 : 0);
  };
}

/** Cast sheet: nearly even, a slanted reflection of a lamp and a few specks of dust. */
function glossy({ widthPx, heightPx, pxPerMm }: Size, random: Random): Shade {
  const wave = planeNoise(random);
  const perPx = 1 / (22 * pxPerMm);
  return (x, y) => {
    const slant = (x + 0.55 * y) / (widthPx + 0.55 * heightPx);
    const lamp = 0.34 * exp(-(((slant - 0.2) / 0.055) ** 2)) + 0.2 * exp(-(((slant - 0.31) / 0.018) ** 2));
    return lamp + 0.05 * fractalNoise(wave, x * perPx, y * perPx, 2) + 0.02 * (random() - 0.5);
  };
}

/** Split stone: layered relief lit from the side, darker seams, mineral grain. */
function riven({ pxPerMm }: Size, random: Random): Shade {
  const relief = planeNoise(random);
  const grain = planeNoise(random);
  const acrossPerPx = 1 / (11 * pxPerMm);
  const downPerPx = 1 / (5.5 * pxPerMm);
  const grainPerPx = 1 / max(1.2, 0.16 * pxPerMm);
  const height = (x: number, y: number) => fractalNoise(relief, x * acrossPerPx + y * 0.3 * acrossPerPx, y * downPerPx, 5);
  return (x, y) => {
    const here = height(x, y);
    const slope = here - height(x + 0.22 * pxPerMm, y + 0.22 * pxPerMm);
    const seam = max(0, 1 - abs(here) * 16);
    return 1.5 * slope + 0.22 * here - 0.1 * seam + 0.11 * grain(x * grainPerPx, y * grainPerPx) + 0.14 * (random() - 0.5);
  };
}

/** Depth of parallel scratches across their direction, in three widths. */
function grooves(length: number, pxPerMm: number, random: Random): Float32Array {
  const fine = whiteNoise(length, random);
  const middle = smoothed(whiteNoise(length, random), max(1, round(0.1 * pxPerMm)));
  const wide = smoothed(whiteNoise(length, random), max(2, round(0.5 * pxPerMm)));
  return fine.map((value, index) => 0.022 * value + 0.034 * (middle[index] ?? 0) + 0.024 * (wide[index] ?? 0));
}
