import { createHash } from 'node:crypto';
import { arucoModules, couponLayout } from '@proofplate/imaging';
import sharp from 'sharp';
import { inverse, type Matrix3, plateToPicture, project } from './camera';
import { GROUND_KINDS, type GroundKind, groundOf } from './grounds';
import { type CouponPhotoOptions, renderCouponPhoto } from './render-coupon-photo';

const layout = couponLayout({ rows: 2, columns: 4, reference: 'C-0042' });
const dataMatrixModules = Array.from({ length: 12 }, (_, row) =>
  Array.from({ length: 12 }, (_, column) => column === 0 || row === 11 || (row * column) % 3 === 1),
);
const steady = { widthPx: 320, heightPx: 240, turnDeg: 4, tiltXDeg: 6, tiltYDeg: -5, fill: 0.94, distance: 3, shiftX: 0, shiftY: 0 };
const options = (ground: GroundKind): CouponPhotoOptions => ({
  layout,
  ground,
  cells: [
    { address: 'A1', lab: [45, 10, 12] },
    { address: 'A2', lab: [45, 10, 12], texture: { overburn: 1 } },
    { address: 'B4', lab: [55, -5, -20], texture: { mottle: 0.4, halo: 0.8 } },
  ],
  code: 'C-0042',
  dataMatrixModules,
  seed: 42,
  view: steady,
});

/** Mean grey of 3 x 3 pixels around a point of the plate. */
function greyAt(pixels: Buffer, matrix: Matrix3, xMm: number, yMm: number): number {
  const at = project(matrix, { x: xMm, y: yMm });
  let sum = 0;
  for (let dy = -1; dy <= 1; dy += 1) {
    for (let dx = -1; dx <= 1; dx += 1) {
      sum += pixels[(Math.floor(at.y) + dy) * steady.widthPx + Math.floor(at.x) + dx] ?? 0;
    }
  }
  return sum / 9;
}

describe('renderCouponPhoto', () => {
  it('gives the same bytes for the same seed and others for another', async () => {
    const digest = async (seed: number) =>
      createHash('sha256')
        .update((await renderCouponPhoto({ ...options('stainless brushed'), seed })).jpeg)
        .digest('hex');
    expect(await digest(1)).toBe(await digest(1));
    expect(await digest(1)).not.toBe(await digest(2));
  });

  it.each(GROUND_KINDS)('shows all four corner marks of %s dark on bright where the layout puts them', async (ground) => {
    const { jpeg } = await renderCouponPhoto(options(ground));
    const pixels = await sharp(jpeg).greyscale().raw().toBuffer();
    const matrix = plateToPicture(layout.plate.widthMm, layout.plate.heightMm, steady);
    for (const { id, rect } of layout.fiducials) {
      const moduleMm = rect.widthMm / 6;
      const greys = arucoModules(id).map((row, y) =>
        row.map((_, x) => greyAt(pixels, matrix, rect.xMm + (x + 0.5) * moduleMm, rect.yMm + (y + 0.5) * moduleMm)),
      );
      const threshold = (Math.min(...greys.flat()) + Math.max(...greys.flat())) / 2;
      expect(greys.map((row) => row.map((grey) => grey < threshold))).toEqual(arucoModules(id));
    }
  });

  it('tells the corners that the picture was projected with', async () => {
    const { truth } = await renderCouponPhoto(options('titanium satin'));
    const back = inverse(plateToPicture(layout.plate.widthMm, layout.plate.heightMm, steady));
    const onPlate = truth.corners.map(({ x, y }) => project(back, { x: x * steady.widthPx, y: y * steady.heightPx }));
    const { widthMm, heightMm } = layout.plate;
    const expected = [
      [0, 0],
      [widthMm, 0],
      [widthMm, heightMm],
      [0, heightMm],
    ];
    onPlate.forEach((corner, index) => {
      expect(corner.x).toBeCloseTo(expected[index]?.[0] ?? Number.NaN, 6);
      expect(corner.y).toBeCloseTo(expected[index]?.[1] ?? Number.NaN, 6);
    });
  });

  it('tells the colours that it painted, and that a pitted cell is less even', async () => {
    const { truth } = await renderCouponPhoto(options('stainless brushed'));
    const [plain, pitted] = truth.cells;
    expect(Math.abs((plain?.lab[0] ?? 0) - 45)).toBeLessThan(1.5);
    expect(Math.abs((plain?.lab[1] ?? 0) - 10)).toBeLessThan(1);
    expect(pitted?.evenness ?? 0).toBeGreaterThan(2 * (plain?.evenness ?? 0));
    expect(Math.abs(truth.groundLab[0] - groundOf('stainless brushed').lab[0])).toBeLessThan(2.5);
  });

  it('leaves the neutral card away when asked to', async () => {
    const { truth } = await renderCouponPhoto({ ...options('slate natural'), hasNeutralCard: false });
    expect(truth.cardLab).toBeUndefined();
  });

  it('is a JPEG of the asked size without metadata', async () => {
    const { jpeg } = await renderCouponPhoto(options('brass turned'));
    const metadata = await sharp(jpeg).metadata();
    expect(metadata).toMatchObject({ format: 'jpeg', width: 320, height: 240 });
    expect(metadata.exif).toBeUndefined();
  });

  it('refuses a cell that is not on the plate', async () => {
    await expect(renderCouponPhoto({ ...options('slate natural'), cells: [{ address: 'C1', lab: [50, 0, 0] }] })).rejects.toThrow(
      /on the layout/,
    );
  });
});
