import { PANEL_UNITS, type PanelUnit } from '@proofplate/physics';
import { PARAMETER_KEYS, PARAMETERS } from '@proofplate/recipe-model';
import { codeWords } from '../../lib/code-words';
import { formatEntered } from '../../lib/format';
import { FIELD_WORDS } from './field-words';

/** One value of an event: what it was and what it is. */
export type ChangedValue = { readonly path: string; readonly before: string; readonly after: string };

/** Stands for a value that is not there. */
export const NO_VALUE = '—';

/** What an event holds, value by value; values that stayed the same are left out where there is a before and an after. */
export function changedValues(before: unknown, after: unknown): ChangedValue[] {
  const [old, present] = [leaves(before), leaves(after)];
  const paths = [...new Set([...old.keys(), ...present.keys()])];
  return paths
    .map((path) => ({ path, before: old.get(path) ?? NO_VALUE, after: present.get(path) ?? NO_VALUE }))
    .filter((value) => value.before !== value.after);
}

/** "steps › 1 › passes" by text, in the order they stand. */
function leaves(value: unknown, path: readonly string[] = []): Map<string, string> {
  if (value === null || value === undefined) return path.length === 0 ? new Map() : new Map([[pathText(path), NO_VALUE]]);
  if (isEntered(value)) return new Map([[pathText(path), `${valueText(value.value)} ${PANEL_UNITS[value.unit].symbol}`.trim()]]);
  if (typeof value !== 'object') return new Map([[pathText(path), valueText(value)]]);
  const entries = Array.isArray(value) ? value.map((item, index) => [String(index + 1), item] as const) : Object.entries(value);
  if (entries.length === 0) return new Map([[pathText(path), 'none']]);
  return new Map(entries.flatMap(([key, item]) => [...leaves(item, [...path, key])]));
}

function valueText(value: unknown): string {
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (value === '') return 'empty';
  if (typeof value === 'number') return formatEntered(value);
  if (typeof value !== 'string') return String(value);
  return codeWords(value) ?? (CODE.test(value) ? value.replaceAll('_', ' ') : value);
}

/** A stored code of several words, such as `not_marked`. */
const CODE = /^[a-z]+(?:_[a-z]+)+$/;

const pathText = (path: readonly string[]) => (path.length === 0 ? 'all of it' : path.map(fieldWords).join(' › '));

function isEntered(value: unknown): value is { value: number; unit: PanelUnit } {
  return typeof value === 'object' && value !== null && 'value' in value && 'unit' in value && isPanelUnit(value.unit);
}

const isPanelUnit = (unit: unknown): unit is PanelUnit => typeof unit === 'string' && unit in PANEL_UNITS;

/** "scanSpeedMmPerS" becomes "scan speed mm per s": the names of fields carry their units. */
function fieldWords(field: string): string {
  const own = FIELD_WORDS[field];
  if (own !== undefined) return own;
  const parameter = PARAMETER_KEYS.find((key) => key === field);
  if (parameter !== undefined) return PARAMETERS[parameter].label.toLowerCase();
  return field.replace(/([a-z0-9])([A-Z])/g, '$1 $2').toLowerCase();
}
