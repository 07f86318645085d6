import { isPanelUnit, type PanelUnit, parseTypedNumber, physicalValue } from '@proofplate/physics';
import { decimalSignOf, formatNumber, formatUnit } from './format';

export { decimalSignOf };

export type NumberRule = {
  /** Subject of the message: "The wavelength". */
  what: string;
  /** Unit that the value is kept in, as printed; empty for a pure number. */
  unit: string;
  least: number;
  most: number;
  isWhole?: boolean;
};
export type ReadNumber = { value: number } | { message: string };

/**
 * Reads a number typed with or without its unit into the field's own unit. What can be read in two ways, lies outside the limits or
 * carries a unit of another kind is refused with a message that says the way out.
 */
export function readNumber(text: string, rule: NumberRule, locale: string): ReadNumber {
  const plain = withoutOwnUnit(text, rule.unit);
  if (plain === '') return { message: `Enter ${lowerFirst(rule.what)}.` };
  const read = parseTypedNumber(plain, { decimalSign: decimalSignOf(locale) });
  if (read.kind === 'refused') return { message: read.reason === 'unknown unit' ? unitMessage(rule) : read.message };
  const value = read.unit === null ? read.value : converted(read.value, read.unit, rule.unit);
  if (value === undefined) return { message: unitMessage(rule) };
  const isWithin = value >= rule.least && value <= rule.most && (rule.isWhole !== true || Number.isInteger(value));
  return isWithin ? { value } : { message: limitMessage(rule, locale) };
}

/** As readNumber, for a field that may stay empty. */
export function readOptionalNumber(text: string, rule: NumberRule, locale: string): ReadNumber | { value: undefined } {
  return text.trim() === '' ? { value: undefined } : readNumber(text, rule, locale);
}

/** For the `validate` of react-hook-form: true, or the words at the field. */
export function messageOf(read: { value: unknown } | { message: string }): string | true {
  return 'message' in read ? read.message : true;
}

/** Exactly three digits behind the sign can be a group of thousands too; one more zero leaves one reading. */
const TWO_READINGS = /^-?[1-9]\d*[.,]\d{3}$/;

/** A stored number as it is put into a field: every digit, the shop's decimal sign, no grouping, and read back as itself. */
export function typedNumber(value: number | null | undefined, locale: string): string {
  if (value === null || value === undefined) return '';
  const text = String(value).replace('.', decimalSignOf(locale));
  return TWO_READINGS.test(text) ? `${text}0` : text;
}

function withoutOwnUnit(text: string, unit: string): string {
  const plain = text.trim();
  const isOwn = unit !== '' && plain.toLowerCase().endsWith(unit.toLowerCase());
  return isOwn ? plain.slice(0, plain.length - unit.length).trim() : plain;
}

/** Undefined where the typed unit does not measure what the field keeps. */
function converted(value: number, typed: string, own: string): number | undefined {
  const storedUnit = own.replace('µ', 'u');
  if (typed === storedUnit) return value;
  if (!isPanelUnit(typed) || !isPanelUnit(storedUnit)) return undefined;
  try {
    return physicalValue(value, { panelUnit: typed satisfies PanelUnit, storedUnit });
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}

function unitMessage({ what, unit }: NumberRule): string {
  return unit === '' ? `${what} has no unit. Enter the number alone.` : `${what} is kept in ${formatUnit(unit)}. Enter it in that unit.`;
}

function limitMessage({ what, unit, least, most, isWhole }: NumberRule, locale: string): string {
  const kind = isWhole === true ? 'a whole number from ' : '';
  return `${what} must be ${kind}${formatNumber(least, { locale })} to ${formatNumber(most, { locale })}${unit === '' ? '' : ` ${formatUnit(unit)}`}.`;
}

const lowerFirst = (words: string) => (/^[A-Z][a-z]/.test(words) ? words.charAt(0).toLowerCase() + words.slice(1) : words);
