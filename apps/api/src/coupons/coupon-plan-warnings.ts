import { type DerivedNumber, PANEL_UNITS } from '@proofplate/physics';
import {
  isAbove,
  isWithinRange,
  largestPulseEnergyMj,
  machineRange,
  type Optics,
  PARAMETERS,
  type ParameterKey,
  type PhysicalProfile,
  type SetValue,
  showNumber,
} from '@proofplate/recipe-model';
import { cellDose } from './cell-dose';
import type { PlannedCell, PlannedGrid } from './coupon-plan-grid';
import { numbersOf } from './coupon-plan-numbers';
import type { StoredFactor } from './coupons.repository';
import type { DoseCautionDto } from './dto/coupon.dto';
import type { PlanWarningDto } from './dto/coupon-preview.dto';

export type WarningContext = {
  readonly optics: Optics;
  readonly doseCaution: DoseCautionDto | null;
  readonly plate: { readonly widthMm: number; readonly heightMm: number };
  readonly lens: { readonly name: string; readonly fieldSizeMm: number };
};

const SHOWN_DIGITS = 3;

/** What to look at before the plate is burnt; every warning says the way out. It refuses nothing. */
export function planWarnings(grid: PlannedGrid, context: WarningContext): PlanWarningDto[] {
  const numbers = new Map(grid.cells.map((cell) => [cell.address, numbersOf(cell.parameters, context.optics)]));
  const numberOf = (cell: PlannedCell, key: string) => presentValue(numbers.get(cell.address)?.get(key));
  return [
    ...doseWarning(grid, context.doseCaution),
    ...energyWarning(grid, context.optics.physical, (cell) => numberOf(cell, 'pulseEnergy')),
    ...gapWarning(grid, 'spots-apart', (cell) => numberOf(cell, 'pulseOverlap')),
    ...gapWarning(grid, 'lines-apart', (cell) => numberOf(cell, 'lineOverlap')),
    ...rangeWarnings(grid, context.optics.physical),
    ...noDoseWarning(grid),
    ...plateWarning(context),
    ...labelWarning(grid),
  ];
}

function doseWarning(grid: PlannedGrid, caution: DoseCautionDto | null): PlanWarningDto[] {
  if (caution === null) return [];
  const isTooMuch = (cell: PlannedCell) => (cellDose(cell.parameters).value ?? 0) >= caution.doseJPerMm2;
  const flagged = grid.cells.filter(isTooMuch);
  if (flagged.length === 0) return [];
  const limit = `${short(caution.doseJPerMm2)} J/mm²`;
  const title = `${counted(flagged.length, 'cell')} at or above ${limit} may burn too deep`;
  return [warning('dose', title, [sentence(caution.source), wayOut(grid, isTooMuch)].join(' '), flagged)];
}

function energyWarning(
  grid: PlannedGrid,
  physical: PhysicalProfile,
  energyOf: (cell: PlannedCell) => number | undefined,
): PlanWarningDto[] {
  const isTooMuch = (cell: PlannedCell) => {
    const limitMj = largestPulseEnergyMj(physical, cell.parameters.values.pulseWidthNs?.physical ?? null);
    const energyMj = energyOf(cell);
    return energyMj !== undefined && limitMj !== null && isAbove(energyMj, limitMj);
  };
  const flagged = grid.cells.filter(isTooMuch);
  if (flagged.length === 0) return [];
  const why = 'The source cannot give this much at this pulse width, so the mark will be weaker than the numbers say.';
  const title = `${counted(flagged.length, 'cell')} above the source’s largest pulse energy`;
  return [warning('pulse-energy', title, `${why} ${wayOut(grid, isTooMuch, 'Raise the frequency or lower the power.')}`, flagged)];
}

const GAPS = {
  'spots-apart': { what: 'spots that do not touch along the line', otherwise: 'Lower the speed or raise the frequency.' },
  'lines-apart': { what: 'lines that do not touch', otherwise: 'Take a closer line spacing.' },
} as const;

function gapWarning(grid: PlannedGrid, code: keyof typeof GAPS, overlapOf: (cell: PlannedCell) => number | undefined): PlanWarningDto[] {
  const isApart = (cell: PlannedCell) => (overlapOf(cell) ?? 0) < 0;
  const flagged = grid.cells.filter(isApart);
  if (flagged.length === 0) return [];
  const { what, otherwise } = GAPS[code];
  const title = `${counted(flagged.length, 'cell')} with ${what}`;
  return [warning(code, title, `Bare ground stays between them. ${wayOut(grid, isApart, otherwise)}`, flagged)];
}

function rangeWarnings(grid: PlannedGrid, physical: PhysicalProfile): PlanWarningDto[] {
  return [
    ...outside(grid, 'frequencyKhz', physical, 'the source’s range of frequencies'),
    ...outside(grid, 'pulseWidthNs', physical, 'the source’s range of pulse widths'),
    ...outside(grid, 'speedMmPerS', physical, 'what the scan head can do'),
  ];
}

function outside(grid: PlannedGrid, key: ParameterKey, physical: PhysicalProfile, what: string): PlanWarningDto[] {
  const range = machineRange(physical, key);
  if (range === undefined) return [];
  const isOutside = ({ parameters }: PlannedCell) => {
    const value = parameters.values[key]?.physical;
    return value !== undefined && !isWithinRange(value, range);
  };
  const flagged = grid.cells.filter(isOutside);
  if (flagged.length === 0) return [];
  const { label, symbol } = PARAMETERS[key];
  const limits = range.from > 0 ? `${short(range.from)} to ${short(range.to)} ${symbol}` : `at most ${short(range.to)} ${symbol}`;
  const title = `${counted(flagged.length, 'cell')} outside of ${what}`;
  return [warning('out-of-range', title, `${label} must be ${limits}; outside of it nobody knows what is marked.`, flagged)];
}

function noDoseWarning(grid: PlannedGrid): PlanWarningDto[] {
  const without = grid.cells.flatMap((cell) => {
    const { missingBecause } = cellDose(cell.parameters);
    return missingBecause === null ? [] : [{ cell, missingBecause }];
  });
  const [first] = without;
  if (first === undefined) return [];
  const addresses = without.length === grid.cells.length ? [] : without.map(({ cell }) => cell);
  return [warning('no-dose', 'The dose cannot be worked out', sentence(first.missingBecause), addresses)];
}

function plateWarning({ plate: { widthMm, heightMm }, lens }: WarningContext): PlanWarningDto[] {
  if (Math.max(widthMm, heightMm) <= lens.fieldSizeMm) return [];
  const size = `${short(widthMm)} × ${short(heightMm)} mm`;
  const detail = `${lens.name} marks ${short(lens.fieldSizeMm)} mm each way. Take fewer levels, smaller cells or a lens with a larger field.`;
  return [warning('plate-too-large', `The plate of ${size} is larger than the lens’s field`, detail, [])];
}

function labelWarning({ labelStep }: PlannedGrid): PlanWarningDto[] {
  if (labelStep !== null) return [];
  const detail =
    'Without corner marks a photo cannot be laid under the grid by itself. Add a label step, and prove it on a scrap edge first.';
  return [warning('no-labels', 'Corner marks and letters have no setting', detail, [])];
}

/** Where to begin or stop each factor so that no flagged cell is left, by the levels that are on the plate. */
function wayOut(grid: PlannedGrid, isFlagged: (cell: PlannedCell) => boolean, otherwise = 'Take other levels.'): string {
  const ways = [
    wayAlong(grid.rowFactor, (level) => grid.cells.filter(({ row }) => row === level).some(isFlagged)),
    wayAlong(grid.columnFactor, (level) => grid.cells.filter(({ column }) => column === level).some(isFlagged)),
  ].filter((way) => way !== undefined);
  if (ways.length === 0) return otherwise;
  return `${capital(ways.join(', or '))}.`;
}

function wayAlong(factor: StoredFactor | null, isLevelFlagged: (level: number) => boolean): string | undefined {
  if (factor === null) return undefined;
  const flags = factor.levels.map((_, level) => isLevelFlagged(level));
  const [first, last] = [flags.indexOf(true), flags.lastIndexOf(true)];
  const label = PARAMETERS[factor.parameter].label.toLowerCase();
  const [before, after] = [factor.levels[first - 1], factor.levels[last + 1]];
  // flagged levels in the middle, or all of them, leave no single cut
  if (first === 0 && after !== undefined) return `begin the ${label} at ${shown(after)}`;
  if (last === flags.length - 1 && before !== undefined) return `stop the ${label} at ${shown(before)}`;
  return undefined;
}

const shown = ({ entered: { value, unit } }: SetValue) => `${showNumber(value)} ${PANEL_UNITS[unit].symbol}`;
const short = (value: number) => showNumber(Number(value.toPrecision(SHOWN_DIGITS)));
const counted = (count: number, noun: string) => `${count} ${noun}${count === 1 ? '' : 's'}`;
const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
const sentence = (text: string) => (text.endsWith('.') ? text : `${text}.`);
const presentValue = (derived: DerivedNumber | undefined) => derived?.value;

const warning = (code: string, title: string, detail: string, cells: readonly PlannedCell[]): PlanWarningDto => ({
  ...{ code, title, detail },
  addresses: cells.map(({ address }) => address),
});
