import {
  type Assist,
  type EntryContext,
  enterValue,
  type Fill,
  PARAMETER_KEYS,
  PARAMETERS,
  type Panel,
  type PanelField,
  type ParameterKey,
} from '@proofplate/recipe-model';
import { decimalSignOf, type NumberRule, readNumber } from '../../../lib/read-number';
import type { ImportBody } from '../coupons.api';

type KnownFactor = { parameter: ParameterKey | ''; levels: string };
export type ImportValues = {
  title: string;
  materialId: string;
  finishId: string;
  effectId: string;
  machineId: string;
  lensId: string;
  lot: string;
  thicknessMm: string;
  storedAt: string;
  markedOn: string;
  markedByMe: boolean;
  isMachineUnchanged: boolean;
  fill: Fill | '';
  assist: Assist | '';
  cellMm: string;
  gapMm: string;
  from: 'grid' | 'table';
  grid: { rows: string; columns: string; rowFactor: KnownFactor; columnFactor: KnownFactor };
  common: Partial<Record<ParameterKey, string>>;
  table: string;
};
export type ReadImport = { body: ImportBody } | { messages: { name: string; message: string }[] };

export const emptyImport = (): ImportValues => ({
  ...{ title: '', materialId: '', finishId: '', effectId: '', machineId: '', lensId: '', lot: '', thicknessMm: '', storedAt: '' },
  ...{ markedOn: '', markedByMe: false, isMachineUnchanged: false, fill: '', assist: '', cellMm: '', gapMm: '', from: 'grid' },
  grid: { rows: '', columns: '', rowFactor: { parameter: '', levels: '' }, columnFactor: { parameter: '', levels: '' } },
  ...{ common: {}, table: '' },
});

const RULES = {
  cellMm: { what: 'The side of a cell', unit: 'mm', least: 1, most: 30, isShopLength: true },
  gapMm: { what: 'The gap between cells', unit: 'mm', least: 0.3, most: 10, isShopLength: true },
  thicknessMm: { what: 'The thickness', unit: 'mm', least: 0.001, most: 1000, isShopLength: true },
  rows: { what: 'The number of rows', unit: '', least: 1, most: 26, isWhole: true },
  columns: { what: 'The number of columns', unit: '', least: 1, most: 26, isWhole: true },
} as const satisfies Record<string, NumberRule>;
const CHOICES = ['machineId', 'lensId', 'materialId', 'finishId', 'effectId'] as const;

/** The request behind what was typed. What was left empty is not sent: it is not known. */
export function importBody(values: ImportValues, panel: Panel | undefined, locale: string): ReadImport {
  const messages: { name: string; message: string }[] = [];
  const context: EntryContext = { decimalSign: decimalSignOf(locale) };
  for (const name of CHOICES) if (values[name] === '') messages.push({ name, message: 'Choose one. The plate is found by it later.' });
  const number = (name: keyof typeof RULES, text: string, at: string = name): number | undefined => {
    if (text.trim() === '') return undefined;
    const read = readNumber(text, RULES[name], locale);
    if ('message' in read) messages.push({ name: at, message: read.message });
    return 'value' in read ? read.value : undefined;
  };
  const typed = (parameter: ParameterKey, text: string, at: string) => {
    const entry = enterValue(unlimited(panel, parameter), text, context);
    if (entry.kind === 'refused') messages.push({ name: at, message: entry.message });
    return entry.kind === 'accepted' ? [entry.value.entered] : [];
  };
  const factor = (name: 'rowFactor' | 'columnFactor') => {
    const { parameter, levels } = values.grid[name];
    if (parameter === '') return undefined;
    const texts = levelTexts(levels, context.decimalSign === ',');
    if (texts.length === 0) messages.push({ name: `grid.${name}.levels`, message: 'Enter the levels, or choose that they are not known.' });
    return { parameter, levels: texts.flatMap((text) => typed(parameter, text, `grid.${name}.levels`)) };
  };
  const grid = () => {
    for (const name of ['rows', 'columns'] as const)
      if (values.grid[name].trim() === '') messages.push({ name: `grid.${name}`, message: `Count the ${name} on the plate.` });
    const [rowFactor, columnFactor] = [factor('rowFactor'), factor('columnFactor')];
    return {
      rows: number('rows', values.grid.rows, 'grid.rows') ?? 0,
      columns: number('columns', values.grid.columns, 'grid.columns') ?? 0,
      ...(rowFactor === undefined ? {} : { rowFactor }),
      ...(columnFactor === undefined ? {} : { columnFactor }),
    };
  };
  const common: NonNullable<ImportBody['common']> = {};
  for (const key of PARAMETER_KEYS) {
    const text = values.common[key]?.trim() ?? '';
    const [entered] = text === '' ? [] : typed(key, text, `common.${key}`);
    if (entered !== undefined) common[key] = entered;
  }
  if (values.from === 'table' && values.table.trim() === '') messages.push({ name: 'table', message: 'Paste the rows, headings first.' });
  const { title, materialId, finishId, effectId, machineId, lensId, lot, storedAt, markedByMe, isMachineUnchanged } = values;
  const body: ImportBody = {
    ...{ title, materialId, finishId, effectId, machineId, lensId, lot, storedAt, markedByMe, isMachineUnchanged, common },
    ...known('cellMm', number('cellMm', values.cellMm)),
    ...known('gapMm', number('gapMm', values.gapMm)),
    ...known('thicknessMm', number('thicknessMm', values.thicknessMm)),
    ...known('markedOn', values.markedOn === '' ? undefined : values.markedOn),
    ...known('fill', values.fill === '' ? undefined : values.fill),
    ...known('assist', values.assist === '' ? undefined : values.assist),
    ...(values.from === 'grid' ? { grid: grid() } : { table: values.table, decimalSign: decimalSignOf(locale) }),
  };
  return messages.length === 0 ? { body } : { messages };
}

/** A member of the request, or nothing at all. */
function known<Key extends keyof ImportBody>(key: Key, value: ImportBody[Key] | undefined): Partial<ImportBody> {
  return value === undefined ? {} : { [key]: value };
}

/** Read by the panel's units, not by today's limits: the plate may have been burnt under others. */
function unlimited(panel: Panel | undefined, parameter: ParameterKey): PanelField {
  const own = panel?.fields.find((field) => field.parameter === parameter);
  if (own === undefined) return { parameter, label: PARAMETERS[parameter].label, unit: PARAMETERS[parameter].unit };
  const { minimum: _minimum, maximum: _maximum, step: _step, choices: _choices, ...field } = own;
  return field;
}

/** "100, 140, 190", or with semicolons or spaces; where the comma is the decimal sign it parts nothing. */
export function levelTexts(text: string, isCommaDecimal: boolean): readonly string[] {
  const parted = text.includes(';') ? text.split(';') : isCommaDecimal ? text.split(/\s+/u) : text.split(/[,\s]+/u);
  return parted.map((part) => part.trim()).filter((part) => part !== '');
}
