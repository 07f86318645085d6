import { pchipValue } from './pchip-value';
import type { PowerCalibration } from './power-calibration';

/**
 * Lowest setting at which a calibrated source gives a power.          inverse of the monotone piecewise cubic, by bisection
 *
 * @param calibration  curve from powerCalibration
 * @param powerW       power wanted, W, finite, between the lowest and the highest measured power
 * @returns setting, percent; on a flat part of the curve the lowest percent
 * @throws RangeError naming the power and the measured range: nothing is extrapolated
 * Valid at the wavelength, pulse width and frequency of the measurement only. The curve rises through the interval, so the
 * bisection always ends: at the two neighbouring doubles that enclose the answer.
 * Source: as pchipSlopes; docs/science/power-calibration.md
 */
export function percentForPower(calibration: PowerCalibration, powerW: number): number {
  const { percent, powerW: measuredW, slopesWPerPercent } = calibration;
  const lowestW = measuredW[0];
  const highestW = measuredW[measuredW.length - 1];
  if (!Number.isFinite(powerW) || powerW < lowestW || powerW > highestW) {
    throw new RangeError(`powerW must lie in the measured range of ${lowestW} to ${highestW}, but is ${powerW}`);
  }
  const right = measuredW.findIndex((measured) => measured >= powerW);
  if (measuredW[right] === powerW) return percent[right];
  const curve = { x: percent, y: measuredW, slopes: slopesWPerPercent };
  let low = percent[right - 1];
  let high = percent[right];
  for (;;) {
    const middle = low + (high - low) / 2;
    if (middle <= low || middle >= high) return high;
    if (pchipValue(curve, middle) < powerW) low = middle;
    else high = middle;
  }
}
