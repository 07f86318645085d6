import { isAnimatedPng, sniffPhotoFormat } from './photo-format';

const head = (...parts: (string | number[])[]) =>
  Buffer.concat(parts.map((part) => (typeof part === 'string' ? Buffer.from(part, 'latin1') : Buffer.from(part))));
const chunk = (type: string, length: number) => {
  const bytes = Buffer.alloc(12 + length);
  bytes.writeUInt32BE(length, 0);
  bytes.write(type, 4, 'latin1');
  return bytes;
};
const PNG = head([0x89], 'PNG\r\n', [0x1a], '\n');

describe('sniffPhotoFormat', () => {
  it.each([
    ['jpeg', head([0xff, 0xd8, 0xff, 0xe1], 'Exif')],
    ['png', head(PNG.toString('latin1'), 'IHDR')],
    ['webp', head('RIFF', [1, 0, 0, 0], 'WEBPVP8 ')],
    ['heic', head([0, 0, 0, 24], 'ftypheic', [0, 0, 0, 0])],
    ['heic', head([0, 0, 0, 24], 'ftypmif1', [0, 0, 0, 0])],
    ['other', head('<svg xmlns="http://www.w3.org/2000/svg"/>')],
    ['other', head('<!doctype html><script>')],
    ['other', head('GIF89a')],
    ['other', head('II*', [0])],
    ['other', head('RIFF', [1, 0, 0, 0], 'WAVE')],
    ['other', head([0, 0, 0, 24], 'ftypisom')],
    ['other', Buffer.alloc(0)],
  ])('calls it %s by its first bytes', (format, bytes) => {
    expect(sniffPhotoFormat(bytes)).toBe(format);
  });
});

describe('isAnimatedPng', () => {
  it('finds the animation chunk before the picture data', () => {
    expect(isAnimatedPng(Buffer.concat([PNG, chunk('IHDR', 13), chunk('acTL', 8), chunk('IDAT', 4)]))).toBe(true);
  });

  it('takes a still picture as still, whatever follows its data', () => {
    expect(isAnimatedPng(Buffer.concat([PNG, chunk('IHDR', 13), chunk('IDAT', 4), chunk('acTL', 8)]))).toBe(false);
  });

  it('ends on a length that points past the end of the file', () => {
    const lying = chunk('tEXt', 4);
    lying.writeUInt32BE(0xffffffff, 0);
    expect(isAnimatedPng(Buffer.concat([PNG, lying]))).toBe(false);
  });
});
