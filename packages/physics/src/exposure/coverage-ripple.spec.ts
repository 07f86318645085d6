import fc from 'fast-check';
import { expectReference } from '../../test/expect-reference';
import { coverageRipple } from './coverage-ripple';

const NAME = 'ripple of the accumulated fluence across a hatch of Gaussian lines';

describe('coverageRipple', () => {
  expectReference(NAME, 'contrast', ({ d_um, h_um }) => coverageRipple(d_um, h_um).contrast);
  expectReference(NAME, 'max_over_mean', ({ d_um, h_um }) => coverageRipple(d_um, h_um).maxOverMean);
  expectReference(NAME, 'min_over_mean', ({ d_um, h_um }) => coverageRipple(d_um, h_um).minOverMean);

  it('keeps its digits where a plain sum over lines would round to zero', () => {
    const radiusOverSpacing = 3;
    const { contrast } = coverageRipple(60, 10);
    expect(contrast / (2 * Math.exp((-(Math.PI ** 2) * radiusOverSpacing ** 2) / 2))).toBeCloseTo(1, 12);
  });

  it('does not jump where it changes from one sum to the other', () => {
    const below = coverageRipple(40, 40 / 0.8 + 1e-9);
    const above = coverageRipple(40, 40 / 0.8 - 1e-9);
    for (const key of ['contrast', 'maxOverMean', 'minOverMean'] as const) expect(below[key]).toBeCloseTo(above[key], 9);
  });

  it('grows with the spacing and stays between 0 and 1', () => {
    const spacing = fc.double({ min: 5, max: 500, noNaN: true });
    fc.assert(
      fc.property(spacing, (spacingUm) => {
        const narrow = coverageRipple(50, spacingUm).contrast;
        const wide = coverageRipple(50, spacingUm * 1.1).contrast;
        expect(narrow).toBeGreaterThanOrEqual(0);
        expect(wide).toBeGreaterThanOrEqual(narrow);
        expect(wide).toBeLessThanOrEqual(1);
      }),
    );
  });

  it('refuses a spacing of zero', () => {
    expect(() => coverageRipple(40, 0)).toThrow('lineSpacingUm must be a finite number above 0, but is 0');
  });
});
