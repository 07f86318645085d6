import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';

const KW_PER_MJ_PER_NS = 1000;

/**
 * Pulse power: peak power of a pulse taken as rectangular.          P = E / tau
 *
 * @param pulseEnergyMj  pulse energy, mJ, finite, >= 0
 * @param pulseWidthNs   pulse width (full width at half maximum), ns, finite, > 0
 * @returns pulse power, kW; 6 % above gaussianPeakPower for the same pulse
 * @throws RangeError naming the argument and its value, if out of range
 * Valid as a mean over the pulse width; the true peak depends on the shape.
 * Source: ISO 11145 (pulse power); docs/science/pulses.md
 */
export function rectangularPeakPower(pulseEnergyMj: number, pulseWidthNs: number): number {
  requireAtLeast(0, { pulseEnergyMj });
  requirePositive({ pulseWidthNs });
  return (pulseEnergyMj / pulseWidthNs) * KW_PER_MJ_PER_NS;
}
