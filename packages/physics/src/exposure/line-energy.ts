import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';

/**
 * Energy per length of a line.          P / v
 *
 * @param powerW       average power at the workpiece, W, finite, >= 0
 * @param speedMmPerS  scan speed v, mm/s, finite, > 0
 * @returns line energy, J/mm
 * @throws RangeError naming the argument and its value, if out of range
 * Valid at constant speed and power averaged over many pulses.
 * Source: definition ("linear energy density" in papers on marking); docs/science/scanning.md
 */
export function lineEnergy(powerW: number, speedMmPerS: number): number {
  requireAtLeast(0, { powerW });
  requirePositive({ speedMmPerS });
  return powerW / speedMmPerS;
}
