/** What the first bytes of a file say it is: the declared type and the file name are never believed. */
export type PhotoFormat = 'jpeg' | 'png' | 'webp';
export type SniffedFormat = PhotoFormat | 'heic' | 'other';

/** Bytes of the head that `sniffPhotoFormat` looks at. */
export const SNIFF_BYTES = 32;

const PNG_SIGNATURE = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
const JPEG_START = Buffer.from([0xff, 0xd8, 0xff]);
/** Brands of the ISO media container that phones use for HEIC, HEIF and AVIF pictures. */
const HEIF_BRANDS = new Set(['heic', 'heix', 'hevc', 'hevx', 'heim', 'heis', 'mif1', 'msf1', 'avif', 'avis']);

export function sniffPhotoFormat(head: Buffer): SniffedFormat {
  if (head.subarray(0, 3).equals(JPEG_START)) return 'jpeg';
  if (head.subarray(0, 8).equals(PNG_SIGNATURE)) return 'png';
  if (ascii(head, 0, 4) === 'RIFF' && ascii(head, 8, 12) === 'WEBP') return 'webp';
  if (ascii(head, 4, 8) === 'ftyp' && HEIF_BRANDS.has(ascii(head, 8, 12))) return 'heic';
  return 'other';
}

/** An animated PNG announces itself by an acTL chunk before its first picture data; decoders show its first frame without a word. */
export function isAnimatedPng(bytes: Buffer): boolean {
  let offset = PNG_SIGNATURE.length;
  while (offset + 8 <= bytes.length) {
    const type = ascii(bytes, offset + 4, offset + 8);
    if (type === 'acTL') return true;
    if (type === 'IDAT') return false;
    offset += 12 + bytes.readUInt32BE(offset);
  }
  return false;
}

function ascii(bytes: Buffer, start: number, end: number): string {
  return bytes.toString('latin1', start, end);
}
