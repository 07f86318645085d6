import sharp, { type Sharp } from 'sharp';
import { sha256 } from './ledger-writer';

const MASTER_QUALITY = 93;
const VIEW_QUALITY = 85;
const LARGE_SIDE_PX = 1600;
const SMALL_SIDE_PX = 400;

export type Rendition = { readonly bytes: Buffer; readonly sha256: string; readonly widthPx: number; readonly heightPx: number };
export type DevelopedPhoto = { readonly master: Rendition; readonly large: Rendition; readonly small: Rendition };

/** A rendered picture as the api's worker keeps an uploaded one: an sRGB master and two smaller views of it. */
export async function developPhoto(received: Buffer): Promise<DevelopedPhoto> {
  const master = await encode(
    sharp(received)
      .autoOrient()
      .flatten({ background: '#ffffff' })
      .toColourspace('srgb')
      .jpeg({ quality: MASTER_QUALITY, chromaSubsampling: '4:4:4' }),
  );
  return { master, large: await encodeView(master.bytes, LARGE_SIDE_PX), small: await encodeView(master.bytes, SMALL_SIDE_PX) };
}

function encodeView(master: Buffer, sidePx: number): Promise<Rendition> {
  const view = sharp(master).resize({ width: sidePx, height: sidePx, fit: 'inside', withoutEnlargement: true });
  return encode(view.jpeg({ quality: VIEW_QUALITY }));
}

async function encode(image: Sharp): Promise<Rendition> {
  const { data, info } = await image.toBuffer({ resolveWithObject: true });
  return { bytes: data, sha256: sha256(data), widthPx: info.width, heightPx: info.height };
}
