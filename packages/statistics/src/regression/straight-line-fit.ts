import { mean } from '../descriptive/mean';

export type StraightLineFit = {
  readonly slope: number;
  readonly intercept: number;
  readonly slopeStandardError: number;
  readonly rSquared: number;
};

const MIN_POINTS = 3;

/**
 * Straight line by least squares.          slope = Sxy / Sxx, intercept = mean(y) - slope mean(x)
 *
 * @param x  positions, finite, at least 3, not all equal
 * @param y  values, finite, as many as x
 * @returns slope and its standard error (residuals over n - 2), intercept, share of the variation explained (1 when y is constant)
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
  return {
    slope,
    intercept,
    slopeStandardError: Math.sqrt(residual / (x.length - 2) / sxx),
    rSquared: total === 0 ? 1 : 1 - residual / total,
  };
}
