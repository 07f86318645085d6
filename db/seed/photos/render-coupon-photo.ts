import type { CouponLayout } from '@proofplate/imaging';
import sharp from 'sharp';
import { benchOf } from './bench';
import { plateCorners, plateToPicture, project, type View } from './camera';
import type { Lab } from './colour';
import { type GroundKind, groundOf } from './grounds';
import { type Random, seededRandom } from './noise';
import { CARD_LAB, type PhotoCell, paintPlate } from './paint-plate';
import { photograph } from './photograph';
import { measureRect } from './plate-raster';

export type CouponPhotoOptions = {
  readonly layout: CouponLayout;
  readonly ground: GroundKind;
  /** Burnt cells; cells of the layout that are left out stay bare. */
  readonly cells: readonly PhotoCell[];
  readonly code: string;
  /** Data Matrix without quiet zone, true = dark. */
  readonly dataMatrixModules: readonly (readonly boolean[])[];
  readonly seed: number;
  /** What is left out is chosen by the seed, as a steady hand would. */
  readonly view?: Partial<View>;
  readonly hasNeutralCard?: boolean;
};

export type CouponPhotoTruth = {
  /** Plate corners clockwise from its top left, as fractions of the picture's width and height. */
  readonly corners: readonly { readonly x: number; readonly y: number }[];
  readonly cells: readonly { readonly address: string; readonly lab: Lab; readonly evenness: number }[];
  readonly groundLab: Lab;
  readonly cardLab?: Lab;
};

export type CouponPhoto = { readonly jpeg: Buffer; readonly widthPx: number; readonly heightPx: number; readonly truth: CouponPhotoTruth };

const JPEG_QUALITY = 92;
/** The plate is painted a little finer than the picture sees it. */
const OVERSAMPLING = 1.3;
/** Edge of a cell that is left out of its colour: there the beam turns round. */
const CELL_INSET_MM = 0.6;

/**
 * Invented photograph of a coupon, as a phone on a stand would take it, with what is true about it.
 *
 * The same options give the same bytes on one platform. Truth colours are CIELAB (D65) of the plate itself, before lamp, lens and
 * sensor; evenness is the standard deviation of L* over 0.1 mm blocks of the cell's inside.
 */
export async function renderCouponPhoto(options: CouponPhotoOptions): Promise<CouponPhoto> {
  const random = seededRandom(options.seed);
  const ground = groundOf(options.ground);
  const { plate } = options.layout;
  const view = steadyView(options.view ?? {}, random);
  const hasNeutralCard = options.hasNeutralCard ?? true;
  const toPicture = plateToPicture(plate.widthMm, plate.heightMm, view);
  const corners = plateCorners(plate.widthMm, plate.heightMm).map((corner) => project(toPicture, corner));
  const [topLeft, topRight] = corners;
  const pxPerMm = Math.hypot((topRight?.x ?? 0) - (topLeft?.x ?? 0), (topRight?.y ?? 0) - (topLeft?.y ?? 0)) / plate.widthMm;
  const raster = paintPlate({ ...options, ground, hasNeutralCard }, pxPerMm * OVERSAMPLING, random);
  const scene = {
    ground,
    plate,
    bench: benchOf(ground.bench, random),
    lampAngle: -2.5 + 0.6 * random(),
    unevenness: 0.05 + 0.06 * random(),
    cast: [1.012 + 0.012 * random(), 1, 0.965 + 0.02 * random()] as const,
  };
  const pixels = photograph(raster, view, toPicture, scene, random);
  const jpeg = await sharp(pixels, { raw: { width: view.widthPx, height: view.heightPx, channels: 3 } })
    .jpeg({ quality: JPEG_QUALITY, chromaSubsampling: '4:4:4' })
    .toBuffer();
  const rects = new Map(options.layout.cells.map((cell) => [cell.address, cell.rect]));
  const cells = options.cells.flatMap(({ address }) => {
    const rect = rects.get(address);
    return rect === undefined ? [] : [{ address, ...measureRect(raster, rect, Math.min(CELL_INSET_MM, rect.widthMm / 5)) }];
  });
  return {
    jpeg,
    widthPx: view.widthPx,
    heightPx: view.heightPx,
    truth: {
      corners: corners.map(({ x, y }) => ({ x: x / view.widthPx, y: y / view.heightPx })),
      cells,
      groundLab: measureRect(raster, options.layout.groundPatch, CELL_INSET_MM).lab,
      ...(hasNeutralCard ? { cardLab: CARD_LAB } : {}),
    },
  };
}

function steadyView(chosen: Partial<View>, random: Random): View {
  const around = (spread: number) => (random() - 0.5) * 2 * spread;
  return {
    widthPx: 1600,
    heightPx: 1200,
    turnDeg: around(2.2),
    tiltXDeg: 3 + around(4),
    tiltYDeg: around(4),
    fill: 0.9,
    distance: 3.2,
    shiftX: around(0.015),
    shiftY: around(0.008),
    ...chosen,
  };
}
