import { deflateSync } from 'node:zlib';
import sharp from 'sharp';
import { allowThreeDecodersOnly, developPhoto } from './photo-pipeline';
import type { RefusalCode } from './photo-refusals';

allowThreeDecodersOnly();

const WIDTH_PX = 240;
const HEIGHT_PX = 160;
const RED = { r: 220, g: 20, b: 20 };
const BLUE = { r: 20, g: 20, b: 220 };

/** Blue field with a red quarter at the upper left: its place tells which way is up. */
function marked() {
  const corner = { create: { width: WIDTH_PX / 2, height: HEIGHT_PX / 2, channels: 3 as const, background: RED } };
  return sharp({ create: { width: WIDTH_PX, height: HEIGHT_PX, channels: 3, background: BLUE } }).composite([
    { input: corner, left: 0, top: 0 },
  ]);
}

const markedJpeg = () => marked().jpeg({ quality: 95 }).toBuffer();

async function redCentre(bytes: Buffer): Promise<{ x: number; y: number }> {
  const { data, info } = await sharp(bytes).raw().toBuffer({ resolveWithObject: true });
  let [count, sumX, sumY] = [0, 0, 0];
  for (let index = 0; index < info.width * info.height; index += 1) {
    if ((data[index * 3] ?? 0) < 120) continue;
    count += 1;
    sumX += index % info.width;
    sumY += Math.floor(index / info.width);
  }
  return { x: sumX / count / info.width, y: sumY / count / info.height };
}

/** A PNG of one bit per pixel, all black: a few kB that unpack to any number of pixels. */
function blackPng(widthPx: number, heightPx: number, extraChunks: Buffer[] = []): Buffer {
  const header = Buffer.alloc(13);
  header.writeUInt32BE(widthPx, 0);
  header.writeUInt32BE(heightPx, 4);
  header[8] = 1;
  const rows = Buffer.alloc((1 + Math.ceil(widthPx / 8)) * heightPx);
  const signature = Buffer.from('89504e470d0a1a0a', 'hex');
  return Buffer.concat([
    signature,
    chunk('IHDR', header),
    ...extraChunks,
    chunk('IDAT', deflateSync(rows)),
    chunk('IEND', Buffer.alloc(0)),
  ]);
}

function chunk(type: string, body: Buffer): Buffer {
  const named = Buffer.concat([Buffer.from(type, 'latin1'), body]);
  const [length, check] = [Buffer.alloc(4), Buffer.alloc(4)];
  length.writeUInt32BE(body.length);
  check.writeUInt32BE(crc32(named));
  return Buffer.concat([length, named, check]);
}

function crc32(bytes: Buffer): number {
  let crc = 0xffffffff;
  for (const byte of bytes) {
    crc ^= byte;
    for (let bit = 0; bit < 8; bit += 1) crc = (crc >>> 1) ^ (crc & 1 ? 0xedb88320 : 0);
  }
  return (crc ^ 0xffffffff) >>> 0;
}

/** The same JPEG with an EXIF orientation, the way a phone writes it. */
async function withOrientation(orientation: number): Promise<Buffer> {
  const jpeg = await marked()
    .jpeg({ quality: 95 })
    .withExif({ IFD0: { ImageDescription: 'plate' } })
    .toBuffer();
  const tag = jpeg.indexOf(Buffer.from([0x12, 0x01, 0x03, 0x00, 0x01, 0x00, 0x00, 0x00]));
  jpeg.writeUInt16LE(orientation, tag + 8);
  return jpeg;
}

async function expectRefused(bytes: Buffer, code: RefusalCode): Promise<void> {
  await expect(developPhoto(bytes)).rejects.toMatchObject({ name: 'PhotoRefusedError', code });
}

describe('developPhoto', () => {
  it('makes an upright master and two views, none larger than the photo was', async () => {
    const large = await sharp({ create: { width: 2000, height: 1000, channels: 3, background: BLUE } })
      .jpeg()
      .toBuffer();
    const photo = await developPhoto(large);
    expect([photo.master, photo.large, photo.small].map((view) => [view.widthPx, view.heightPx])).toEqual([
      [2000, 1000],
      [1600, 800],
      [400, 200],
    ]);
    const small = await developPhoto(await markedJpeg());
    expect([small.large.widthPx, small.small.widthPx]).toEqual([WIDTH_PX, WIDTH_PX]);
  });

  it('stores the master with full colour resolution and a hash of its own bytes', async () => {
    const { master } = await developPhoto(await markedJpeg());
    expect((await sharp(master.bytes).metadata()).chromaSubsampling).toBe('4:4:4');
    expect(master.sha256).toMatch(/^[0-9a-f]{64}$/);
    expect((await developPhoto(await markedJpeg())).master.sha256).toBe(master.sha256);
  });

  // Where the upper left quarter of the sensor belongs in the upright picture.
  it.each([
    [1, 0.25, 0.25, false],
    [2, 0.75, 0.25, false],
    [3, 0.75, 0.75, false],
    [4, 0.25, 0.75, false],
    [5, 0.25, 0.25, true],
    [6, 0.75, 0.25, true],
    [7, 0.75, 0.75, true],
    [8, 0.25, 0.75, true],
  ])('turns EXIF orientation %i upright', async (orientation, x, y, isTurned) => {
    const { master } = await developPhoto(await withOrientation(orientation));
    expect([master.widthPx, master.heightPx]).toEqual(isTurned ? [HEIGHT_PX, WIDTH_PX] : [WIDTH_PX, HEIGHT_PX]);
    const centre = await redCentre(master.bytes);
    expect(centre.x).toBeCloseTo(x, 1);
    expect(centre.y).toBeCloseTo(y, 1);
    expect((await sharp(master.bytes).metadata()).orientation ?? 1).toBe(1);
  });

  it('keeps the time of exposure and drops place, maker and serial number', async () => {
    const tagged = await marked()
      .jpeg()
      .withExif({
        IFD0: { Make: 'Northlight', Model: 'N-900' },
        IFD2: { DateTimeOriginal: '2024:05:01 12:34:56', BodySerialNumber: 'SN-778899' },
        IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1' },
      })
      .toBuffer();
    for (const secret of ['Northlight', 'SN-778899']) expect(tagged.includes(secret)).toBe(true);
    const photo = await developPhoto(tagged);
    expect(photo.capturedAt).toBe('2024-05-01T12:34:56');
    expect(photo.master.bytes.includes('2024:05:01 12:34:56')).toBe(true);
    for (const view of [photo.master, photo.large, photo.small]) {
      for (const secret of ['Northlight', 'N-900', 'SN-778899']) expect(view.bytes.includes(secret)).toBe(false);
      const exif = (await sharp(view.bytes).metadata()).exif ?? Buffer.alloc(0);
      // 0x8825 points to the block of positions; little-endian as the encoder writes it
      expect(exif.includes(Buffer.from([0x25, 0x88, 0x04, 0x00]))).toBe(false);
    }
  });

  it('converts an embedded colour profile to sRGB and names it', async () => {
    const wide = await sharp({ create: { width: 60, height: 40, channels: 3, background: '#00ff00' } })
      .withIccProfile('p3')
      .jpeg({ quality: 100 })
      .toBuffer();
    const photo = await developPhoto(wide);
    expect(photo.sourceProfile).toContain('P3');
    const stored = await sharp(photo.master.bytes).metadata();
    expect(stored.hasProfile).toBe(false);
    // In the wide profile this green is written (117, 251, 76): only a converted master gives it back as it was.
    const [red = 255, green = 0] = await sharp(photo.master.bytes).raw().toBuffer();
    expect(red).toBeLessThan(12);
    expect(green).toBeGreaterThan(245);
    expect((await developPhoto(await markedJpeg())).sourceProfile).toBeUndefined();
  });

  it('takes a 16-bit PNG, a transparent PNG and a WebP', async () => {
    const deep = await marked().toColourspace('rgb16').png().toBuffer();
    const clear = await sharp({ create: { width: 40, height: 40, channels: 4, background: { r: 0, g: 0, b: 0, alpha: 0 } } })
      .png()
      .toBuffer();
    const webp = await marked().webp().toBuffer();
    for (const bytes of [deep, clear, webp]) {
      const { master } = await developPhoto(bytes);
      expect(await sharp(master.bytes).metadata()).toMatchObject({ format: 'jpeg', channels: 3, depth: 'uchar' });
    }
  });

  it('loses whatever is glued to the end of a picture', async () => {
    const polyglot = Buffer.concat([await markedJpeg(), Buffer.from('<script>alert(1)</script>PK\u0003\u0004')]);
    const photo = await developPhoto(polyglot);
    for (const view of [photo.master, photo.large, photo.small]) expect(view.bytes.includes('<script>')).toBe(false);
  });

  it('refuses a small file that unpacks to 256 million pixels', async () => {
    const bomb = blackPng(16_000, 16_000);
    expect(bomb.length).toBeLessThan(100_000);
    await expectRefused(bomb, 'too-many-pixels');
  });

  it('refuses a strip longer than the longest side', async () => {
    await expectRefused(blackPng(20_000, 100), 'too-long-side');
  });

  it('refuses what is no picture: vector drawing, page, empty file, page named as a photo', async () => {
    await expectRefused(Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" width="10" height="10"/>'), 'not-a-photo');
    await expectRefused(Buffer.from('<!doctype html><script>alert(1)</script>'), 'not-a-photo');
    await expectRefused(Buffer.alloc(0), 'not-a-photo');
    await expectRefused(Buffer.from('GIF89a\u0001\u0000\u0001\u0000'), 'not-a-photo');
  });

  it('refuses a page or a drawing behind the first bytes of a photo', async () => {
    await expectRefused(Buffer.concat([Buffer.from([0xff, 0xd8, 0xff]), Buffer.from('<html><script>alert(1)</script>')]), 'unreadable');
    await expectRefused(
      Buffer.concat([Buffer.from('89504e470d0a1a0a', 'hex'), Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>')]),
      'unreadable',
    );
  });

  it.each(['jpeg', 'png', 'webp'] as const)('refuses a %s that is cut off', async (format) => {
    const noise = Buffer.from(Array.from({ length: WIDTH_PX * HEIGHT_PX * 3 }, (_, index) => (index * 2_654_435_761) >>> 24));
    const whole = await sharp(noise, { raw: { width: WIDTH_PX, height: HEIGHT_PX, channels: 3 } })
      .toFormat(format)
      .toBuffer();
    await expectRefused(whole.subarray(0, Math.floor(whole.length * 0.6)), 'unreadable');
  });

  it('refuses animations, in WebP and in PNG', async () => {
    const frames = Buffer.concat([Buffer.alloc(40 * 40 * 3, 10), Buffer.alloc(40 * 40 * 3, 200)]);
    const animated = await sharp(frames, { raw: { width: 40, height: 80, channels: 3, pageHeight: 40 } })
      .webp({ loop: 0 })
      .toBuffer();
    await expectRefused(animated, 'animated');
    await expectRefused(blackPng(64, 64, [chunk('acTL', Buffer.from([0, 0, 0, 2, 0, 0, 0, 0]))]), 'animated');
  });

  it('refuses a file prepared for four-colour printing', async () => {
    await expectRefused(await marked().toColourspace('cmyk').jpeg().toBuffer(), 'four-colour');
  });
});
