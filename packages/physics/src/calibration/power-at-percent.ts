import { pchipValue } from './pchip-value';
import type { PowerCalibration } from './power-calibration';

/**
 * Power of a calibrated source at a setting.          value of the monotone piecewise cubic
 *
 * @param calibration  curve from powerCalibration
 * @param percent      setting, percent, finite, between the first and the last measured point
 * @returns power, W
 * @throws RangeError naming the percent and the measured range: nothing is extrapolated
 * Valid at the wavelength, pulse width and frequency of the measurement only.
 * Source: as pchipSlopes; docs/science/power-calibration.md
 */
export function powerAtPercent(calibration: PowerCalibration, percent: number): number {
  const first = calibration.percent[0];
  const last = calibration.percent[calibration.percent.length - 1];
  if (!Number.isFinite(percent) || percent < first || percent > last) {
    throw new RangeError(`percent must lie in the measured range of ${first} to ${last}, but is ${percent}`);
  }
  return pchipValue({ x: calibration.percent, y: calibration.powerW, slopes: calibration.slopesWPerPercent }, percent);
}
