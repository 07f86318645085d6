import { requireFinite } from '../arguments/require-finite';
import { requirePositive } from '../arguments/require-positive';
import type { PanelUnit } from './panel-unit';
import { percentOfRange, rangeAsPercent } from './percent-of-range';
import { MM_PER_INCH } from './spacing-units';
import { tidy } from './tidy';

/** How a panel unit maps to the stored unit. The range is in the stored unit; for watts, rangeHigh is the power at 100 %. */
export type PanelScale = {
  panelUnit: PanelUnit;
  storedUnit: PanelUnit;
  rangeLow?: number;
  rangeHigh?: number;
  /** Pulses per inch become a frequency only at a scan speed. */
  speedMmPerS?: number;
};

const UM_PER_INCH = MM_PER_INCH * 1000;

/** Size of each plain unit in the base unit of its kind, as numerator and denominator so that decimal factors stay exact. */
const SIZE: Partial<Record<PanelUnit, readonly [kind: string, numerator: number, denominator: number]>> = {
  'mm/s': ['speed', 1, 1],
  'm/s': ['speed', 1000, 1],
  'in/s': ['speed', MM_PER_INCH, 1],
  'm/min': ['speed', 1000, 60],
  'mm/min': ['speed', 1, 60],
  kHz: ['frequency', 1000, 1],
  Hz: ['frequency', 1, 1],
  um: ['length', 1, 1],
  mm: ['length', 1000, 1],
  in: ['length', UM_PER_INCH, 1],
  ns: ['time', 1, 1],
  us: ['time', 1000, 1],
  count: ['count', 1, 1],
  deg: ['angle', 1, 1],
};

/**
 * The physical value of what a panel shows.            linear units: x a/b;  line density: 25400/n, 10000/n um;
 *                                                      percent: percentOfRange;  watts: 100 W/high;  pulses per inch: n v/25.4
 *
 * @param value  the number on the panel, finite; > 0 for densities
 * @param scale  panel unit, stored unit, and the range or scan speed that the unit needs
 * @returns the value in the stored unit; the way back (panelValue) agrees within 1e-9 relative
 * @throws RangeError naming what is missing or out of range, or the two units if they do not convert
 * Valid for panels that are linear in their percent.
 * Source: docs/science/units.md
 */
export function physicalValue(value: number, scale: PanelScale): number {
  requireFinite({ value });
  const { panelUnit, storedUnit } = scale;
  if (panelUnit === 'lpi' || panelUnit === 'lpcm') {
    requirePositive({ value });
    return plainValue(perCentimetreOrInch(panelUnit) / value, 'um', storedUnit);
  }
  if (panelUnit === 'ppi') return plainValue((value * requireSpeed(scale)) / MM_PER_INCH, 'Hz', storedUnit);
  if (isShare(panelUnit)) {
    const { fromMinimum, fromZero } = percentOfRange({ ...requireRange(scale), percent: value });
    return tidy(panelUnit === 'percentFromMinimum' ? fromMinimum : fromZero);
  }
  if (panelUnit === 'W') return tidy((value / requireFullPower(scale)) * 100);
  return plainValue(value, panelUnit, storedUnit);
}

/**
 * What a panel shows for a physical value: inverse of physicalValue.
 *
 * @param physical  value in the stored unit, finite; > 0 for densities
 * @param scale     panel unit, stored unit, and the range or scan speed that the unit needs
 * @returns the number on the panel, not rounded to the panel's step
 * @throws RangeError naming what is missing or out of range, or the two units if they do not convert
 * Valid for panels that are linear in their percent.
 * Source: docs/science/units.md
 */
export function panelValue(physical: number, scale: PanelScale): number {
  requireFinite({ physical });
  const { panelUnit, storedUnit } = scale;
  if (panelUnit === 'lpi' || panelUnit === 'lpcm') {
    requirePositive({ physical });
    return tidy(perCentimetreOrInch(panelUnit) / plainValue(physical, storedUnit, 'um'));
  }
  if (panelUnit === 'ppi') return tidy((plainValue(physical, storedUnit, 'Hz') * MM_PER_INCH) / requireSpeed(scale));
  if (isShare(panelUnit)) {
    const { fromMinimum, fromZero } = rangeAsPercent({ ...requireRange(scale), value: physical });
    return tidy(panelUnit === 'percentFromMinimum' ? fromMinimum : fromZero);
  }
  if (panelUnit === 'W') return tidy((physical / 100) * requireFullPower(scale));
  return plainValue(physical, storedUnit, panelUnit);
}

function plainValue(value: number, from: PanelUnit, to: PanelUnit): number {
  if (from === to) return value;
  const source = SIZE[from];
  const target = SIZE[to];
  if (source === undefined || target === undefined || source[0] !== target[0]) throw new RangeError(`${from} does not convert to ${to}`);
  return tidy((value * (source[1] * target[2])) / (source[2] * target[1]));
}

function perCentimetreOrInch(unit: 'lpi' | 'lpcm'): number {
  return unit === 'lpi' ? UM_PER_INCH : 10_000;
}

function isShare(unit: PanelUnit): boolean {
  return unit === 'percentFromZero' || unit === 'percentFromMinimum';
}

/** A percent stored as a percent has 0 to 100 as its range unless the panel says otherwise; every other quantity must state it. */
function requireRange({ panelUnit, storedUnit, rangeLow, rangeHigh }: PanelScale): { low: number; high: number } {
  const storesPercent = isShare(storedUnit);
  const high = rangeHigh ?? (storesPercent ? 100 : undefined);
  const low = rangeLow ?? (storesPercent || panelUnit === 'percentFromZero' ? 0 : undefined);
  if (high === undefined) throw new RangeError('rangeHigh is missing: a percent needs the range that it is a share of');
  if (low === undefined) throw new RangeError('rangeLow is missing: a percent from the minimum needs the minimum');
  return { low, high };
}

function requireFullPower({ storedUnit, rangeHigh }: PanelScale): number {
  if (!isShare(storedUnit)) throw new RangeError(`W does not convert to ${storedUnit}`);
  if (rangeHigh === undefined) throw new RangeError('rangeHigh is missing: watts need the power at 100 %');
  requirePositive({ rangeHigh });
  return rangeHigh;
}

function requireSpeed({ speedMmPerS }: PanelScale): number {
  if (speedMmPerS === undefined) throw new RangeError('speedMmPerS is missing: pulses per inch become a frequency only at a scan speed');
  requirePositive({ speedMmPerS });
  return speedMmPerS;
}
