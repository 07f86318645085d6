import {
  type Entry,
  type EntryContext,
  enterValue,
  levels,
  type NumberedSetting,
  type PanelField,
  showValue,
  type TypedMachine,
  typedSetting,
} from '@proofplate/recipe-model';
import { inShopNumbers } from '../../../lib/format';
import { decimalSignOf, readNumber } from '../../../lib/read-number';
import type { FactorValues, PlanValues } from './plan-values';

/** Row and column from 0. */
export type CellPlace = { row: number; column: number };

const COUNT = { what: 'The number of levels', unit: '', least: 1, most: 26, isWhole: true };

/** The setting of one cell as the plan is typed right now: the base with the levels of its row and column. */
export function plannedSetting(
  { base, rows, columns }: Pick<PlanValues, 'base' | 'rows' | 'columns'>,
  machine: TypedMachine,
  { place, locale }: { place: CellPlace; locale: string },
): NumberedSetting {
  const decimalSign = decimalSignOf(locale);
  return typedSetting(machine, {
    fill: base.fill,
    read: (field, context) => {
      const how = { decimalSign, ...context };
      if (field.parameter === rows.parameter) return readLevel(field, rows, { index: place.row, how, locale });
      if (field.parameter === columns.parameter) return readLevel(field, columns, { index: place.column, how, locale });
      const text = base.values[field.parameter]?.trim() ?? '';
      return text === '' ? undefined : enterValue(field, text, how);
    },
  });
}

type LevelAt = { index: number; how: EntryContext; locale: string };

/** The level at its place; fewer levels than that leave the last one. */
function readLevel(field: PanelField, { from, to, count, spacing }: FactorValues, { index, how, locale }: LevelAt): Entry | undefined {
  const many = readNumber(count, COUNT, locale);
  if (from.trim() === '' || to.trim() === '') return undefined;
  if ('message' in many) return refused(many.message);
  const ends = [from, to].map((text) => enterValue(field, text, how));
  const [first, last] = ends.map((entry) =>
    entry.kind === 'accepted' ? (showValue(field, entry.value, how)?.value ?? Number.NaN) : Number.NaN,
  );
  const wrong = ends.find((entry) => entry.kind === 'refused');
  if (wrong !== undefined || first === undefined || last === undefined) return wrong;
  const { speedMmPerS } = how;
  const found = levels({ field, from: first, to: last, count: many.value, spacing, ...(speedMmPerS === undefined ? {} : { speedMmPerS }) });
  if (found.kind === 'refused') return refused(inShopNumbers(found.message));
  const value = found.values[Math.min(index, found.values.length - 1)];
  return value === undefined ? undefined : { kind: 'accepted', value };
}

const refused = (message: string): Entry => ({ kind: 'refused', reason: 'impossible', message });
