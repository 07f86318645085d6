import { requireFinite } from '../arguments/require-finite';

export type PercentOfRange = { fromMinimum: number; fromZero: number };

/**
 * Both meanings of a percent on a panel; which one holds is a property of the machine's panel, never a guess.
 *                                                     from minimum = low + p/100 (high - low);  from zero = p/100 high
 *
 * @param range.percent  percent as shown, finite
 * @param range.low      physical value at the low end, finite
 * @param range.high     physical value at the high end, finite, > low
 * @returns both readings in the unit of low and high
 * @throws RangeError naming the argument and its value
 * Valid for panels that are linear in their percent.
 * Source: own definition; docs/science/units.md
 */
export function percentOfRange({ low, high, percent }: { low: number; high: number; percent: number }): PercentOfRange {
  requireRange(low, high);
  requireFinite({ percent });
  return { fromMinimum: low + (percent / 100) * (high - low), fromZero: (percent / 100) * high };
}

/**
 * The percents that stand for a physical value: inverse of percentOfRange.
 *                                                     from minimum = 100 (x - low)/(high - low);  from zero = 100 x/high
 *
 * @param range.value  physical value, unit of low and high, finite
 * @param range.low    physical value at the low end, finite
 * @param range.high   physical value at the high end, finite, > low, not 0
 * @returns both percents
 * @throws RangeError naming the argument and its value
 * Valid for panels that are linear in their percent.
 * Source: own definition; docs/science/units.md
 */
export function rangeAsPercent({ low, high, value }: { low: number; high: number; value: number }): PercentOfRange {
  requireRange(low, high);
  requireFinite({ value });
  if (high === 0) throw new RangeError('high must not be 0 for a percent from zero');
  return { fromMinimum: ((value - low) / (high - low)) * 100, fromZero: (value / high) * 100 };
}

function requireRange(low: number, high: number): void {
  requireFinite({ low });
  requireFinite({ high });
  if (high <= low) throw new RangeError(`high must be above low, got ${low} to ${high}`);
}
