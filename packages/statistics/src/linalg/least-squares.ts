/** A pivot this small against the largest entry is rounding, not information. */
const RANK_TOLERANCE = 1e-13;

/**
 * Coefficients that minimise |X b - y|, by Householder QR.          R b = Q' y
 *
 * @param rows  design matrix X as n rows of p numbers, finite, n >= p >= 1; scale the columns to a like size
 * @param y     n values, finite
 * @returns p coefficients b
 * @throws RangeError when the shapes disagree, a value is not finite, or the columns depend on each other
 * Source: Golub, Van Loan, Matrix Computations, algorithm 5.2.1
 */
export function leastSquares(rows: readonly (readonly number[])[], y: readonly number[]): readonly number[] {
  const p = requireShape(rows, y);
  const a = rows.map((row, i) => [...row, y[i]]);
  const size = Math.max(...rows.flat().map(Math.abs));
  for (let k = 0; k < p; k += 1) {
    reflect(a, k);
    if (!(Math.abs(a[k][k]) > RANK_TOLERANCE * size))
      throw new RangeError(`rows must have independent columns, but column ${k} depends on those before it`);
  }
  const coefficients = new Array<number>(p).fill(0);
  for (let k = p - 1; k >= 0; k -= 1) {
    let rest = a[k][p];
    for (let j = k + 1; j < p; j += 1) rest -= a[k][j] * coefficients[j];
    coefficients[k] = rest / a[k][k];
  }
  return coefficients;
}

/** Zeroes column k below the diagonal and carries the reflection through the columns to its right, y included. */
function reflect(a: number[][], k: number): void {
  let norm = 0;
  for (let i = k; i < a.length; i += 1) norm = Math.hypot(norm, a[i][k]);
  if (norm === 0) return;
  const pivot = a[k][k] > 0 ? -norm : norm;
  const v = a.map((row, i) => (i < k ? 0 : row[k]));
  v[k] -= pivot;
  let square = 0;
  for (let i = k; i < v.length; i += 1) square += v[i] ** 2;
  for (let j = k; j < a[k].length; j += 1) {
    let dot = 0;
    for (let i = k; i < a.length; i += 1) dot += v[i] * a[i][j];
    for (let i = k; i < a.length; i += 1) a[i][j] -= (2 * dot * v[i]) / square;
  }
}

function requireShape(rows: readonly (readonly number[])[], y: readonly number[]): number {
  const p = rows.length > 0 ? rows[0].length : 0;
  if (p < 1 || rows.length < p) throw new RangeError(`rows must be at least as many as their ${p} columns, but are ${rows.length}`);
  if (y.length !== rows.length) throw new RangeError(`y must have as many values as rows (${rows.length}), but has ${y.length}`);
  for (const [i, row] of rows.entries()) {
    if (row.length !== p || !row.every(Number.isFinite))
      throw new RangeError(`rows[${i}] must be ${p} finite numbers, but is ${row.join(', ')}`);
    if (!Number.isFinite(y[i])) throw new RangeError(`y[${i}] must be a finite number, but is ${y[i]}`);
  }
  return p;
}
