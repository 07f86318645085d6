import { requirePositive } from '../arguments/require-positive';

const MS_PER_S = 1000;

/**
 * Way and time a mirror needs to reach the scan speed before a line.          s = v^2 / (2 a), t = v / a
 *
 * @param speedMmPerS          scan speed v, mm/s, finite, > 0
 * @param accelerationMmPerS2  acceleration a of the scan head in the field, mm/s^2, finite, > 0
 * @returns way, mm, and time, ms, at each end of a line (a line needs both twice)
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a constant acceleration.
 * Source: kinematics; docs/science/marking-time.md
 */
export function runIn(speedMmPerS: number, accelerationMmPerS2: number): { readonly lengthMm: number; readonly timeMs: number } {
  requirePositive({ speedMmPerS, accelerationMmPerS2 });
  return { lengthMm: speedMmPerS ** 2 / (2 * accelerationMmPerS2), timeMs: (speedMmPerS / accelerationMmPerS2) * MS_PER_S };
}
