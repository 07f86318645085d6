import { expectReferences } from '../../test/expect-reference';
import { labFromSrgb } from './lab-from-srgb';
import { labFromXyz } from './lab-from-xyz';
import { linearFromSrgb } from './linear-from-srgb';
import { COLOUR_WHITE } from './white-point';
import { xyzFromLinearRgb } from './xyz-from-linear-rgb';

const grey = (code: number) => ({ red: code, green: code, blue: code });

describe('labFromSrgb', () => {
  expectReferences<{ rgb: readonly [number, number, number] }>(
    'IEC 61966-2-1 decoding, 4-decimal matrix, white 0.95047/1/1.08883, CIE 1976 with epsilon=216/24389, kappa=24389/27',
    ({ rgb: [red, green, blue] }) => {
      const { lightness, a, b } = labFromSrgb({ red, green, blue });
      return { L: lightness, a, b, Y: xyzFromLinearRgb(linearFromSrgb({ red, green, blue })).y };
    },
  );

  // 40-digit arithmetic, matrix from the primaries and D65 (0.3127, 0.3290); two public colour libraries agree to 5 decimals.
  it.each([
    [{ red: 255, green: 0, blue: 0 }, [53.23711559542936, 80.09011352310382, 67.20326351172213]],
    [{ red: 0x33, green: 0x66, blue: 0x99 }, [42.00916349448234, -0.1459377477126643, -32.84513387150802]],
    [grey(0x0a), [2.741748000656518, 0, 0]],
  ])('is exact for %j, not rounded to a matrix of four decimals', (colour, [lightness, a, b]) => {
    const lab = labFromSrgb(colour);
    expect(lab.lightness).toBeCloseTo(lightness, 9);
    expect(lab.a).toBeCloseTo(a, 9);
    expect(lab.b).toBeCloseTo(b, 9);
  });

  it('gives every grey no colour and white a lightness of 100', () => {
    for (let code = 0; code <= 255; code += 1) {
      const { a, b } = labFromSrgb(grey(code));
      expect(Math.abs(a)).toBeLessThan(1e-12);
      expect(Math.abs(b)).toBeLessThan(1e-12);
    }
    expect(labFromSrgb(grey(255)).lightness).toBeCloseTo(100, 12);
    expect(labFromSrgb(grey(0)).lightness).toBe(0);
  });

  it('refuses a code beyond 8 bits and names the channel', () => {
    expect(() => labFromSrgb({ red: 12, green: 256, blue: 0 })).toThrow('green must be a number from 0 to 255, but is 256');
  });
});

describe('linearFromSrgb', () => {
  it('joins its two branches without a step', () => {
    const below = linearFromSrgb(grey(0.04045 * 255)).red;
    const above = linearFromSrgb(grey(0.040450001 * 255)).red;
    expect(above - below).toBeGreaterThan(0);
    expect(above - below).toBeLessThan(1e-7);
  });
});

describe('labFromXyz', () => {
  it('takes the white that it is given', () => {
    const white = { x: 0.9642, y: 1, z: 0.8251 };
    expect(labFromXyz(white, white)).toEqual({ lightness: 100, a: 0, b: 0 });
    expect(labFromXyz(COLOUR_WHITE)).toEqual({ lightness: 100, a: 0, b: 0 });
    expect(labFromXyz(COLOUR_WHITE, white).b).toBeLessThan(-10);
  });

  it('refuses a white without blue', () => {
    expect(() => labFromXyz(COLOUR_WHITE, { x: 0.95, y: 1, z: 0 })).toThrow('whiteZ must be a finite number above 0, but is 0');
  });
});
