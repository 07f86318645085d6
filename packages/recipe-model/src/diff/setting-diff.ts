import { PANEL_UNITS } from '@proofplate/physics';
import { ASSIST_LABELS, FILL_LABELS } from '../vocabulary/lists';
import { PARAMETER_KEYS, PARAMETERS, type ParameterClass, type ParameterKey } from '../vocabulary/parameters';
import type { DelaysUs, ParameterSet, SetValue } from '../vocabulary/setting';
import { parameterClassOf, type SettingItem, type ShopClasses, settingItemLabel } from './parameter-class';
import { SAME_WITHIN, sameValue } from './same-value';

/** One side of a change: a typed value, a plain number with its unit, or a word of a list. */
export type ChangeSide =
  | { kind: 'value'; value: SetValue }
  | { kind: 'number'; value: number; symbol: string }
  | { kind: 'word'; word: string };

/** A difference in numbers; percent is relative to the earlier value, points are for values that are percents themselves. */
export type ChangeSize = { delta: number; symbol: string; percent: number | null; points: number | null };

export type SettingChange = {
  item: SettingItem;
  label: string;
  class: ParameterClass;
  change: 'added' | 'removed' | 'changed';
  before: ChangeSide | null;
  after: ChangeSide | null;
  /** Absent for words and where one side is missing. */
  size: ChangeSize | null;
};

const DELAYS: readonly (readonly [SettingItem, keyof DelaysUs])[] = [
  ['laserOnDelayUs', 'laserOn'],
  ['laserOffDelayUs', 'laserOff'],
  ['jumpDelayUs', 'jump'],
  ['cornerDelayUs', 'corner'],
];

/**
 * Every difference between two parameter sets, in reading order; equal quantities in other units are no difference.
 *
 * @param before      the earlier set
 * @param after       the later set
 * @param shopClasses classes that the shop tightened
 * @returns one entry per changed item with its class, both sides as entered, and the size of the change
 */
export function settingDiff(before: ParameterSet, after: ParameterSet, shopClasses: ShopClasses = {}): SettingChange[] {
  const changes = [
    ...PARAMETER_KEYS.map((key) => valueChange(key, before.values[key], after.values[key])),
    wordChange('fill', FILL_LABELS[before.fill], FILL_LABELS[after.fill]),
    wordChange('assist', ASSIST_LABELS[before.assist], ASSIST_LABELS[after.assist]),
    ...DELAYS.map(([item, delay]) =>
      numberChange(item, { before: before.delaysUs?.[delay], after: after.delaysUs?.[delay], symbol: 'µs' }),
    ),
  ];
  return changes.filter((change) => change !== null).map((change) => ({ ...change, class: parameterClassOf(change.item, shopClasses) }));
}

/** A change of a plain number; null if both agree within 1e-9. */
export function numberChange(
  item: SettingItem,
  { before, after, symbol }: { before?: number; after?: number; symbol: string },
): SettingChange | null {
  const side = (value: number | undefined): ChangeSide | null => (value === undefined ? null : { kind: 'number', value, symbol });
  if (before === undefined || after === undefined) return before === after ? null : change(item, side(before), side(after), null);
  if (Math.abs(before - after) <= SAME_WITHIN * Math.max(Math.abs(before), Math.abs(after))) return null;
  return change(item, side(before), side(after), sizeOf(before, after, symbol));
}

/** A change of a word of a closed list; null if it is the same. */
export function wordChange(item: SettingItem, before: string, after: string): SettingChange | null {
  if (before === after) return null;
  return change(item, { kind: 'word', word: before }, { kind: 'word', word: after }, null);
}

function valueChange(key: ParameterKey, before: SetValue | undefined, after: SetValue | undefined): SettingChange | null {
  if (before === undefined && after === undefined) return null;
  if (before !== undefined && after !== undefined && sameValue(before, after)) return null;
  const size = before === undefined || after === undefined ? null : valueSize(key, before, after);
  return change(key, valueSide(before), valueSide(after), size);
}

function valueSide(value: SetValue | undefined): ChangeSide | null {
  return value === undefined ? null : { kind: 'value', value };
}

/** In the unit that both were typed in; in the parameter's own unit where the two units differ. */
function valueSize(key: ParameterKey, before: SetValue, after: SetValue): ChangeSize {
  const { unit } = before.entered;
  if (unit !== after.entered.unit) return sizeOf(before.physical, after.physical, PARAMETERS[key].symbol);
  return sizeOf(before.entered.value, after.entered.value, PANEL_UNITS[unit].symbol);
}

function sizeOf(before: number, after: number, symbol: string): ChangeSize {
  const delta = withoutNoise(after - before);
  if (symbol === '%') return { delta, symbol, percent: null, points: delta };
  return { delta, symbol, percent: before === 0 ? null : withoutNoise(((after - before) / Math.abs(before)) * 100), points: null };
}

/** 12 digits: 0.3 − 0.1 reads as 0.2. */
function withoutNoise(value: number): number {
  return Number(value.toPrecision(12));
}

function change(item: SettingItem, before: ChangeSide | null, after: ChangeSide | null, size: ChangeSize | null): SettingChange {
  const kind = before === null ? 'added' : after === null ? 'removed' : 'changed';
  return { item, label: settingItemLabel(item), class: parameterClassOf(item), change: kind, before, after, size };
}
