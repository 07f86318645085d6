import { isPanelUnit, type PanelUnit, parseTypedNumber, physicalValue } from '@proofplate/physics';
import { decimalSignOf, formatNumber, formatQuantity, formatUnit, inShopLength, MM_PER_INCH, shopLengthUnit } from './format';

export { decimalSignOf };

export type NumberRule = {
  /** Subject of the message: "The wavelength". */
  what: string;
  /** Unit that the value is kept in, as printed; empty for a pure number. */
  unit: string;
  least: number;
  most: number;
  isWhole?: boolean;
  /** A length in mm that is typed, read and limited in the shop's unit of length. */
  isShopLength?: boolean;
};
export type ReadNumber = { value: number } | { message: string };

/**
 * Reads a number typed with or without its unit into the field's own unit. What can be read in two ways, lies outside the limits or
 * carries a unit of another kind is refused with a message that says the way out.
 */
export function readNumber(text: string, rule: NumberRule, locale: string): ReadNumber {
  const own = shownUnit(rule);
  // a multiple first: “20 kW” ends with the unit of its field too
  const multiple = multipleOf(text.trim(), rule.unit);
  const plain = multiple ?? { text: withoutOwnUnit(text, own) };
  if (plain.text === '') return { message: `Enter ${lowerFirst(rule.what)}.` };
  const read = parseTypedNumber(plain.text, { decimalSign: decimalSignOf(locale) });
  if (read.kind === 'refused') return { message: read.reason === 'unknown unit' ? unitMessage(rule) : read.message };
  const unit = read.unit ?? (multiple === undefined ? own : rule.unit);
  const typed = unit === rule.unit ? read.value * (multiple?.factor ?? 1) : converted(read.value, unit, rule.unit);
  if (typed === undefined) return { message: unitMessage(rule) };
  const value = withoutNoise(typed, rule);
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

/** The unit that stands in the field. */
export const shownUnit = ({ unit, isShopLength }: NumberRule): string => (isShopLength === true ? shopLengthUnit() : unit);

/** Multiples that people type and that no panel shows. */
const MULTIPLES: Readonly<Record<string, Readonly<Record<string, number>>>> = {
  W: { kW: 1000, mW: 0.001 },
  mm: { cm: 10, m: 1000 },
  nm: { µm: 1000, um: 1000 },
  mJ: { J: 1000, µJ: 0.001, uJ: 0.001 },
};

function multipleOf(text: string, unit: string): { text: string; factor: number } | undefined {
  const [, number = '', typed = ''] = /^(.*\d)\s*(\p{L}+)$/u.exec(text) ?? [];
  const factor = MULTIPLES[unit]?.[typed.replace('\u03BC', '\u00B5')];
  return factor === undefined ? undefined : { text: number, factor };
}

/** What a number with another unit is in the field's own: "= 162.56 mm". Nothing where the field's own unit was typed, or no number. */
export function conversionWords(text: string, rule: NumberRule, locale: string): string | undefined {
  const read = readNumber(text, rule, locale);
  const own = shownUnit(rule);
  if ('message' in read || !/\p{L}/u.test(withoutOwnUnit(text, own).replace(/e[+-]?\d+$/i, ''))) return undefined;
  const shown = rule.isShopLength === true ? inShopLength(read.value) : Number(read.value.toPrecision(CONVERTED_DIGITS));
  return `= ${formatQuantity(shown, own, { locale })}`;
}

const CONVERTED_DIGITS = 6;
/** Fewer than a double has, more than anybody types: what was typed in another unit comes back as it was typed. */
const LENGTH_DIGITS = 11;

const withoutNoise = (value: number, { isShopLength }: NumberRule): number =>
  isShopLength === true ? Number(value.toPrecision(LENGTH_DIGITS)) : value;

/** A stored length as it is put into a field of the shop's unit of length. */
export function typedLength(mm: number | null | undefined, locale: string): string {
  if (mm === null || mm === undefined || shopLengthUnit() === 'mm') return typedNumber(mm, locale);
  return typedNumber(Number((mm / MM_PER_INCH).toPrecision(LENGTH_DIGITS + 1)), locale);
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

function unitMessage(rule: NumberRule): string {
  const { what } = rule;
  const unit = shownUnit(rule);
  return unit === '' ? `${what} has no unit. Enter the number alone.` : `${what} is kept in ${formatUnit(unit)}. Enter it in that unit.`;
}

function limitMessage(rule: NumberRule, locale: string): string {
  const { what, isWhole } = rule;
  const unit = shownUnit(rule);
  const [least, most] = rule.isShopLength === true ? [inShopLength(rule.least), inShopLength(rule.most)] : [rule.least, rule.most];
  const kind = isWhole === true ? 'a whole number from ' : '';
  return `${what} must be ${kind}${formatNumber(least, { locale })} to ${formatNumber(most, { locale })}${unit === '' ? '' : ` ${formatUnit(unit)}`}.`;
}

const lowerFirst = (words: string) => (/^[A-Z][a-z]/.test(words) ? words.charAt(0).toLowerCase() + words.slice(1) : words);
