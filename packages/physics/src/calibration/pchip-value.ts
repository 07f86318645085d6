import { requireFinite } from '../arguments/require-finite';

export type PchipCurve = {
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly slopes: readonly number[];
};

/**
 * Value of a monotone piecewise cubic.          cubic Hermite polynomial of the interval that holds the position
 *
 * @param curve     points (strictly increasing x) and their slopes from pchipSlopes
 * @param position  position, unit of x, finite, between the first and the last x
 * @returns value, unit of y
 * @throws RangeError naming the position and the range it misses: nothing is extrapolated
 * Valid between the points; the curve keeps their rise and fall and adds no turn of its own.
 * Source: as pchipSlopes; docs/science/power-calibration.md
 */
export function pchipValue(curve: PchipCurve, position: number): number {
  requireFinite({ position });
  const { x, y, slopes } = curve;
  const last = x.length - 1;
  if (position < x[0] || position > x[last]) {
    throw new RangeError(`position must lie between ${x[0]} and ${x[last]}, but is ${position}`);
  }
  let right = 1;
  while (right < last && x[right] < position) right += 1;
  const left = right - 1;
  const step = x[right] - x[left];
  const t = (position - x[left]) / step;
  const rise = y[right] - y[left];
  // Written from the left value on, so that a flat interval returns it exactly.
  const bend = t * (1 - t) * ((1 - t) * (slopes[left] * step - rise) - t * (slopes[right] * step - rise));
  return t === 1 ? y[right] : y[left] + rise * t + bend;
}
