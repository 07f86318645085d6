import { type DecimalSign, PANEL_UNITS, type PanelUnit, panelValue, parseTypedNumber, physicalValue } from '@proofplate/physics';
import { PARAMETERS } from '../vocabulary/parameters';
import type { EnteredValue, SetValue } from '../vocabulary/setting';
import type { PanelField } from './panel';
import { panelScale } from './panel-scale';
import { showNumber } from './show-number';
import { isShowable, nearestShowable } from './showable';

/** Digits of a converted number in a message; enough to recognise it. */
const CONVERTED_DIGITS = 6;

export type EntryContext = {
  decimalSign?: DecimalSign;
  /** Scan speed of the same setting: pulses per inch need it. */
  speedMmPerS?: number;
};

export type EntryRefusal = {
  kind: 'refused';
  reason: 'unreadable' | 'wrong unit' | 'not convertible' | 'impossible' | 'panel cannot show';
  message: string;
  /** The values nearest to the typed one that the panel can show, in the panel's unit. */
  nearest?: EnteredValue[];
  /** Both meanings of an ambiguous number. */
  readings?: [number, number];
};

export type Entry = { kind: 'accepted'; value: SetValue } | EntryRefusal;

/**
 * Reads what a person typed into a field of a machine's panel. The entered value keeps number and unit as typed.
 *
 * @param field   field of the machine's panel
 * @param typed   the text, with or without a unit
 * @param context decimal sign of the person's locale; scan speed where the unit needs it
 * @returns the value as entered with its physical value, or a refusal in words with the nearest values that the panel can show
 */
export function enterValue(field: PanelField, typed: string, context: EntryContext = {}): Entry {
  const read = parseTypedNumber(typed, { decimalSign: context.decimalSign ?? '.' });
  if (read.kind === 'refused') {
    const { message, readings } = read;
    return { kind: 'refused', reason: 'unreadable', message, ...(readings === undefined ? {} : { readings }) };
  }
  if (read.unit !== '%') return acceptEntered(field, { value: read.value, unit: read.unit ?? field.unit }, context);
  return acceptEntered(field, { value: read.value, unit: percentUnitOf(field) }, context);
}

/**
 * Checks a value that is already a number with its unit (an import, a request body) by the rules of enterValue.
 *
 * @param field   field of the machine's panel
 * @param entered number and unit as typed
 * @param context decimal sign for messages; scan speed where the unit needs it
 * @returns the value as entered with its physical value, or a refusal in words
 */
export function acceptEntered(field: PanelField, entered: EnteredValue, context: EntryContext = {}): Entry {
  if (!Number.isFinite(entered.value)) return refused('unreadable', `${field.label} must be a number.`);
  const { panelUnits, symbol } = PARAMETERS[field.parameter];
  if (entered.unit !== field.unit && !panelUnits.includes(entered.unit)) {
    const unit = PANEL_UNITS[entered.unit].label;
    return refused('wrong unit', `${field.label} is not measured in ${unit}. This panel shows ${PANEL_UNITS[field.unit].label}.`);
  }
  const impossible = impossibility(field, entered, symbol, context.decimalSign);
  if (impossible !== undefined) return impossible;
  try {
    const physical = physicalValue(entered.value, panelScale(field, entered.unit, context.speedMmPerS));
    const shown = entered.unit === field.unit ? entered.value : panelValue(physical, panelScale(field, field.unit, context.speedMmPerS));
    if (!isShowable(field, shown)) return cannotShow(field, { shown, entered }, context.decimalSign);
    return { kind: 'accepted', value: { entered: { value: entered.value, unit: entered.unit }, physical } };
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    return refused('not convertible', missingWords(field, entered.unit, context));
  }
}

function impossibility(
  field: PanelField,
  { value, unit }: EnteredValue,
  symbol: string,
  decimalSign?: DecimalSign,
): EntryRefusal | undefined {
  const meaning = PARAMETERS[field.parameter];
  if (value < 0 && !meaning.mayBeNegative) return impossible(field, value, 'cannot be below zero', decimalSign);
  // A percent from the minimum is zero at the minimum itself, which is a real value.
  if (value === 0 && !meaning.mayBeZero && unit !== 'percentFromMinimum') return impossible(field, value, 'cannot be zero', decimalSign);
  if (meaning.wholeNumber && !Number.isInteger(value)) return impossible(field, value, `must be a whole number (${symbol})`, decimalSign);
  return undefined;
}

function impossible(field: PanelField, value: number, why: string, decimalSign?: DecimalSign): EntryRefusal {
  const nearest = nearestShowable(field, value).map((near) => ({ value: near, unit: field.unit }));
  return { ...refused('impossible', `${field.label} ${why}.${nearestWords(nearest, decimalSign)}`), nearest };
}

function cannotShow(
  field: PanelField,
  { shown, entered }: { shown: number; entered: EnteredValue },
  decimalSign?: DecimalSign,
): EntryRefusal {
  const nearest = nearestShowable(field, shown).map((value) => ({ value, unit: field.unit }));
  const typed = `${showNumber(entered.value, decimalSign)} ${PANEL_UNITS[entered.unit].symbol}`;
  const here = `${showNumber(Number(shown.toPrecision(CONVERTED_DIGITS)), decimalSign)} ${PANEL_UNITS[field.unit].symbol}`;
  const wanted = entered.unit === field.unit ? typed : `${typed} (${here})`;
  const limits = limitWords(field, shown, decimalSign);
  return {
    ...refused('panel cannot show', `${field.label}: the panel cannot show ${wanted}.${limits}${nearestWords(nearest, decimalSign)}`),
    nearest,
  };
}

/** Why a unit has no physical value here, and what to do about it. */
function missingWords(field: PanelField, typedUnit: PanelUnit, { speedMmPerS }: EntryContext): string {
  const isPulseDensity = typedUnit === 'ppi' || field.unit === 'ppi';
  if (isPulseDensity && speedMmPerS === undefined) return `${field.label}: pulses per inch need the scan speed. Set the speed first.`;
  if (typedUnit !== field.unit) {
    return `${field.label} cannot be turned from ${PANEL_UNITS[typedUnit].label} into what this panel shows. Type it in ${PANEL_UNITS[field.unit].label}.`;
  }
  return `${field.label}: the machine’s panel does not say which range ${PANEL_UNITS[field.unit].label} belong to. Complete the field on the machine’s page.`;
}

function limitWords(field: PanelField, shown: number, decimalSign?: DecimalSign): string {
  const { minimum, maximum, label, unit } = field;
  const symbol = PANEL_UNITS[unit].symbol;
  const isBelow = minimum !== undefined && shown < minimum;
  const isAbove = maximum !== undefined && shown > maximum;
  if (!isBelow && !isAbove) return '';
  if (minimum !== undefined && maximum !== undefined) {
    return ` ${label} must be ${showNumber(minimum, decimalSign)} to ${showNumber(maximum, decimalSign)} ${symbol}.`;
  }
  if (minimum !== undefined) return ` ${label} must be at least ${showNumber(minimum, decimalSign)} ${symbol}.`;
  return maximum === undefined ? '' : ` ${label} must be at most ${showNumber(maximum, decimalSign)} ${symbol}.`;
}

function nearestWords(nearest: EnteredValue[], decimalSign?: DecimalSign): string {
  const words = nearest.map(({ value, unit }) => `${showNumber(value, decimalSign)} ${PANEL_UNITS[unit].symbol}`);
  return words.length === 0 ? '' : ` Nearest that it can: ${words.join(' or ')}.`;
}

function percentUnitOf(field: PanelField): PanelUnit {
  return field.unit === 'percentFromMinimum' ? 'percentFromMinimum' : 'percentFromZero';
}

function refused(reason: EntryRefusal['reason'], message: string): EntryRefusal {
  return { kind: 'refused', reason, message };
}
