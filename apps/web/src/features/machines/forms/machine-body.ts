import { isPanelUnit } from '@proofplate/physics';
import type { PanelField, PhysicalProfile, PulseEnergyLimit } from '@proofplate/recipe-model';
import { type NumberRule, type ReadNumber, readNumber } from '../../../lib/read-number';
import type { MachineBody } from '../machines.api';
import { readTwoColumns } from '../two-columns';
import {
  FREQUENCY_RULE,
  HEAD_NUMBERS,
  needsRange,
  PULSE_ENERGY_RULE,
  PULSE_WIDTH_RULE,
  panelNumberRule,
  rangeNumberRule,
  SOURCE_NUMBERS,
  WARM_UP_RULE,
} from './machine-rules';
import { hasPulseWidths, isPulsed, type MachineValues, type PanelRowValues } from './machine-values';

type Range = { from: number; to: number };

/** What the form has checked before is there; were it not, the request would carry null and be refused at the field. */
const NOT_READ = { wavelengthNm: Number.NaN, ratedPowerW: Number.NaN };

/** What is sent, from values whose every field has passed its own check. */
export function machineBody(values: MachineValues, locale: string): MachineBody {
  return {
    name: values.name.trim(),
    serialNumber: values.serialNumber.trim(),
    warmUpMinutes: optional(values.warmUpMinutes, WARM_UP_RULE, locale) ?? 0,
    mountedLensId: values.mountedLensId === '' ? null : values.mountedLensId,
    physical: physicalBody(values.physical, locale),
    panel: { fields: values.panel.fields.flatMap((row) => panelField(row, locale) ?? []) },
  };
}

/** A row as the panel holds it; undefined while something in it cannot be read. */
export function panelField(row: PanelRowValues, locale: string): PanelField | undefined {
  const { parameter, label, unit } = row;
  if (!isPanelUnit(unit)) return undefined;
  const numbers: Partial<Record<'minimum' | 'maximum' | 'step' | 'rangeLow' | 'rangeHigh', number>> = {};
  for (const key of ['minimum', 'maximum', 'step'] as const) {
    if (!take(numbers, key, row[key], panelNumberRule('The value', unit), locale)) return undefined;
  }
  for (const key of needsRange(parameter, unit) ? (['rangeLow', 'rangeHigh'] as const) : []) {
    if (!take(numbers, key, row[key], rangeNumberRule('The value', parameter, unit), locale)) return undefined;
  }
  const choices = readList(row.choices, panelNumberRule('The choice', unit), locale);
  if ('message' in choices) return undefined;
  return { parameter, label: label.trim(), unit, ...numbers, ...(choices.values.length === 0 ? {} : { choices: choices.values }) };
}

/** Numbers parted by blanks; a semicolon parts them too. */
export function readList(text: string, rule: NumberRule, locale: string): { values: number[] } | { message: string } {
  const values: number[] = [];
  for (const word of text.split(/[\s;]+/).filter((part) => part !== '')) {
    const read = readNumber(word, rule, locale);
    if ('message' in read) return read;
    values.push(read.value);
  }
  return { values };
}

/** The largest pulse energies: one number where the width is fixed, else pairs of width and energy. */
export function readEnergies(text: string, hasWidths: boolean, locale: string): { limits: PulseEnergyLimit[] } | { message: string } {
  if (text.trim() === '') return { limits: [] };
  if (!hasWidths) {
    const read = readNumber(text, PULSE_ENERGY_RULE, locale);
    return 'message' in read ? read : { limits: [{ pulseWidthNs: null, energyMj: read.value }] };
  }
  const read = readTwoColumns(text, locale);
  if ('message' in read) return read;
  const isWrong = read.rows.some(([width, energy]) => width <= 0 || energy <= 0);
  if (isWrong) return { message: 'Pulse widths and energies are above zero.' };
  return { limits: read.rows.map(([pulseWidthNs, energyMj]) => ({ pulseWidthNs, energyMj })) };
}

function physicalBody(typed: MachineValues['physical'], locale: string): PhysicalProfile {
  const { sourceKind } = typed;
  const numbers = [...SOURCE_NUMBERS, ...HEAD_NUMBERS].flatMap((rule) => {
    const value = optional(typed[rule.name], rule, locale);
    return value === undefined ? [] : [[rule.name, value] as const];
  });
  const frequency = isPulsed(sourceKind) ? range(typed.frequencyRangeKhz, FREQUENCY_RULE, locale) : undefined;
  const width = hasPulseWidths(sourceKind) ? range(typed.pulseWidthRangeNs, PULSE_WIDTH_RULE, locale) : undefined;
  const widths = hasPulseWidths(sourceKind) ? readList(typed.pulseWidthsNs, PULSE_WIDTH_RULE, locale) : { values: [] };
  const energies = isPulsed(sourceKind) ? readEnergies(typed.maxPulseEnergyMj, hasPulseWidths(sourceKind), locale) : { limits: [] };
  return {
    sourceKind,
    ...NOT_READ,
    ...Object.fromEntries(numbers),
    ...(frequency === undefined ? {} : { frequencyRangeKhz: frequency }),
    ...(width === undefined ? {} : { pulseWidthRangeNs: width }),
    ...('values' in widths && widths.values.length > 0 ? { pulseWidthsNs: widths.values } : {}),
    ...('limits' in energies && energies.limits.length > 0 ? { maxPulseEnergyMj: energies.limits } : {}),
  };
}

function range({ from, to }: { from: string; to: string }, rule: NumberRule, locale: string): Range | undefined {
  const [low, high] = [optional(from, rule, locale), optional(to, rule, locale)];
  return low === undefined || high === undefined ? undefined : { from: low, to: high };
}

function optional(text: string, rule: NumberRule, locale: string): number | undefined {
  if (text.trim() === '') return undefined;
  const read: ReadNumber = readNumber(text, rule, locale);
  return 'value' in read ? read.value : undefined;
}

/** Puts a typed number where it belongs; false when it cannot be read. */
function take<Key extends string>(into: Partial<Record<Key, number>>, key: Key, text: string, rule: NumberRule, locale: string): boolean {
  if (text.trim() === '') return true;
  const read = readNumber(text, rule, locale);
  if ('message' in read) return false;
  into[key] = read.value;
  return true;
}
