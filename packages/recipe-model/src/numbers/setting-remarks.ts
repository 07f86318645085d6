import type { Panel, PanelField } from '../panel/panel';
import { showNumber } from '../panel/show-number';
import { showValue } from '../panel/show-value';
import { nearestShowable } from '../panel/showable';
import { PARAMETER_KEYS, PARAMETERS, type ParameterKey } from '../vocabulary/parameters';
import type { PhysicalProfile } from '../vocabulary/profile';
import type { ParameterValues, SetValue } from '../vocabulary/setting';
import { isWithinRange, machineRange } from './machine-limits';

/** Something to look at in a value that was set, before any number that follows from it. */
export type SettingRemark = { readonly parameter: ParameterKey; readonly text: string };

const SHOWN_DIGITS = 6;

/**
 * Values that the panel cannot show, and values outside of what source or scan head can do.
 *
 * @param values    as set, each with its physical value
 * @param physical  ranges of source and scan head; what the profile does not say is not judged
 * @param panel     the machine's panel; absent: nothing is said about what it shows
 * @returns remarks in reading order, in words
 */
export function settingRemarks(values: ParameterValues, physical: PhysicalProfile, panel?: Panel): SettingRemark[] {
  return PARAMETER_KEYS.flatMap((parameter) => {
    const value = values[parameter];
    if (value === undefined) return [];
    const field = panel?.fields.find((own) => own.parameter === parameter);
    const texts = [field === undefined ? undefined : panelRemark(field, value, values), rangeRemark(parameter, value, physical)];
    return texts.filter((text) => text !== undefined).map((text) => ({ parameter, text }));
  });
}

function panelRemark(field: PanelField, value: SetValue, values: ParameterValues): string | undefined {
  const speedMmPerS = values.speedMmPerS?.physical;
  const shown = showValue(field, value, speedMmPerS === undefined ? {} : { speedMmPerS });
  if (shown === null) return `${field.label} cannot be turned into what this panel shows.`;
  if (shown.isShowable) return undefined;
  const near = nearestShowable(field, shown.value).map((number) => `${showNumber(number)} ${shown.symbol}`);
  return `This panel cannot show ${field.label.toLowerCase()} ${short(shown.value)} ${shown.symbol}. Nearest that it can: ${near.join(' or ')}.`;
}

function rangeRemark(parameter: ParameterKey, { physical: value }: SetValue, physical: PhysicalProfile): string | undefined {
  const range = machineRange(physical, parameter);
  if (range === undefined || isWithinRange(value, range)) return undefined;
  const { label, symbol } = PARAMETERS[parameter];
  const what = parameter === 'speedMmPerS' ? 'what the scan head can do' : 'the source’s range';
  const limits = range.from > 0 ? `${short(range.from)} to ${short(range.to)} ${symbol}` : `at most ${short(range.to)} ${symbol}`;
  return `${label} ${short(value)} ${symbol} lies outside of ${what}, ${limits}.`;
}

const short = (value: number) => showNumber(Number(value.toPrecision(SHOWN_DIGITS)));
