import { changeShare, changeWords, kindWords, shownNumber } from '../../../lib/change-words';
import { formatNumber } from '../../../lib/format';
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
export type RowView = { key: string; label: string; unit: string; cells: readonly CellView[] };
export type GroupView = { key: ComparisonRow['group']; title: string; rows: readonly RowView[] };

export type ComparisonView = { groups: readonly GroupView[]; hidden: readonly string[] };

/** Rows in the four questions' order; with `onlyDiffering` equal rows are left out and named. */
export function comparisonView(
  { rows, referenceId }: Comparison,
  { machineName, onlyDiffering }: { machineName: string; onlyDiffering: boolean },
): ComparisonView {
  const hasSteps = rows.some(({ step }) => step !== null && step > 1);
  const shown = rows.filter(({ isSame }) => !onlyDiffering || !isSame);
  const hidden = rows.filter((row) => !shown.includes(row));
  const titles: readonly (readonly [ComparisonRow['group'], string])[] = [
    ['entered', `As entered on ${machineName}’s panel`],
    ['work', 'At the work'],
    ['mark', 'The mark'],
  ];
  const groups = titles.map(([key, title]) => ({
    key,
    title,
    rows: shown.filter(({ group }) => group === key).map((row) => rowView(row, referenceId, hasSteps)),
  }));
  return {
    groups: groups.filter(({ rows: own }) => own.length > 0),
    hidden: [...new Set(hidden.map((row) => lowerFirst(named(row, hasSteps))))],
  };
}

function rowView(row: ComparisonRow, referenceId: string, hasSteps: boolean): RowView {
  const reference = row.values.find(({ revisionId }) => revisionId === referenceId);
  return {
    key: `${row.group} ${row.step ?? 0} ${row.key}`,
    label: named(row, hasSteps),
    unit: row.unit,
    cells: row.values.map((side) => ({
      revisionId: side.revisionId,
      isReference: side.revisionId === referenceId,
      text: valueText(row, side),
      isMissing: side.value === null && side.text === null,
      share: side.change === 'changed' ? changeShare(reference?.value ?? null, side.value) : undefined,
      change: changeText(row, side),
    })),
  };
}

function valueText({ group }: ComparisonRow, { value, text, missingBecause }: ComparisonRow['values'][number]): string {
  if (value === null && text === null) return missingBecause === null ? 'not set' : 'not known';
  return group === 'entered' || value === null ? (text ?? '') : shownNumber(value);
}

function changeText({ group }: ComparisonRow, { change, size }: ComparisonRow['values'][number]): string {
  if (change === 'reference') return '';
  if (change === 'same') return 'same';
  const words = kindWords(change);
  if (words !== undefined) return words;
  if (size === null) return 'changed';
  // A share of a lightness means nothing to the eye; its difference does.
  return group === 'mark' ? formatNumber(Number(size.delta.toPrecision(3)), { isSigned: true }) : changeWords(size);
}

function named({ label, step }: ComparisonRow, hasSteps: boolean): string {
  return hasSteps && step !== null ? `Step ${step}: ${label}` : label;
}

const lowerFirst = (words: string) => (/^[A-Z][a-z]/.test(words) ? words.charAt(0).toLowerCase() + words.slice(1) : words);
