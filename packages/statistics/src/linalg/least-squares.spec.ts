import { leastSquares } from './least-squares';

describe('leastSquares', () => {
  it('returns the coefficients of an exact cubic', () => {
    const x = [-1, -0.5, 0, 0.25, 0.75, 1];
    const rows = x.map((value) => [1, value, value ** 2, value ** 3]);
    const found = leastSquares(
      rows,
      x.map((value) => 2 - 3 * value + 0.5 * value ** 2 + 4 * value ** 3),
    );
    for (const [index, expected] of [2, -3, 0.5, 4].entries()) expect(found[index]).toBeCloseTo(expected, 12);
  });

  it('leaves residuals that are orthogonal to the columns', () => {
    const rows = [1, 2, 3, 4, 5].map((x) => [1, x]);
    const y = [1.1, 1.9, 3.2, 3.8, 5.3];
    const [intercept, slope] = leastSquares(rows, y);
    const residuals = rows.map((row, i) => y[i] - intercept * row[0] - slope * row[1]);
    for (const column of [0, 1]) expect(residuals.reduce((sum, residual, i) => sum + residual * rows[i][column], 0)).toBeCloseTo(0, 12);
  });

  it('refuses dependent columns, too few rows and values that are not numbers', () => {
    expect(() =>
      leastSquares(
        [
          [1, 2],
          [2, 4],
          [3, 6],
        ],
        [1, 2, 3],
      ),
    ).toThrow('column 1 depends on those before it');
    expect(() => leastSquares([[1, 2]], [1])).toThrow(RangeError);
    expect(() => leastSquares([[1], [2]], [1])).toThrow('y must have as many values as rows (2), but has 1');
    expect(() => leastSquares([[1], [Number.NaN]], [1, 2])).toThrow('rows[1]');
  });
});
