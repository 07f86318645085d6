import { mean } from '../descriptive/mean';

export type StraightLineFit = {
  readonly slope: number;
  readonly intercept: number;
  readonly slopeStandardError: number;
  readonly interceptStandardError: number;
  /** Where the line is known best: slope and height there are uncorrelated. */
  readonly centre: { readonly x: number; readonly y: number; readonly yStandardError: number };
  readonly rSquared: number;
};

const MIN_POINTS = 3;

/**
 * Straight line by least squares.          slope = Sxy / Sxx, intercept = mean(y) - slope mean(x)
 *
 * @param x  positions, finite, at least 3, not all equal
 * @param y  values, finite, as many as x
 * @returns slope and intercept with their standard errors (residuals over n - 2), the means of x and y with the standard error of the
 *          line's height there, share of the variation explained (1 when y is constant)
 * @throws RangeError naming the argument and its value
 * Source: NIST/SEMATECH e-Handbook of Statistical Methods, 4.1.4.1
 */
export function straightLineFit(x: readonly number[], y: readonly number[]): StraightLineFit {
  if (x.length < MIN_POINTS) throw new RangeError(`x must have at least ${MIN_POINTS} values, but has ${x.length}`);
  if (y.length !== x.length) throw new RangeError(`y must have as many values as x (${x.length}), but has ${y.length}`);
  const meanX = mean(x);
  const meanY = mean(y);
  const sxx = x.reduce((sum, value) => sum + (value - meanX) ** 2, 0);
  if (sxx === 0) throw new RangeError(`x must differ, but all values are ${x[0]}`);
  const slope = x.reduce((sum, value, i) => sum + (value - meanX) * (y[i] - meanY), 0) / sxx;
  const intercept = meanY - slope * meanX;
  const residual = y.reduce((sum, value, i) => sum + (value - meanY - slope * (x[i] - meanX)) ** 2, 0);
  const total = y.reduce((sum, value) => sum + (value - meanY) ** 2, 0);
  const variance = residual / (x.length - 2);
  return {
    slope,
    intercept,
    slopeStandardError: Math.sqrt(variance / sxx),
    interceptStandardError: Math.sqrt(variance * (1 / x.length + meanX ** 2 / sxx)),
    centre: { x: meanX, y: meanY, yStandardError: Math.sqrt(variance / x.length) },
    rSquared: total === 0 ? 1 : 1 - residual / total,
  };
}
