import { requirePositive } from '../arguments/require-positive';

/**
 * Distance of neighbouring pulses along a line.          pitch = v / f
 *
 * @param speedMmPerS   scan speed v, mm/s, finite, > 0
 * @param frequencyKhz  pulse frequency f, kHz, finite, > 0
 * @returns pitch, um (mm/s over kHz is um)
 * @throws RangeError naming the argument and its value, if out of range
 * Valid at constant speed: it shrinks where the mirrors speed up or turn.
 * Source: definition; docs/science/scanning.md
 */
export function pulsePitch(speedMmPerS: number, frequencyKhz: number): number {
  requirePositive({ speedMmPerS, frequencyKhz });
  return speedMmPerS / frequencyKhz;
}
