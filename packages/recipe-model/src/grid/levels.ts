import { acceptEntered, type Entry } from '../panel/enter-value';
import type { PanelField } from '../panel/panel';
import { showNumber } from '../panel/show-number';
import { roundToPanel } from '../panel/showable';
import type { EnteredValue, SetValue } from '../vocabulary/setting';

export type LevelSpacing = 'steps' | 'ratios';
export const LEVEL_SPACING_LABELS: Readonly<Record<LevelSpacing, string>> = { steps: 'Equal steps', ratios: 'Equal ratios' };

/** More than a plate can hold; it bounds the work of a request. */
export const MAX_LEVELS = 50;

/** From and to are in the panel's unit. */
export type LevelRequest = { from: number; to: number; count: number; spacing: LevelSpacing; field: PanelField; speedMmPerS?: number };

export type Levels = { kind: 'levels'; values: SetValue[] } | { kind: 'refused'; message: string; nearest?: EnteredValue[] };

/**
 * Levels of a factor, rounded to what the panel shows and still strictly rising or falling.
 *                                                     steps: from + i (to − from)/(n − 1);  ratios: from (to/from)^(i/(n − 1))
 *
 * @param request from and to in the panel's unit, the number of levels, equal steps or equal ratios, and the panel's field
 * @returns the levels in order, first and last exactly as asked; or a refusal in words that says the way out
 */
export function levels(request: LevelRequest): Levels {
  const { from, to, count, spacing, field } = request;
  if (!Number.isInteger(count) || count < 1 || count > MAX_LEVELS) return refused(`A factor has 1 to ${MAX_LEVELS} levels.`);
  if (count > 1 && from === to) return refused(`${field.label}: the first and the last level are the same.`);
  if (count === 1 && from !== to) return refused(`${field.label}: one level has no first and last value. Give more levels or one value.`);
  if (spacing === 'ratios' && !(from > 0 && to > 0))
    return refused(`${field.label}: equal ratios need a first and a last level above zero.`);
  const wanted = Array.from({ length: count }, (_, index) => levelAt(index, request));
  const entries = wanted.map((level, index) => entryOf(level, index === 0 || index === count - 1, request));
  const values: SetValue[] = [];
  for (const entry of entries) {
    if (entry.kind === 'refused') return { kind: 'refused', message: entry.message, ...(entry.nearest && { nearest: entry.nearest }) };
    values.push(entry.value);
  }
  return isStrictlyMonotone(values) ? { kind: 'levels', values } : refused(tooClose(request));
}

function levelAt(index: number, { from, to, count, spacing }: LevelRequest): number {
  if (index === 0) return from;
  if (index === count - 1) return to;
  const share = index / (count - 1);
  return spacing === 'steps' ? from + share * (to - from) : from * (to / from) ** share;
}

/** The ends are what the person typed and are refused if the panel cannot show them; what lies between is rounded. */
function entryOf(level: number, isEnd: boolean, { field, speedMmPerS }: LevelRequest): Entry {
  const value = isEnd ? level : (roundToPanel(field, level) ?? level);
  return acceptEntered(field, { value: withoutNoise(value), unit: field.unit }, { speedMmPerS });
}

/** A panel without a step shows what it is given; 12 digits are more than anybody dials in. */
function withoutNoise(value: number): number {
  return Number.isFinite(value) ? Number(value.toPrecision(12)) : value;
}

function isStrictlyMonotone(values: readonly SetValue[]): boolean {
  const numbers = values.map((value) => value.entered.value);
  const isRising = numbers.every((number, index) => index === 0 || number > numbers[index - 1]);
  const isFalling = numbers.every((number, index) => index === 0 || number < numbers[index - 1]);
  return isRising || isFalling;
}

function tooClose({ from, to, count, field }: LevelRequest): string {
  return `${field.label}: the panel cannot show ${count} different levels from ${showNumber(from)} to ${showNumber(to)}. Take fewer levels or a wider range.`;
}

function refused(message: string): Levels {
  return { kind: 'refused', message };
}
