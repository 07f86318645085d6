import { expectReferences } from '../../test/expect-reference';
import { colourDifference76 } from './colour-difference-76';
import { colourDifference2000 } from './colour-difference-2000';

type Triple = readonly [number, number, number];

const lab = ([lightness, a, b]: Triple) => ({ lightness, a, b });

describe('colourDifference76', () => {
  expectReferences<{ Lab1: Triple; Lab2: Triple }>('CIEDE2000, kL=kC=kH=1; CIE76=sqrt(sum of squares)', ({ Lab1, Lab2 }) => ({
    dE00: colourDifference2000(lab(Lab1), lab(Lab2)),
    dE76: colourDifference76(lab(Lab1), lab(Lab2)),
  }));

  it('refuses a lightness that is not a number', () => {
    expect(() => colourDifference76(lab([Number.NaN, 0, 0]), lab([50, 0, 0]))).toThrow('oneLightness must be a finite number, but is NaN');
  });
});
