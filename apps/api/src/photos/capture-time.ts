// The moment of exposure is the one thing of a camera's metadata that a coupon needs: everything else (place, serial numbers) is dropped.
const EXIF_POINTER = 0x8769;
const DATE_TIME_ORIGINAL = 0x9003;
const TEXT = 2;
const LONG = 4;
const ENTRY_BYTES = 12;
const MOST_ENTRIES = 512;
const EXIF_TIME = /^\d{4}:\d{2}:\d{2} \d{2}:\d{2}:\d{2}$/;

/**
 * Reads the time of exposure from an EXIF block: local time of the camera as it writes it, `YYYY:MM:DD HH:MM:SS`.
 * Anything malformed counts as absent: the block comes from a stranger.
 */
export function readCaptureTime(exif: Buffer): string | undefined {
  const start = exif.toString('latin1', 0, 6) === 'Exif\0\0' ? 6 : 0;
  const tiff = exif.subarray(start);
  const order = tiff.toString('latin1', 0, 2);
  if (order !== 'II' && order !== 'MM') return undefined;
  const reader = byteReader(tiff, order === 'II');
  const firstDirectory = reader.uint32(4);
  const exifDirectory = firstDirectory === undefined ? undefined : findEntry(reader, firstDirectory, EXIF_POINTER);
  if (exifDirectory?.type !== LONG) return undefined;
  const entry = findEntry(reader, exifDirectory.value, DATE_TIME_ORIGINAL);
  if (entry?.type !== TEXT || entry.count < 19) return undefined;
  const text = tiff.toString('latin1', entry.value, entry.value + 19);
  return isRealTime(text) ? text : undefined;
}

/** ISO 8601 without an offset: a camera's clock knows no time zone. */
export function captureTimeAsIso(captureTime: string): string {
  const [date = '', time = ''] = captureTime.split(' ');
  return `${date.replaceAll(':', '-')}T${time}`;
}

type Entry = { readonly type: number; readonly count: number; readonly value: number };
type ByteReader = ReturnType<typeof byteReader>;

function findEntry(reader: ByteReader, directory: number, wantedTag: number): Entry | undefined {
  const count = Math.min(reader.uint16(directory) ?? 0, MOST_ENTRIES);
  for (let index = 0; index < count; index += 1) {
    const at = directory + 2 + index * ENTRY_BYTES;
    if (reader.uint16(at) !== wantedTag) continue;
    const [type, length, value] = [reader.uint16(at + 2), reader.uint32(at + 4), reader.uint32(at + 8)];
    if (type === undefined || length === undefined || value === undefined) return undefined;
    return { type, count: length, value };
  }
  return undefined;
}

function byteReader(bytes: Buffer, isLittleEndian: boolean) {
  const fits = (offset: number, size: number) => offset >= 0 && offset + size <= bytes.length;
  return {
    uint16: (offset: number) => {
      if (!fits(offset, 2)) return undefined;
      return isLittleEndian ? bytes.readUInt16LE(offset) : bytes.readUInt16BE(offset);
    },
    uint32: (offset: number) => {
      if (!fits(offset, 4)) return undefined;
      return isLittleEndian ? bytes.readUInt32LE(offset) : bytes.readUInt32BE(offset);
    },
  };
}

function isRealTime(text: string): boolean {
  return EXIF_TIME.test(text) && !Number.isNaN(Date.parse(`${captureTimeAsIso(text)}Z`));
}
