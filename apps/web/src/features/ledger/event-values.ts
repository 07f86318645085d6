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
  if (typeof value !== 'object') return new Map([[pathText(path), valueText(value)]]);
  const entries = Array.isArray(value) ? value.map((item, index) => [String(index + 1), item] as const) : Object.entries(value);
  if (entries.length === 0) return new Map([[pathText(path), 'none']]);
  return new Map(entries.flatMap(([key, item]) => [...leaves(item, [...path, key])]));
}

function valueText(value: unknown): string {
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (value === '') return 'empty';
  return String(value);
}

const pathText = (path: readonly string[]) => (path.length === 0 ? 'value' : path.map(fieldWords).join(' › '));

/** "scanSpeedMmPerS" becomes "scan speed mm per s": the names of fields carry their units. */
function fieldWords(field: string): string {
  return field.replace(/([a-z0-9])([A-Z])/g, '$1 $2').toLowerCase();
}
