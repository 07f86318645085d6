import { requireAtLeast } from '../arguments/require-at-least';
import { pchipSlopes } from './pchip-slopes';

export type CalibrationPoint = { readonly percent: number; readonly powerW: number };

export type PowerCalibration = {
  readonly percent: readonly number[];
  readonly powerW: readonly number[];
  readonly slopesWPerPercent: readonly number[];
};

const MIN_POINTS = 3;

/**
 * Curve from the power setting to the measured power.          monotone piecewise cubic (pchipSlopes)
 *
 * @param points  measured points in order, at least 3: percent strictly increasing, >= 0; powerW never falling, W, >= 0
 * @returns the points and the slope at each, W per percent; for powerAtPercent and percentForPower
 * @throws RangeError naming the pair of points that breaks the order, or the bad value
 * Valid at the wavelength, pulse width and frequency of the measurement only.
 * Source: as pchipSlopes; docs/science/power-calibration.md
 */
export function powerCalibration(points: readonly CalibrationPoint[]): PowerCalibration {
  if (points.length < MIN_POINTS) throw new RangeError(`a calibration needs at least ${MIN_POINTS} points, but has ${points.length}`);
  for (const [index, point] of points.entries()) {
    requireAtLeast(0, { [`points[${index}].percent`]: point.percent, [`points[${index}].powerW`]: point.powerW });
    if (index > 0) requireOrder(points[index - 1], point, index);
  }
  const percent = points.map((point) => point.percent);
  const powerW = points.map((point) => point.powerW);
  return { percent, powerW, slopesWPerPercent: pchipSlopes(percent, powerW) };
}

function requireOrder(before: CalibrationPoint, point: CalibrationPoint, index: number): void {
  const pair = `points ${index} and ${index + 1} (${before.percent} % ${before.powerW} W, ${point.percent} % ${point.powerW} W)`;
  if (point.percent <= before.percent) throw new RangeError(`percent must rise from point to point, but does not between ${pair}`);
  if (point.powerW < before.powerW) throw new RangeError(`powerW must not fall with the percent, but does between ${pair}`);
}
