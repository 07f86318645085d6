import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';

/**
 * Energy of one pulse.          E = P / f
 *
 * @param powerW        average power at the workpiece, W, finite, >= 0
 * @param frequencyKhz  pulse frequency, kHz, finite, > 0
 * @returns pulse energy, mJ (W/kHz is mJ)
 * @throws RangeError naming the argument and its value, if out of range
 * Valid when all pulses are alike and the power is averaged over many of them.
 * Source: ISO 11145 (definitions); docs/science/pulses.md
 */
export function pulseEnergy(powerW: number, frequencyKhz: number): number {
  requireAtLeast(0, { powerW });
  requirePositive({ frequencyKhz });
  return powerW / frequencyKhz;
}
