import { alignedNumbers, changeShare, changeWords, kindWords, shownNumber } from '../../lib/change-words';
import { formatNumber, formatQuantity, inShopNumbers } from '../../lib/format';
import type { Comparison, ComparisonRow } from './sign-offs.api';

/** Numbers at the work that a signer weighs; the others stand in Compare. */
const WEIGHED = new Set(['arealDose', 'peakFluence', 'rectangularPeakPower', 'averageIrradiance', 'pulsePitch', 'timePer100Mm2']);
/** From this share on a longer marking time is lit: it is paid for in every piece. */
const LONGER_IS_LIT = 0.2;

export type ChangeLine = {
  key: string;
  label: string;
  before: string;
  after: string;
  unit: string;
  /** Share for the bar; undefined: words. */
  share: number | undefined;
  change: string;
  note: string;
  isLit: boolean;
};

/** Rows of "what changes" in reading order, and the names of what stays the same. */
export function whatChanges({ rows }: Pick<Comparison, 'rows'>): { lines: ChangeLine[]; same: string[] } {
  const stepCount = new Set(rows.flatMap(({ step }) => (step === null ? [] : [step]))).size;
  const shown = rows.filter(({ group, key }) => group === 'entered' || (group === 'work' && WEIGHED.has(key)));
  const lines = shown.filter(({ isSame }) => !isSame).map((row) => changeLine(row, rows, stepCount > 1));
  const same = shown.filter(({ isSame, group }) => isSame && group === 'entered').map((row) => sameWords(row, stepCount > 1));
  return { lines, same };
}

function changeLine(row: ComparisonRow, rows: readonly ComparisonRow[], hasSteps: boolean): ChangeLine {
  const [before, after] = row.values;
  const share = changeShare(before?.value ?? null, after?.value ?? null);
  const size = after?.size ?? null;
  const isTime = row.key === 'timePer100Mm2';
  return {
    key: `${row.group} ${row.step ?? 0} ${row.key}`,
    label: named(row, hasSteps),
    before: valueText(row, 0),
    after: valueText(row, 1),
    unit: row.unit,
    share,
    change: kindWords(after?.change ?? '') ?? (share === undefined ? (size === null ? 'changed' : changeWords(size)) : percentWords(share)),
    note: noteOf(row, rows),
    isLit: isTime && share !== undefined && share >= LONGER_IS_LIT,
  };
}

function percentWords(share: number): string {
  return changeWords({ delta: share, symbol: '%', percent: share * 100, points: null });
}

function valueText({ values, group }: ComparisonRow, index: number): string {
  const side = values[index];
  if (side === undefined || (side.value === null && side.text === null)) return side?.missingBecause === null ? 'not set' : 'not known';
  if (side.value === null) return side.text ?? '';
  return group === 'work' ? shownNumber(side.value) : alignedNumbers(values.map(({ value }) => value))(side.value);
}

/** Power: points of the panel and what they are in watts. */
function noteOf({ key, group, step, values }: ComparisonRow, rows: readonly ComparisonRow[]): string {
  if (group !== 'entered') return inShopNumbers(values[1]?.missingBecause ?? '');
  const points = values[1]?.size?.points ?? null;
  if (key !== 'powerPercent' || points === null) return '';
  const watts = rows.find((row) => row.group === 'work' && row.key === 'powerW' && row.step === step)?.values.map(({ value }) => value);
  const [from = null, to = null] = watts ?? [];
  const inWatts =
    from === null || to === null
      ? ''
      : `, ${formatNumber(Number(from.toPrecision(3)))} to ${formatQuantity(Number(to.toPrecision(3)), 'W')}`;
  return `${formatNumber(Math.abs(points))} points${inWatts}`;
}

function sameWords(row: ComparisonRow, hasSteps: boolean): string {
  const text = row.values[0]?.value === null ? lowerFirst(valueText(row, 0)) : valueText(row, 0);
  return `${lowerFirst(named(row, hasSteps))} ${text}${row.unit === '' ? '' : `\u00A0${row.unit}`}`;
}

function named({ label, step }: ComparisonRow, hasSteps: boolean): string {
  return hasSteps && step !== null ? `Step ${step}: ${label}` : label;
}

const lowerFirst = (words: string) => (/^[A-Z][a-z]/.test(words) ? words.charAt(0).toLowerCase() + words.slice(1) : words);
