import { requireFinite } from '../arguments/require-finite';
import { MM_PER_INCH } from './spacing-units';

export type SpeedUnits = { metresPerMinute: number; inchesPerSecond: number; millimetresPerMinute: number };

/**
 * A scan speed in the other units that panels use.     0.06 v;  v/25.4;  60 v
 *
 * @param speedMmPerS speed, mm/s, finite
 * @returns the speed in m/min, in/s and mm/min
 * @throws RangeError naming the argument and its value
 * Valid without limit: all factors are exact.
 * Source: inch = 25.4 mm exactly; docs/science/units.md
 */
export function speedUnits(speedMmPerS: number): SpeedUnits {
  requireFinite({ speedMmPerS });
  return { metresPerMinute: speedMmPerS * 0.06, inchesPerSecond: speedMmPerS / MM_PER_INCH, millimetresPerMinute: speedMmPerS * 60 };
}
