import { alignedNumbers, changeShare, changeWords, kindWords, shownNumber } from '../../../lib/change-words';
import { formatNumber } from '../../../lib/format';
import { decimalsOf, withSymbol } from '../../../lib/measurement-words';
import { isShare } from '../../../lib/share-numbers';
import type { Comparison, ComparisonRow } from '../recipes.api';

export type CellView = {
  revisionId: string;
  isReference: boolean;
  text: string;
  isMissing: boolean;
  /** Share for the bar. */
  share: number | undefined;
  /** "−26 %", "same", "added"; empty for the reference. */
  change: string;
};
export type RowView = {
  key: string;
  label: string;
  unit: string;
  cells: readonly CellView[];
  /** A computed number that most people do not ask for. */
  isAside: boolean;
};
export type GroupView = { key: ComparisonRow['group']; title: string; rows: readonly RowView[] };

export type ComparisonView = {
  groups: readonly GroupView[];
  /** Names of rows that are the same in all. */
  hidden: readonly string[];
  /** Names of rows that are known of none: nobody can say whether they are the same. */
  unknown: readonly string[];
};

/** Computed numbers that show at once; the others open on demand. */
const ASKED_FOR = new Set([
  'powerW',
  'pulseEnergy',
  'rectangularPeakPower',
  'peakFluence',
  'averageIrradiance',
  'pulsePitch',
  'arealDose',
  'timePer100Mm2',
]);
/** A share of what may be zero says nothing. */
const CROSSES_ZERO = new Set(['a', 'b', 'hue-angle', 'focusOffsetMm', 'hatchAngleDeg', 'angleStepDeg']);
const MARK_ORDER = ['lightness', 'contrast', 'evenness', 'depth'];

/** Rows in the four questions' order; with `onlyDiffering` equal rows are left out and named. */
export function comparisonView(
  { rows, referenceId }: Comparison,
  { machineName, onlyDiffering }: { machineName: string; onlyDiffering: boolean },
): ComparisonView {
  const hasSteps = rows.some(({ step }) => step !== null && step > 1);
  const shown = rows.filter((row) => !onlyDiffering || !looksSame(row));
  const hidden = rows.filter((row) => !shown.includes(row));
  const names = (left: readonly ComparisonRow[]) => [...new Set(left.map((row) => lowerFirst(named(row, hasSteps))))];
  const titles: readonly (readonly [ComparisonRow['group'], string])[] = [
    ['entered', `As entered on ${machineName}’s panel`],
    ['work', 'At the work'],
    ['mark', 'The mark'],
  ];
  const groups = titles.map(([key, title]) => ({
    key,
    title,
    rows: inOrder(shown.filter(({ group }) => group === key)).map((row) => rowView(row, referenceId, hasSteps)),
  }));
  return {
    groups: groups.filter(({ rows: own }) => own.length > 0),
    hidden: names(hidden.filter((row) => !isUnknown(row))),
    unknown: names(hidden.filter(isUnknown)),
  };
}

/** What stands in no row, under the rows. */
export function leftOutWords({ hidden, unknown }: Pick<ComparisonView, 'hidden' | 'unknown'>): string {
  return [
    ...(hidden.length === 0 ? [] : [`Equal rows hidden: ${hidden.join(', ')}`]),
    ...(unknown.length === 0 ? [] : [`Not known of any: ${unknown.join(', ')}`]),
  ].join('. ');
}

/** Computed numbers that read the same are the same to whoever compares them. */
function looksSame(row: ComparisonRow): boolean {
  const texts = new Set(row.values.map((side) => valueText(row, side)));
  return row.isSame || (row.group === 'work' && texts.size === 1);
}

const isUnknown = ({ values }: ComparisonRow) =>
  values.every(({ value, text, missingBecause }) => value === null && text === null && missingBecause !== null);

function inOrder(rows: readonly ComparisonRow[]): readonly ComparisonRow[] {
  const place = ({ group, key }: ComparisonRow) =>
    group === 'mark' && MARK_ORDER.includes(key) ? MARK_ORDER.indexOf(key) : MARK_ORDER.length;
  return rows.toSorted((one, other) => place(one) - place(other));
}

function rowView(row: ComparisonRow, referenceId: string, hasSteps: boolean): RowView {
  const reference = row.values.find(({ revisionId }) => revisionId === referenceId);
  return {
    key: `${row.group} ${row.step ?? 0} ${row.key}`,
    label: named(row, hasSteps),
    unit: isShare(row.key) ? '%' : row.unit === '1' ? '' : row.unit,
    isAside: row.group === 'work' && !ASKED_FOR.has(row.key),
    cells: row.values.map((side) => ({
      revisionId: side.revisionId,
      isReference: side.revisionId === referenceId,
      text: valueText(row, side),
      isMissing: side.value === null && side.text === null,
      share:
        side.change === 'changed' && !CROSSES_ZERO.has(row.key) && !isShare(row.key)
          ? changeShare(reference?.value ?? null, side.value)
          : undefined,
      change: changeText(row, side),
    })),
  };
}

function valueText(row: ComparisonRow, { value, text, missingBecause }: ComparisonRow['values'][number]): string {
  if (value === null && text === null) return missingBecause === null ? 'not set' : 'not known';
  if (value === null) return text ?? '';
  if (row.group === 'mark') return formatNumber(value, { decimals: decimalsOf(row.key) });
  if (isShare(row.key)) return shownNumber(value * 100);
  // The row's finest value decides the decimals of all: 0.010 beside 0.012.
  return row.group === 'work' ? shownNumber(value) : alignedNumbers(row.values.map((side) => side.value))(value);
}

function changeText({ group, key }: ComparisonRow, { change, size, missingBecause }: ComparisonRow['values'][number]): string {
  if (change === 'reference') return '';
  if (change === 'same') return missingBecause === null ? 'same' : '';
  const words = kindWords(change);
  if (words !== undefined) return words;
  if (size === null) return 'changed';
  if (isShare(key)) return changeWords({ ...size, points: Number((size.delta * 100).toPrecision(3)) });
  // A share of a lightness means nothing to the eye; its difference does.
  return group === 'mark' ? formatNumber(Number(size.delta.toPrecision(3)), { isSigned: true }) : changeWords(size);
}

function named({ group, key, label, step }: ComparisonRow, hasSteps: boolean): string {
  if (group === 'mark') return withSymbol(label, key);
  return hasSteps && step !== null ? `Step ${step}: ${label}` : label;
}

/** Names of people keep their capital. */
const lowerFirst = (words: string) =>
  /^(?!Rayleigh|Gaussian)[A-Z][a-z]/.test(words) ? words.charAt(0).toLowerCase() + words.slice(1) : words;
