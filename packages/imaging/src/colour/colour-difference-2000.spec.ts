import fc from 'fast-check';
import { expectReferences } from '../../test/expect-reference';
import type { Lab } from './colour';
import { colourDifference2000 } from './colour-difference-2000';

type Triple = readonly [number, number, number];
type Pair = { readonly Lab1: Triple; readonly Lab2: Triple };

const lab = ([lightness, a, b]: Triple): Lab => ({ lightness, a, b });
const anyLab = fc.record({
  lightness: fc.double({ min: 0, max: 100, noNaN: true }),
  a: fc.double({ min: -120, max: 120, noNaN: true }),
  b: fc.double({ min: -120, max: 120, noNaN: true }),
});

describe('colourDifference2000', () => {
  expectReferences<Pair>('CIEDE2000, kL=kC=kH=1', ({ Lab1, Lab2 }) => ({ dE00: colourDifference2000(lab(Lab1), lab(Lab2)) }));

  // Sharma, Wu, Dalal (2005), table 1: pairs that the reference file does not hold.
  it.each<[number, Triple, Triple, number]>([
    [3, [50, 2.8361, -74.02], [50, 0, -82.7485], 3.4412],
    [9, [50, 2.49, -0.001], [50, -2.49, 0.0009], 7.1792],
    [15, [50, -0.001, 2.49], [50, 0.0011, -2.49], 4.7461],
    [21, [50, 2.5, 0], [50, 3.1736, 0.5854], 1],
    [27, [61.2901, 3.7196, -5.3901], [61.4292, 2.248, -4.962], 1.8731],
    [33, [6.7747, -0.2908, -2.4247], [5.8714, -0.0985, -2.2286], 0.6377],
  ])('gives the printed difference of pair %i', (_pair, one, other, printed) => {
    expect(Math.abs(colourDifference2000(lab(one), lab(other)) - printed)).toBeLessThanOrEqual(5.1e-5);
  });

  it('keeps exactly opposite hues on the printed side, either way round', () => {
    const pair10 = [lab([50, 2.49, -0.001]), lab([50, -2.49, 0.001])] as const;
    const pair14 = [lab([50, -0.001, 2.49]), lab([50, 0.001, -2.49])] as const;
    for (const [[one, other], printed] of [
      [pair10, 7.1792],
      [pair14, 4.8045],
    ] as const) {
      expect(colourDifference2000(one, other)).toBeCloseTo(printed, 4);
      expect(colourDifference2000(other, one)).toBeCloseTo(printed, 4);
    }
  });

  it('is none for the same colour, the same in either order and never negative', () => {
    fc.assert(
      fc.property(anyLab, anyLab, (one, other) => {
        expect(colourDifference2000(one, one)).toBe(0);
        const there = colourDifference2000(one, other);
        expect(there).toBeGreaterThanOrEqual(0);
        expect(Math.abs(there - colourDifference2000(other, one))).toBeLessThanOrEqual(1e-9 * (1 + there));
      }),
    );
  });

  it('compares two greys by lightness alone, and halves it with kL 2', () => {
    const dark = lab([40, 0, 0]);
    const light = lab([60, 0, 0]);
    expect(colourDifference2000(dark, light)).toBeCloseTo(20, 12);
    expect(colourDifference2000(dark, light, { kL: 2 })).toBeCloseTo(10, 12);
  });

  it('refuses what is not a number and a weight of zero', () => {
    const grey = lab([50, 0, 0]);
    expect(() => colourDifference2000(grey, lab([50, Number.NaN, 0]))).toThrow('otherA must be a finite number, but is NaN');
    expect(() => colourDifference2000(grey, grey, { kH: 0 })).toThrow('kH must be a finite number above 0, but is 0');
  });
});
