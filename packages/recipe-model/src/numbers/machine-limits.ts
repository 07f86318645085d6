import type { ParameterKey } from '../vocabulary/parameters';
import type { PhysicalProfile } from '../vocabulary/profile';

const SAME = 1e-9;

export type ClosedRange = { readonly from: number; readonly to: number };

/** The range in which source or scan head can do what is set; undefined where the profile says nothing. */
export function machineRange(physical: PhysicalProfile, key: ParameterKey): ClosedRange | undefined {
  const { frequencyRangeKhz, pulseWidthRangeNs, topSpeedMmPerS } = physical;
  if (key === 'frequencyKhz') return frequencyRangeKhz;
  if (key === 'pulseWidthNs') return pulseWidthRangeNs;
  return key === 'speedMmPerS' && topSpeedMmPerS !== undefined ? { from: 0, to: topSpeedMmPerS } : undefined;
}

/**
 * Largest pulse energy of the source, mJ: the limit at exactly this pulse width, or the one of a source with a single fixed width.
 *
 * @param physical      limits per pulse width
 * @param pulseWidthNs  pulse width as set, ns; null: none is set
 * @returns mJ, or null: a width between two known ones is unknown
 */
export function largestPulseEnergyMj({ maxPulseEnergyMj: limits = [] }: PhysicalProfile, pulseWidthNs: number | null): number | null {
  const atWidth = limits.find((limit) => pulseWidthNs !== null && limit.pulseWidthNs !== null && isSame(limit.pulseWidthNs, pulseWidthNs));
  const fixed = limits.find((limit) => limit.pulseWidthNs === null);
  return (atWidth ?? fixed)?.energyMj ?? null;
}

/** Conversion noise is no excess. */
export function isWithinRange(value: number, { from, to }: ClosedRange): boolean {
  return value * (1 + SAME) >= from && value <= to * (1 + SAME);
}

/** True if the value is above the limit by more than conversion noise. */
export function isAbove(value: number, limit: number): boolean {
  return value > limit * (1 + SAME);
}

function isSame(limit: number, set: number): boolean {
  return Math.abs(set - limit) <= SAME * Math.abs(limit);
}
