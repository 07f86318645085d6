import { captureTimeAsIso, readCaptureTime } from './capture-time';

/** EXIF block with one directory that points to a second one holding the time. */
function exifBlock(time: string, { isLittleEndian = true, prefix = 'Exif\0\0' } = {}): Buffer {
  const tiff = Buffer.alloc(80);
  const u16 = (value: number, at: number) => (isLittleEndian ? tiff.writeUInt16LE(value, at) : tiff.writeUInt16BE(value, at));
  const u32 = (value: number, at: number) => (isLittleEndian ? tiff.writeUInt32LE(value, at) : tiff.writeUInt32BE(value, at));
  tiff.write(isLittleEndian ? 'II' : 'MM', 0, 'latin1');
  u16(42, 2);
  u32(8, 4);
  u16(1, 8);
  u16(0x8769, 10);
  u16(4, 12);
  u32(1, 14);
  u32(26, 18);
  u16(1, 26);
  u16(0x9003, 28);
  u16(2, 30);
  u32(20, 32);
  u32(50, 36);
  tiff.write(time, 50, 'latin1');
  return Buffer.concat([Buffer.from(prefix, 'latin1'), tiff]);
}

describe('readCaptureTime', () => {
  it('reads both byte orders, with and without the leading mark', () => {
    for (const isLittleEndian of [true, false]) {
      for (const prefix of ['Exif\0\0', '']) {
        expect(readCaptureTime(exifBlock('2024:02:29 23:59:58', { isLittleEndian, prefix }))).toBe('2024:02:29 23:59:58');
      }
    }
  });

  it.each(['    :  :     :  :  ', '2024:13:01 00:00:00', '2024:02:01 25:00:00', 'yesterday, at noon '])('takes %j as absent', (time) => {
    expect(readCaptureTime(exifBlock(time))).toBeUndefined();
  });

  it('survives a block cut at any byte', () => {
    const whole = exifBlock('2024:02:29 23:59:58');
    for (let length = 0; length < whole.length; length += 1) {
      expect([undefined, '2024:02:29 23:59:58']).toContain(readCaptureTime(whole.subarray(0, length)));
    }
  });
});

describe('captureTimeAsIso', () => {
  it('rewrites the date and adds no offset', () => {
    expect(captureTimeAsIso('2024:02:29 23:59:58')).toBe('2024-02-29T23:59:58');
  });
});
