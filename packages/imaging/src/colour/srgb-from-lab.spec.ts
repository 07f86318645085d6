import fc from 'fast-check';
import { labFromSrgb } from './lab-from-srgb';
import { srgbFromLab } from './srgb-from-lab';

describe('srgbFromLab', () => {
  it('comes back to any 8-bit colour', () => {
    const code = fc.integer({ min: 0, max: 255 });
    fc.assert(
      fc.property(code, code, code, (red, green, blue) => {
        const back = srgbFromLab(labFromSrgb({ red, green, blue }));
        expect(Math.abs(back.red - red)).toBeLessThan(1e-4);
        expect(Math.abs(back.green - green)).toBeLessThan(1e-4);
        expect(Math.abs(back.blue - blue)).toBeLessThan(1e-4);
      }),
    );
  });

  // sRGB primaries in CIELAB under D65, as tabulated for IEC 61966-2-1 with a matrix of four decimals.
  it.each([
    [{ lightness: 53.2408, a: 80.0925, b: 67.2032 }, [255, 0, 0]],
    [{ lightness: 87.7347, a: -86.1827, b: 83.1793 }, [0, 255, 0]],
    [{ lightness: 32.297, a: 79.1875, b: -107.8602 }, [0, 0, 255]],
  ])('shows %j as the primary', (lab, primary) => {
    const { red, green, blue } = srgbFromLab(lab);
    expect([red, green, blue].map(Math.round)).toEqual(primary);
  });

  it('cuts what no screen shows and refuses what is not a number', () => {
    const { red, green, blue } = srgbFromLab({ lightness: 60, a: 120, b: -120 });
    for (const channel of [red, green, blue]) expect(channel === Math.min(255, Math.max(0, channel))).toBe(true);
    expect(blue).toBe(255);
    expect(() => srgbFromLab({ lightness: Number.NaN, a: 0, b: 0 })).toThrow('lightness must be a finite number, but is NaN');
  });
});
