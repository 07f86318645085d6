import { createHash } from 'node:crypto';
import sharp, { type Metadata, type Sharp } from 'sharp';
import { captureTimeAsIso, readCaptureTime } from './capture-time';
import { readProfileName } from './colour-profile';
import { isAnimatedPng, SNIFF_BYTES, sniffPhotoFormat } from './photo-format';
import { LONGEST_SIDE_PX, MOST_PIXELS, PhotoRefusedError } from './photo-refusals';

const DECODE_LIMIT_S = 10;
const MASTER_QUALITY = 93;
const VIEW_QUALITY = 85;
export const LARGE_SIDE_PX = 1600;
export const SMALL_SIDE_PX = 400;
const INPUT = { limitInputPixels: MOST_PIXELS, failOn: 'warning', pages: 1 } as const;

export type Rendition = { readonly bytes: Buffer; readonly sha256: string; readonly widthPx: number; readonly heightPx: number };

export type DevelopedPhoto = {
  readonly master: Rendition;
  readonly large: Rendition;
  readonly small: Rendition;
  /** Local time of the camera, ISO 8601 without an offset. */
  readonly capturedAt: string | undefined;
  /** Name of the embedded colour profile that was converted; absent: none embedded, taken as sRGB. */
  readonly sourceProfile: string | undefined;
};

/** Only the three decoders we accept exist in this process: SVG, TIFF, GIF, PDF and HEIF readers are refused before they see a byte. */
export function allowThreeDecodersOnly(): void {
  sharp.block({ operation: ['VipsForeignLoad'] });
  sharp.unblock({ operation: ['VipsForeignLoadJpeg', 'VipsForeignLoadPng', 'VipsForeignLoadWebp'] });
  sharp.concurrency(1);
  sharp.cache(false);
}

/**
 * Turns received bytes into the stored photo: an upright sRGB master and two smaller views, all freshly encoded, so that nothing that
 * rode along in the file (place, serial numbers, a second file behind the picture) survives.
 *
 * @throws PhotoRefusedError for a file that cannot become a photo
 */
export async function developPhoto(received: Buffer): Promise<DevelopedPhoto> {
  const metadata = await examine(received);
  const captureTime = metadata.exif ? readCaptureTime(metadata.exif) : undefined;
  const master = await decoding(() => encodeMaster(received, captureTime));
  return {
    master,
    large: await encodeView(master.bytes, LARGE_SIDE_PX),
    small: await encodeView(master.bytes, SMALL_SIDE_PX),
    capturedAt: captureTime === undefined ? undefined : captureTimeAsIso(captureTime),
    sourceProfile: metadata.icc ? (readProfileName(metadata.icc) ?? 'unnamed profile') : undefined,
  };
}

async function examine(received: Buffer): Promise<Metadata> {
  const format = sniffPhotoFormat(received.subarray(0, SNIFF_BYTES));
  if (format === 'other' || format === 'heic') throw new PhotoRefusedError('not-a-photo');
  const metadata = await decoding(() => sharp(received, { ...INPUT, pages: undefined }).metadata());
  if (metadata.format !== format) throw new PhotoRefusedError('not-a-photo');
  if ((metadata.pages ?? 1) > 1 || (format === 'png' && isAnimatedPng(received))) throw new PhotoRefusedError('animated');
  if (metadata.space === 'cmyk' || metadata.channels > 4) throw new PhotoRefusedError('four-colour');
  if (metadata.width * metadata.height > MOST_PIXELS) throw new PhotoRefusedError('too-many-pixels');
  if (Math.max(metadata.width, metadata.height) > LONGEST_SIDE_PX) throw new PhotoRefusedError('too-long-side');
  return metadata;
}

function encodeMaster(received: Buffer, captureTime: string | undefined): Promise<Rendition> {
  const upright = sharp(received, INPUT)
    .timeout({ seconds: DECODE_LIMIT_S })
    .autoOrient()
    .flatten({ background: '#ffffff' })
    .toColourspace('srgb')
    .jpeg({ quality: MASTER_QUALITY, chromaSubsampling: '4:4:4' });
  return encode(captureTime === undefined ? upright : upright.withExif({ IFD2: { DateTimeOriginal: captureTime } }));
}

function encodeView(master: Buffer, sidePx: number): Promise<Rendition> {
  const view = sharp(master, INPUT)
    .timeout({ seconds: DECODE_LIMIT_S })
    .resize({ width: sidePx, height: sidePx, fit: 'inside', withoutEnlargement: true })
    .jpeg({ quality: VIEW_QUALITY });
  return encode(view);
}

async function encode(image: Sharp): Promise<Rendition> {
  const { data, info } = await image.toBuffer({ resolveWithObject: true });
  return { bytes: data, sha256: createHash('sha256').update(data).digest('hex'), widthPx: info.width, heightPx: info.height };
}

/** The decoder's own words are for programmers; the person gets one of our sentences. */
async function decoding<T>(work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    const message = error instanceof Error ? error.message : String(error);
    if (/pixel limit/i.test(message)) throw new PhotoRefusedError('too-many-pixels');
    if (/timeout/i.test(message)) throw new PhotoRefusedError('too-slow');
    throw new PhotoRefusedError('unreadable');
  }
}
