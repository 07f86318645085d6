import { type DecimalSign, PANEL_UNITS, panelValue } from '@proofplate/physics';
import type { SetValue } from '../vocabulary/setting';
import type { PanelField } from './panel';
import { panelScale } from './panel-scale';
import { showNumber } from './show-number';
import { isShowable } from './showable';

export type ShownValue = {
  /** The number in the panel's unit; what was typed, where it was typed in that unit. */
  value: number;
  text: string;
  symbol: string;
  spoken: string;
  /** False if this panel cannot show the number: a setting of another machine, never to be dialled in as it stands. */
  isShowable: boolean;
};

/**
 * A value as a machine's panel shows it.
 *
 * @param field   field of the machine's panel
 * @param value   the value as entered with its physical value
 * @param context decimal sign; scan speed where the panel's unit needs it
 * @returns number, text and unit; null if the panel's unit cannot express the value (the range or the scan speed is missing)
 */
export function showValue(
  field: PanelField,
  { entered, physical }: SetValue,
  context: { decimalSign?: DecimalSign; speedMmPerS?: number } = {},
): ShownValue | null {
  const value = entered.unit === field.unit ? entered.value : convertOrNull(field, physical, context.speedMmPerS);
  if (value === null) return null;
  const { symbol, spoken } = PANEL_UNITS[field.unit];
  return { value, text: showNumber(value, context.decimalSign), symbol, spoken, isShowable: isShowable(field, value) };
}

function convertOrNull(field: PanelField, physical: number, speedMmPerS?: number): number | null {
  try {
    return panelValue(physical, panelScale(field, field.unit, speedMmPerS));
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
