import { requireFinite } from '../arguments/require-finite';

const MIN_POINTS = 3;

/**
 * Slopes of the monotone piecewise cubic through points.
 *   inside: (w1 + w2) / (w1/m1 + w2/m2), w1 = 2 h2 + h1, w2 = h2 + 2 h1, 0 where the secants m1, m2 change sign or vanish
 *   ends:   three-point formula, limited so that the curve keeps the sign and at most three times the slope of the secant
 *
 * @param x  positions, strictly increasing, finite, at least 3
 * @param y  values, finite, as many as x
 * @returns slope at each point, unit of y over unit of x
 * @throws RangeError naming the argument and the pair that is out of order
 * Valid for any values; monotone wherever the points are.
 * Source: F. N. Fritsch, J. Butland, SIAM J. Sci. Stat. Comput. 5 (1984) 300; F. N. Fritsch, R. E. Carlson,
 *         SIAM J. Numer. Anal. 17 (1980) 238; same rule as SciPy PchipInterpolator; docs/science/power-calibration.md
 */
export function pchipSlopes(x: readonly number[], y: readonly number[]): readonly number[] {
  if (x.length < MIN_POINTS) throw new RangeError(`x must have at least ${MIN_POINTS} points, but has ${x.length}`);
  if (y.length !== x.length) throw new RangeError(`y must have as many points as x (${x.length}), but has ${y.length}`);
  const steps: number[] = [];
  const secants: number[] = [];
  for (let i = 0; i < x.length; i += 1) {
    requireFinite({ [`x[${i}]`]: x[i], [`y[${i}]`]: y[i] });
    if (i === 0) continue;
    if (x[i] <= x[i - 1]) throw new RangeError(`x must increase strictly, but x[${i - 1}] is ${x[i - 1]} and x[${i}] is ${x[i]}`);
    steps.push(x[i] - x[i - 1]);
    secants.push((y[i] - y[i - 1]) / (x[i] - x[i - 1]));
  }
  const last = secants.length - 1;
  const inner = secants.slice(1).map((secant, i) => innerSlope(steps[i], steps[i + 1], secants[i], secant));
  return [
    endSlope(steps[0], steps[1], secants[0], secants[1]),
    ...inner,
    endSlope(steps[last], steps[last - 1], secants[last], secants[last - 1]),
  ];
}

function innerSlope(stepBefore: number, stepAfter: number, secantBefore: number, secantAfter: number): number {
  if (secantBefore * secantAfter <= 0) return 0;
  const weightBefore = 2 * stepAfter + stepBefore;
  const weightAfter = stepAfter + 2 * stepBefore;
  return (weightBefore + weightAfter) / (weightBefore / secantBefore + weightAfter / secantAfter);
}

function endSlope(step: number, nextStep: number, secant: number, nextSecant: number): number {
  const slope = ((2 * step + nextStep) * secant - step * nextSecant) / (step + nextStep);
  if (Math.sign(slope) !== Math.sign(secant)) return 0;
  const turns = Math.sign(secant) !== Math.sign(nextSecant);
  return turns && Math.abs(slope) > 3 * Math.abs(secant) ? 3 * secant : slope;
}
