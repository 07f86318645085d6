import type { PanelUnit } from './panel-unit';

/** A typed "%" leaves open whether it counts from zero or from the minimum: the panel decides. */
export type TypedUnit = PanelUnit | '%';

export type DecimalSign = '.' | ',';

export type TypedNumberRefusal = 'empty' | 'not a number' | 'ambiguous' | 'too large' | 'too small' | 'too many digits' | 'unknown unit';

export type TypedNumber =
  | { kind: 'number'; value: number; unit: TypedUnit | null }
  | { kind: 'refused'; reason: TypedNumberRefusal; message: string; readings?: [number, number] };

const SPELLINGS: Readonly<Record<TypedUnit, readonly string[]>> = {
  '%': ['%', 'percent', 'pct'],
  percentFromZero: ['% from zero'],
  percentFromMinimum: ['% from minimum'],
  'mm/s': ['mm/s', 'mm/sec'],
  'm/s': ['m/s', 'm/sec'],
  'in/s': ['in/s', 'inch/s', 'in/sec', 'ips'],
  'm/min': ['m/min'],
  'mm/min': ['mm/min'],
  kHz: ['khz'],
  Hz: ['hz'],
  um: ['µm', 'um', 'micron', 'microns'],
  mm: ['mm'],
  in: ['in', 'inch', 'inches', '"'],
  lpi: ['lpi', 'lines/in', 'lines/inch', 'lines per inch'],
  lpcm: ['lpcm', 'lines/cm', 'lines per cm'],
  ppi: ['ppi', 'pulses/in', 'pulses/inch', 'pulses per inch'],
  W: ['w', 'watt', 'watts'],
  ns: ['ns'],
  us: ['µs', 'us'],
  count: ['×', 'x', 'times'],
  deg: ['°', 'deg', 'degrees'],
};

const UNIT_OF_SPELLING = new Map<string, TypedUnit>(
  // Object.entries widens the keys to string; the record has no other keys than the units.
  (Object.entries(SPELLINGS) as [TypedUnit, readonly string[]][]).flatMap(([unit, words]) => words.map((word) => [word, unit] as const)),
);

const NUMBER_THEN_UNIT = /^([+-]?)(\d[\d.,]*|[.,]\d+)(e[+-]?\d+)?\s*(\D.*)?$/u;
/** One separator and exactly three digits behind it. A grouped number never starts with 0, so "0.025" has one reading only. */
const TWO_READINGS = /^[1-9]\d*[.,]\d{3}$/u;
const ONE_READING = /^(?:\d+(?:[.,]\d+)?|[.,]\d+)$/u;
/** A double tells any two decimals of 15 digits apart; more would be rounded silently. */
const MAX_DIGITS = 15;

/**
 * Reads a number typed with or without its unit; what can be read in two ways is refused with both readings.
 *
 * @param text    what was typed, such as "850", "0.03 mm", "850 lpi", "1,5"
 * @param options decimalSign: the sign of the person's locale; it orders the readings and is used in the messages,
 *                either sign is read where only one meaning is left
 * @returns the number with its unit (null if none was typed), or a refusal with a message in words
 * Valid for decimal numbers without exponent; nothing is thrown.
 * Source: own; docs/science/units.md
 */
export function parseTypedNumber(text: string, { decimalSign }: { decimalSign: DecimalSign }): TypedNumber {
  const plain = plainText(text);
  if (plain === '') return refused('empty', 'Nothing was typed.');
  const parts = NUMBER_THEN_UNIT.exec(plain);
  if (parts === null) return refused('not a number', `“${text.trim()}” is not a number. Write digits, such as 850 or 0${decimalSign}03.`);
  const [, sign = '', digits = '', exponent = '', unitWord = ''] = parts;
  if (TWO_READINGS.test(digits)) return ambiguous(`${sign}${digits}`, exponent, decimalSign);
  if (!ONE_READING.test(digits)) {
    return refused('not a number', `“${text.trim()}” has more than one separator. Write the number without separators between thousands.`);
  }
  const value = Number(`${sign}${digits.replace(',', '.')}${exponent}`);
  const size = sizeRefusal(value, digits);
  if (size !== undefined) return size;
  if (unitWord === '') return { kind: 'number', value, unit: null };
  const unit = UNIT_OF_SPELLING.get(unitWord.trim());
  if (unit === undefined) return refused('unknown unit', unitMessage(unitWord.trim()));
  return { kind: 'number', value, unit };
}

function plainText(text: string): string {
  return text
    .trim()
    .toLowerCase()
    .replace(/[\u2212\u2013]/gu, '-')
    .replace(/\u03bc/gu, 'µ')
    .replace(/\s+/gu, ' ')
    .replace(/^([+-]) /u, '$1');
}

function unitMessage(word: string): string {
  if (/^\d/u.test(word)) return 'There is a gap inside the number. Write it without gaps.';
  return `“${word}” is not a unit that a panel can show here. Write it as in mm/s, kHz, µm, mm, lpi or W, or leave it out.`;
}

function ambiguous(digits: string, exponent: string, decimalSign: DecimalSign): TypedNumber {
  const decimal = Number(`${digits.replace(',', '.')}${exponent}`);
  const grouped = Number(`${digits.replace(/[.,]/u, '')}${exponent}`);
  const size = sizeRefusal(grouped, digits);
  if (size !== undefined) return size;
  const readings: [number, number] = digits.includes(decimalSign) ? [decimal, grouped] : [grouped, decimal];
  const [first, second] = readings.map((reading) => unmistakable(reading, decimalSign));
  return {
    kind: 'refused',
    reason: 'ambiguous',
    message: `“${digits}${exponent}” can be read in two ways. Write ${first} or ${second}, whichever you mean.`,
    readings,
  };
}

/** The reading as it may be typed: three digits behind the sign get a fourth, or they would be refused again. */
function unmistakable(reading: number, decimalSign: DecimalSign): string {
  const written = String(reading);
  return (/\.\d{3}$/u.test(written) ? `${written}0` : written).replace('.', decimalSign);
}

function sizeRefusal(value: number, digits: string): TypedNumber | undefined {
  if (!Number.isFinite(value)) return refused('too large', 'The number is too large to be a setting.');
  const written = digits.replace(/[.,]/u, '').replace(/^0+/u, '');
  if (value === 0 && written !== '') return refused('too small', 'The number is too small to be a setting.');
  if (written.replace(/0+$/u, '').length > MAX_DIGITS) {
    return refused('too many digits', `The number has more than ${MAX_DIGITS} digits; it could not be kept as typed.`);
  }
  return undefined;
}

function refused(reason: TypedNumberRefusal, message: string): TypedNumber {
  return { kind: 'refused', reason, message };
}
