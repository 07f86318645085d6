import { requirePositive } from '../arguments/require-positive';

const NS_KHZ = 1e-6;

/**
 * Share of time in which the pulsed beam is on.          duty = tau f
 *
 * @param pulseWidthNs  pulse width, ns, finite, > 0
 * @param frequencyKhz  pulse frequency, kHz, finite, > 0
 * @returns share; a result of 1 or more says that the pulses run into each other
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for even trains of pulses, not for bursts.
 * Source: definition; docs/science/pulses.md
 */
export function dutyCycle(pulseWidthNs: number, frequencyKhz: number): number {
  requirePositive({ pulseWidthNs, frequencyKhz });
  return pulseWidthNs * frequencyKhz * NS_KHZ;
}
