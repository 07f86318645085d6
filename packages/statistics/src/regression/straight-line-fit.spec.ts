import { straightLineFit } from './straight-line-fit';

describe('straightLineFit', () => {
  it('finds an exact line', () => {
    const fit = straightLineFit([1, 2, 4], [5, 7, 11]);
    expect(fit.slope).toBeCloseTo(2, 12);
    expect(fit.intercept).toBeCloseTo(3, 12);
    expect(fit.slopeStandardError).toBeCloseTo(0, 12);
    expect(fit.rSquared).toBeCloseTo(1, 12);
  });

  it('gives the numbers worked out by hand for points off a line', () => {
    const fit = straightLineFit([0, 1, 2, 3], [0, 2, 1, 3]);
    expect(fit.slope).toBeCloseTo(0.8, 12);
    expect(fit.intercept).toBeCloseTo(0.3, 12);
    expect(fit.rSquared).toBeCloseTo(0.64, 12);
    expect(fit.slopeStandardError).toBeCloseTo(Math.sqrt(1.8 / 2 / 5), 12);
    expect(fit.interceptStandardError).toBeCloseTo(Math.sqrt(0.9 * (1 / 4 + 1.5 ** 2 / 5)), 12);
    expect(fit.centre.x).toBeCloseTo(1.5, 12);
    expect(fit.centre.y).toBeCloseTo(1.5, 12);
    expect(fit.centre.yStandardError).toBeCloseTo(Math.sqrt(0.9 / 4), 12);
  });

  it('refuses equal positions, two points and unequal lists', () => {
    expect(() => straightLineFit([2, 2, 2], [1, 2, 3])).toThrow('x must differ, but all values are 2');
    expect(() => straightLineFit([1, 2], [1, 2])).toThrow('x must have at least 3 values, but has 2');
    expect(() => straightLineFit([1, 2, 3], [1, 2])).toThrow('y must have as many values as x (3), but has 2');
  });
});
