import { rectangularPeakPower } from './rectangular-peak-power';

/** Peak power over E/tau for a pulse that is Gaussian in time with full width tau at half maximum. */
const GAUSSIAN_PULSE_FACTOR = 2 * Math.sqrt(Math.LN2 / Math.PI);

/**
 * Peak power of a pulse that is Gaussian in time.          P = 2 sqrt(ln 2 / pi) E / tau = 0.939437 E / tau
 *
 * @param pulseEnergyMj  pulse energy, mJ, finite, >= 0
 * @param pulseWidthNs   full width at half maximum, ns, finite, > 0
 * @returns peak power, kW
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a pulse near a Gaussian in time; sources with a long tail peak higher.
 * Source: RP Photonics Encyclopedia, "peak power" (factor 0.94); docs/science/pulses.md
 */
export function gaussianPeakPower(pulseEnergyMj: number, pulseWidthNs: number): number {
  return GAUSSIAN_PULSE_FACTOR * rectangularPeakPower(pulseEnergyMj, pulseWidthNs);
}
