import { letteringStrokesMm, letteringWidthMm } from './single-line-lettering';

const EVERY_GLYPH = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789-';

describe('letteringStrokesMm', () => {
  it('keeps every glyph inside its box and fills the full height of letters and digits', () => {
    for (const glyph of EVERY_GLYPH) {
      const points = letteringStrokesMm(glyph, 3).flat();
      const ys = points.map((point) => point.yMm);
      expect(Math.min(...points.map((point) => point.xMm))).toBeGreaterThanOrEqual(0);
      expect(Math.max(...points.map((point) => point.xMm))).toBeLessThanOrEqual(letteringWidthMm(glyph, 3));
      if (glyph !== '-') {
        expect([Math.min(...ys), Math.max(...ys)]).toEqual([0, 3]);
      }
    }
  });

  it('draws every glyph differently', () => {
    const drawn = [...EVERY_GLYPH].map((glyph) => JSON.stringify(letteringStrokesMm(glyph, 12)));
    expect(new Set(drawn).size).toBe(EVERY_GLYPH.length);
  });

  it('sets glyphs side by side without touching', () => {
    const [first, second] = [letteringStrokesMm('H', 12), letteringStrokesMm('HH', 12).slice(3)];
    expect(Math.min(...second.flat().map((point) => point.xMm))).toBe(Math.max(...first.flat().map((point) => point.xMm)) + 3);
  });

  it.each(['', 'a', 'C 1', 'É', 'constructor'])('refuses %p', (text) => {
    expect(() => letteringStrokesMm(text, 3)).toThrow(/text must be/);
  });

  it.each([0, -1, Number.NaN, Number.POSITIVE_INFINITY])('refuses the height %p', (heightMm) => {
    expect(() => letteringWidthMm('A', heightMm)).toThrow(/heightMm must be/);
  });
});
