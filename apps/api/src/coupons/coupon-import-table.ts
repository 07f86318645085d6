import { cellAddress, enterValue, findCell, PARAMETERS, type Panel, type PanelField, type ParameterValues } from '@proofplate/recipe-model';
import { type Heading, headingOf } from './coupon-import-headings';
import { rowsOfText, type TextRow } from './coupon-import-text';
import { panelField } from './coupon-plan-setting';
import type { RefusedRowDto } from './dto/import-coupon.dto';
import { MAX_LEVELS_ON_PLATE } from './dto/plan-coupon.dto';

export type ReadCell = { readonly row: number; readonly column: number; readonly values: ParameterValues; readonly note: string };
export type ReadTable = { readonly cells: ReadCell[]; readonly refusedRows: RefusedRowDto[]; readonly ignoredHeadings: string[] };
type TableRules = { readonly panel: Panel; readonly decimalSign: '.' | ',' };
type ReadRow = { readonly at: { row: number; column: number } | null; readonly values: ParameterValues; readonly note: string };

/** Rows without an address are laid out in the order of the list, ten across. */
const COLUMNS_OF_A_LIST = 10;
const SHOWN_LENGTH = 120;

/** Cells of a pasted table; every row that cannot be read is named with the reason, and none is guessed. */
export function readTable(text: string, rules: TableRules): ReadTable {
  const [headingRow, ...rows] = rowsOfText(text);
  const headings = headingRow?.cells.map((cell) => headingOf(cell, rules.panel)) ?? [];
  const ignoredHeadings = headings.flatMap((heading) => (heading.kind === 'ignored' ? [heading.text] : []));
  const cells = new Map<string, ReadCell>();
  const refusedRows: RefusedRowDto[] = [];
  for (const row of rows) {
    const read = readRow(row, headings, rules);
    const at = typeof read === 'string' ? null : (read.at ?? placeInList(cells.size));
    const reason = typeof read === 'string' ? read : placeProblem(at, cells);
    if (typeof read === 'string' || at === null || reason !== undefined) refusedRows.push(refused(row, reason ?? ''));
    else cells.set(cellAddress(at.row, at.column), { ...at, values: read.values, note: read.note });
  }
  return { cells: [...cells.values()], refusedRows, ignoredHeadings };
}

/** An old plate is read by the panel's units, not by today's limits: it may have been burnt under others. */
export function unlimitedField(panel: Panel, parameter: PanelField['parameter']): PanelField {
  const own = panelField(panel, parameter);
  if (own === undefined) return { parameter, label: PARAMETERS[parameter].label, unit: PARAMETERS[parameter].unit };
  const { minimum: _minimum, maximum: _maximum, step: _step, choices: _choices, ...unlimited } = own;
  return unlimited;
}

function readRow({ cells }: TextRow, headings: readonly Heading[], { panel, decimalSign }: TableRules): ReadRow | string {
  if (cells.length > headings.length) return `It has ${cells.length} fields, the headings only ${headings.length}.`;
  const values: ParameterValues = {};
  let [at, note]: [ReadRow['at'], string] = [null, ''];
  for (const [index, heading] of headings.entries()) {
    const text = cells[index] ?? '';
    if (text === '' || heading.kind === 'ignored') continue;
    if (heading.kind === 'note') note = text;
    else if (heading.kind === 'address') {
      at = findCell(text) ?? null;
      if (at === null) return `“${text}” is no cell. Write a letter and a number, such as B4.`;
    } else {
      const hasUnit = /[^\d\s.,+−-]/u.test(text);
      const typed = hasUnit || heading.unit === null ? text : `${text} ${heading.unit}`;
      const entry = enterValue(unlimitedField(panel, heading.parameter), typed, { decimalSign, ...speedOf(values) });
      if (entry.kind === 'refused') return entry.message;
      values[heading.parameter] = entry.value;
    }
  }
  return Object.keys(values).length === 0 ? 'It holds no value of a setting.' : { at, values, note };
}

const speedOf = ({ speedMmPerS }: ParameterValues) => (speedMmPerS === undefined ? {} : { speedMmPerS: speedMmPerS.physical });

const placeInList = (index: number) => ({ row: Math.floor(index / COLUMNS_OF_A_LIST), column: index % COLUMNS_OF_A_LIST });

function placeProblem(at: { row: number; column: number } | null, cells: ReadonlyMap<string, ReadCell>): string | undefined {
  if (at === null) return undefined;
  const address = cellAddress(at.row, at.column);
  if (cells.has(address)) return `${address} is there already. Each cell stands in one row.`;
  if (at.row < MAX_LEVELS_ON_PLATE && at.column < MAX_LEVELS_ON_PLATE) return undefined;
  return `${address} is off the plate. It has rows A to Z and ${MAX_LEVELS_ON_PLATE} columns.`;
}

const refused = ({ line, cells }: TextRow, reason: string): RefusedRowDto => ({
  line,
  text: cells.join(' | ').slice(0, SHOWN_LENGTH).trim(),
  reason,
});
