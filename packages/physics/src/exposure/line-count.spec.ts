import { expectReference } from '../../test/expect-reference';
import { lineCount } from './line-count';

describe('lineCount', () => {
  expectReference('scan time of a filled rectangle', 'lines', ({ H_mm, h_mm }) => lineCount(H_mm, h_mm * 1000));
  expectReference('scan time of a filled rectangle', 'lines_crossed_second', ({ W_mm, h_mm }) => lineCount(W_mm, h_mm * 1000));

  it('is one line when the area is lower than the spacing', () => {
    expect(lineCount(0.01, 50)).toBe(1);
  });

  it('refuses an area without height', () => {
    expect(() => lineCount(0, 50)).toThrow('heightMm must be a finite number above 0, but is 0');
  });
});
