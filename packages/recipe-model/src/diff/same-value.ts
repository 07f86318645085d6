import type { SetValue } from '../vocabulary/setting';

/** Relative agreement of two physical values: 0.8 m/s is 800 mm/s. */
export const SAME_WITHIN = 1e-9;

/** True if the panel values are the same or the physical values agree within 1e-9. */
export function sameValue(a: SetValue, b: SetValue): boolean {
  if (a.entered.unit === b.entered.unit && a.entered.value === b.entered.value) return true;
  return Math.abs(a.physical - b.physical) <= SAME_WITHIN * Math.max(Math.abs(a.physical), Math.abs(b.physical));
}
