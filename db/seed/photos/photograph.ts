import type { Bench } from './bench';
import { inverse, type Matrix3, type View } from './camera';
import { encodeSrgb } from './colour';
import type { Ground } from './grounds';
import type { Random } from './noise';
import { clamp, type PlateRaster } from './plate-raster';

// Taken out of Math once: the look-up of a global costs more than the call where a test runner wraps it.
const { abs, cos, exp, floor, hypot, max, min, sin, sqrt } = Math;

/** What the scene does to the picture besides geometry. */
export type Scene = {
  readonly ground: Ground;
  readonly bench: Bench;
  readonly plate: { readonly widthMm: number; readonly heightMm: number };
  /** Direction of the lamp in the picture, radians; 0 = from the right, clockwise. */
  readonly lampAngle: number;
  /** Fall of the light across the picture, 0 to 0.3. */
  readonly unevenness: number;
  /** Cast of the lamp per channel. */
  readonly cast: readonly [number, number, number];
};

const EDGE_RADIUS_MM = 0.9;
const BEVEL_MM = 0.45;
const SHADOW_MM = 2.6;
const EXPOSURE = 0.93;
const VIGNETTE = 0.09;
const READ_NOISE = 0.0016;
const SHOT_NOISE = 0.00009;

/** Takes the picture: 8-bit sRGB pixels, row by row. */
export function photograph(raster: PlateRaster, view: View, toPicture: Matrix3, scene: Scene, random: Random): Buffer {
  const exposed = expose(raster, view, inverse(toPicture), scene);
  return develop(softened(exposed, view.widthPx, view.heightPx), random);
}

function expose(raster: PlateRaster, { widthPx, heightPx }: View, toPlate: Matrix3, scene: Scene): Float32Array {
  const picture = new Float32Array(widthPx * heightPx * 3);
  const { widthMm, heightMm } = scene.plate;
  const [lampX, lampY] = [cos(scene.lampAngle), sin(scene.lampAngle)];
  for (let y = 0; y < heightPx; y += 1) {
    for (let x = 0; x < widthPx; x += 1) {
      const depth = toPlate[6] * (x + 0.5) + toPlate[7] * (y + 0.5) + toPlate[8];
      const xMm = (toPlate[0] * (x + 0.5) + toPlate[1] * (y + 0.5) + toPlate[2]) / depth;
      const yMm = (toPlate[3] * (x + 0.5) + toPlate[4] * (y + 0.5) + toPlate[5]) / depth;
      const acrossX = (x / widthPx - 0.5) * 2;
      const acrossY = (y / heightPx - 0.5) * 2;
      const fall = 1 + scene.unevenness * (acrossX * lampX + acrossY * lampY);
      const light = EXPOSURE * fall * (1 - VIGNETTE * (acrossX * acrossX + acrossY * acrossY));
      const outsideMm = roundedDistanceMm(xMm, yMm, widthMm, heightMm);
      const cover = clamp(0.5 - outsideMm * raster.pxPerMm * 0.75);
      const at = (y * widthPx + x) * 3;
      if (cover < 1) {
        const shadow = 1 - 0.62 * contactShadow(xMm + lampX * 1.1, yMm + lampY * 1.1, outsideMm, widthMm, heightMm);
        scene.bench(xMm, yMm).forEach((value, channel) => {
          picture[at + channel] = value * light * shadow * (1 - cover);
        });
      }
      if (cover > 0) {
        const shine = bevel(xMm, yMm, outsideMm, scene, lampX, lampY) * sheen(xMm / widthMm, yMm / heightMm, scene);
        addPlate(picture, at, raster, xMm, yMm, light * cover * shine);
      }
      for (let channel = 0; channel < 3; channel += 1) {
        picture[at + channel] = (picture[at + channel] ?? 0) * (scene.cast[channel] ?? 1);
      }
    }
  }
  return picture;
}

/** Adds the plate's light at a point, interpolated between four pixels. */
function addPlate(picture: Float32Array, at: number, raster: PlateRaster, xMm: number, yMm: number, light: number): void {
  const { widthPx, heightPx, pxPerMm, rgb } = raster;
  const x = min(widthPx - 1.001, max(0, xMm * pxPerMm - 0.5));
  const y = min(heightPx - 1.001, max(0, yMm * pxPerMm - 0.5));
  const [column, row] = [floor(x), floor(y)];
  const [right, down] = [x - column, y - row];
  const start = (row * widthPx + column) * 3;
  const below = start + widthPx * 3;
  for (let channel = 0; channel < 3; channel += 1) {
    const top = (rgb[start + channel] ?? 0) * (1 - right) + (rgb[start + 3 + channel] ?? 0) * right;
    const bottom = (rgb[below + channel] ?? 0) * (1 - right) + (rgb[below + 3 + channel] ?? 0) * right;
    picture[at + channel] = (picture[at + channel] ?? 0) + (top * (1 - down) + bottom * down) * light;
  }
}

/** Broad reflection of the lamp in the metal: a soft band that crosses the plate. */
function sheen(u: number, v: number, { ground, lampAngle }: Scene): number {
  const along = (u - 0.5) * cos(lampAngle) + (v - 0.5) * 0.45 * sin(lampAngle);
  return 1 + ground.sheen * (exp(-(((along - 0.1) / 0.34) ** 2)) - 0.62);
}

/** The broken edge of the plate: bright towards the lamp, dark away from it. */
function bevel(xMm: number, yMm: number, outsideMm: number, scene: Scene, lampX: number, lampY: number): number {
  const inMm = -outsideMm;
  if (inMm > BEVEL_MM) {
    return 1;
  }
  const { widthMm, heightMm } = scene.plate;
  const nearX = min(xMm, widthMm - xMm) < min(yMm, heightMm - yMm);
  const facing = nearX ? (xMm < widthMm / 2 ? -lampX : lampX) : yMm < heightMm / 2 ? -lampY : lampY;
  return max(0.35, 1 + 0.75 * facing * (1 - max(0, inMm) / BEVEL_MM));
}

/** Dark line where the plate touches the bench, and the soft shadow on the side away from the lamp. */
function contactShadow(xMm: number, yMm: number, outsideMm: number, widthMm: number, heightMm: number): number {
  const cast = exp(-((max(0, roundedDistanceMm(xMm, yMm, widthMm, heightMm)) / SHADOW_MM) ** 1.4));
  const contact = exp(-max(0, outsideMm) / 0.5);
  return min(1, 0.75 * cast + 0.55 * contact);
}

function roundedDistanceMm(xMm: number, yMm: number, widthMm: number, heightMm: number): number {
  const outX = abs(xMm - widthMm / 2) - widthMm / 2 + EDGE_RADIUS_MM;
  const outY = abs(yMm - heightMm / 2) - heightMm / 2 + EDGE_RADIUS_MM;
  return hypot(max(0, outX), max(0, outY)) + min(0, max(outX, outY)) - EDGE_RADIUS_MM;
}

/** The lens: each pixel shares a little light with its neighbours, first across, then down. */
function softened(picture: Float32Array, widthPx: number, heightPx: number): Float32Array {
  const across = softenedAlong(picture, 3, widthPx * 3, heightPx);
  return softenedAlong(across, widthPx * 3, widthPx * 3, heightPx);
}

function softenedAlong(picture: Float32Array, step: number, rowLength: number, heightPx: number): Float32Array {
  const result = new Float32Array(picture.length);
  for (let at = 0; at < rowLength * heightPx; at += 1) {
    const here = picture[at] ?? 0;
    result[at] = 0.64 * here + 0.18 * ((picture[at - step] ?? here) + (picture[at + step] ?? here));
  }
  return result;
}

/** The sensor: noise that grows with the light, then the sRGB curve. */
function develop(picture: Float32Array, random: Random): Buffer {
  const pixels = Buffer.alloc(picture.length);
  for (let at = 0; at < picture.length; at += 1) {
    const light = picture[at] ?? 0;
    const noise = (random() + random() + random() - 1.5) * 2;
    pixels[at] = encodeSrgb(light + noise * sqrt(READ_NOISE ** 2 + SHOT_NOISE * light));
  }
  return pixels;
}
