import type { PanelScale, PanelUnit } from '@proofplate/physics';
import { PARAMETERS } from '../vocabulary/parameters';
import type { PanelField } from './panel';

/** How a unit maps to the parameter's own unit on this field; the field's range belongs to the field's unit only. */
export function panelScale(field: PanelField, unit: PanelUnit, speedMmPerS?: number): PanelScale {
  const storedUnit = PARAMETERS[field.parameter].unit;
  const range = unit === field.unit ? { rangeLow: field.rangeLow, rangeHigh: field.rangeHigh } : {};
  return { panelUnit: unit, storedUnit, ...range, speedMmPerS };
}
