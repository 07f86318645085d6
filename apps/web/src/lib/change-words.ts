import { formatNumber, formatPercentChange } from './format';

/** A difference of two numbers as the api gives it. */
export type ChangeSize = { delta: number; symbol: string; percent: number | null; points: number | null };

/** Share of the compared value, for a bar; undefined where a share means nothing. */
export function changeShare(before: number | null, after: number | null): number | undefined {
  if (before === null || after === null || before === 0) return undefined;
  return (after - before) / Math.abs(before);
}

/** "−26 %", "+5 points", "+4.2": percents for quantities, points for values that are percents themselves, else the plain difference. */
export function changeWords({ delta, percent, points }: ChangeSize): string {
  if (points !== null) return `${formatNumber(points, { isSigned: true })} points`;
  if (percent === null) return formatNumber(Number(delta.toPrecision(3)), { isSigned: true });
  const isTiny = Math.abs(percent) < 0.5;
  return formatPercentChange(percent / 100, isTiny ? { decimals: undefined, significantDigits: 1 } : {});
}

const ADDED_WORDS = { added: 'added', removed: 'removed', 'not comparable': 'not comparable' } as const;

/** What a changed value without numbers says. */
export function kindWords(change: string): string | undefined {
  return Object.entries(ADDED_WORDS).find(([key]) => key === change)?.[1];
}

const SHOWN_DIGITS = 3;
/** Below it a computed number is the noise of its formula. */
const NOTHING = 1e-6;
const MOST_DECIMALS = 6;

/** A computed number to three digits: 13.0, 0.0353, 1230. */
export function shownNumber(value: number): string {
  if (Math.abs(value) < NOTHING) return '0';
  return formatNumber(value, { significantDigits: SHOWN_DIGITS });
}

/** Typed numbers of one row with the decimals of the finest among them: 0.010 beside 0.012. */
export function alignedNumbers(values: readonly (number | null)[]): (value: number) => string {
  const places = values.map((value) => (value === null ? 0 : (String(value).split('.')[1] ?? '').length));
  const decimals = Math.min(MOST_DECIMALS, Math.max(0, ...places));
  return (value) => formatNumber(value, { decimals });
}
