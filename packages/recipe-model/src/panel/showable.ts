import { PARAMETERS } from '../vocabulary/parameters';
import type { PanelField } from './panel';

/** Relative agreement within which two panel values are the same; conversion noise stays far below it. */
const SAME = 1e-9;
const WHOLE_PERCENT = 100;

/** The step of the field; a whole-number parameter steps by one where the panel states none. */
export function stepOf(field: PanelField): number | undefined {
  if (field.step !== undefined && field.step > 0) return field.step;
  return PARAMETERS[field.parameter].wholeNumber ? 1 : undefined;
}

/** True if the panel can show exactly this number, in the panel's unit. */
export function isShowable(field: PanelField, shown: number): boolean {
  if (field.choices !== undefined) return field.choices.some((choice) => isSame(choice, shown));
  if (field.minimum !== undefined && shown < field.minimum && !isSame(field.minimum, shown)) return false;
  const maximum = highestOf(field);
  if (maximum !== undefined && shown > maximum && !isSame(maximum, shown)) return false;
  const step = stepOf(field);
  if (step === undefined || isLimit(field, shown)) return true;
  return Math.abs(shown - onStep(Math.round(shown / step), step)) <= SAME * Math.max(Math.abs(shown), step);
}

/** The numbers nearest to a wanted one that the panel can show: at most two, lower first; one where the limits leave no second. */
export function nearestShowable(field: PanelField, wanted: number): number[] {
  const candidates = field.choices ?? candidatesNear(field, wanted);
  return [...new Set(candidates)]
    .sort((a, b) => Math.abs(a - wanted) - Math.abs(b - wanted) || a - b)
    .slice(0, 2)
    .sort((a, b) => a - b);
}

/** The one nearest number that the panel can show; a tie goes to the lower one. Undefined only where no number is allowed. */
export function roundToPanel(field: PanelField, wanted: number): number | undefined {
  if (field.choices === undefined && stepOf(field) === undefined && isShowable(field, wanted)) return wanted;
  const near = nearestShowable(field, wanted);
  return near.reduce<number | undefined>(
    (best, next) => (best === undefined || Math.abs(next - wanted) < Math.abs(best - wanted) ? next : best),
    undefined,
  );
}

function candidatesNear(field: PanelField, wanted: number): number[] {
  const { minimum = Number.NEGATIVE_INFINITY } = field;
  const maximum = highestOf(field) ?? Number.POSITIVE_INFINITY;
  const limits = [minimum, maximum].filter(Number.isFinite);
  const step = stepOf(field);
  if (step === undefined) return limits;
  const inside = Math.min(Math.max(wanted, minimum), maximum);
  const below = Math.floor(inside / step + SAME);
  const steps = [below - 1, below, below + 1, below + 2].map((count) => onStep(count, step));
  return [...limits, ...steps].filter((candidate) => candidate >= minimum && candidate <= maximum && isAllowed(field, candidate));
}

/** A percent of a range ends at 100 %, whatever the panel is said to show. */
function highestOf({ unit, maximum }: PanelField): number | undefined {
  if (unit !== 'percentFromZero' && unit !== 'percentFromMinimum') return maximum;
  return Math.min(maximum ?? WHOLE_PERCENT, WHOLE_PERCENT);
}

/** A suggestion must not be one that the parameter itself refuses, such as zero passes. */
function isAllowed(field: PanelField, shown: number): boolean {
  const { mayBeZero, mayBeNegative } = PARAMETERS[field.parameter];
  return shown > 0 || (shown === 0 && mayBeZero) || (shown < 0 && mayBeNegative);
}

function isLimit(field: PanelField, shown: number): boolean {
  return [field.minimum, field.maximum].some((limit) => limit !== undefined && isSame(limit, shown));
}

function isSame(a: number, b: number): boolean {
  return Math.abs(a - b) <= SAME * Math.max(Math.abs(a), Math.abs(b));
}

/** A multiple of the step without binary noise: 3 steps of 0.1 are 0.3. */
function onStep(count: number, step: number): number {
  const multiple = Number((count * step).toFixed(decimalsOf(step)));
  return multiple === 0 ? 0 : multiple;
}

function decimalsOf(step: number): number {
  const [digits = '', exponent = '0'] = String(step).split('e');
  const behindPoint = digits.split('.')[1]?.length ?? 0;
  return Math.min(20, Math.max(0, behindPoint - Number(exponent)));
}
