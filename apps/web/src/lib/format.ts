import { type DecimalSign, showNumber } from '@proofplate/recipe-model';

// Numbers and times as the shop reads them. A number keeps its unit behind a thin space, a true minus, × and µ.

/** The typeface's space is a fifth of an em: a thin space that does not break. */
const THIN_SPACE = '\u00A0';
const MINUS = '\u2212';
const MICRO = '\u00B5';

/** How the shop that is open writes numbers and lengths. Nobody signed in: a point and millimetres. */
export type ShopStyle = { locale: string; unitSystem: 'metric' | 'inch' };

const NO_SHOP: ShopStyle = { locale: 'en', unitSystem: 'metric' };
let shopStyle = NO_SHOP;

/** The session says which shop is open, so that no page has to hand its style on. */
export function setShopStyle(style: ShopStyle | undefined): void {
  shopStyle = style ?? NO_SHOP;
}

export type NumberFormatOptions = {
  /** Another way of writing than that of the shop that is open. */
  locale?: string | undefined;
  /** Fixed number of decimals. */
  decimals?: number | undefined;
  significantDigits?: number | undefined;
  /** Shows + before a positive number, as for offsets and differences. */
  isSigned?: boolean | undefined;
};

/** "0.030", "−17", "+0.5". */
export function formatNumber(
  value: number,
  { locale = shopStyle.locale, decimals, significantDigits, isSigned = false }: NumberFormatOptions = {},
): string {
  const text = formatterOf({ locale, decimals, significantDigits, isSigned }).format(value);
  return text.replace('-', MINUS);
}

/** Making a formatter costs more than using it a hundred times, and a form formats dozens of numbers at every key. */
const FORMATTERS = new Map<string, Intl.NumberFormat>();

function formatterOf({ locale, decimals, significantDigits, isSigned }: NumberFormatOptions): Intl.NumberFormat {
  const key = [locale, decimals ?? '', significantDigits ?? '', isSigned].join(' ');
  const known = FORMATTERS.get(key);
  if (known !== undefined) return known;
  const made = new Intl.NumberFormat(locale, {
    useGrouping: false,
    signDisplay: isSigned === true ? 'exceptZero' : 'negative',
    ...(decimals === undefined ? {} : { minimumFractionDigits: decimals, maximumFractionDigits: decimals }),
    ...(significantDigits === undefined
      ? {}
      : { minimumSignificantDigits: significantDigits, maximumSignificantDigits: significantDigits }),
    ...(decimals === undefined && significantDigits === undefined ? { maximumFractionDigits: 6 } : {}),
  });
  FORMATTERS.set(key, made);
  return made;
}

/** "900 mm/s" with a thin space that does not break; without a unit the number alone. */
export function formatQuantity(value: number, unit: string, options?: NumberFormatOptions): string {
  const number = formatNumber(value, options);
  return unit === '' ? number : `${number}${THIN_SPACE}${formatUnit(unit)}`;
}

/** Unit as printed: "um" becomes "µm", "J/cm^2" becomes "J/cm²". */
export function formatUnit(unit: string): string {
  return unit
    .replace(/\bu(?=(?:m|s|J|W)\b)/g, MICRO)
    .replace(/\^2/g, '²')
    .replace(/\^3/g, '³');
}

/** A number as somebody entered it, with all of its digits. */
export function formatEntered(value: number): string {
  return showNumber(value, shopDecimalSign());
}

/** How the shop that is open writes. */
export const shopLocale = (): string => shopStyle.locale;

/** Decimal sign of the shop that is open, for sentences that packages write. */
export function shopDecimalSign(): DecimalSign {
  return decimalSignOf(shopStyle.locale);
}

/** Decimal sign of a way of writing numbers. */
export function decimalSignOf(locale: string): DecimalSign {
  const known = DECIMAL_SIGNS.get(locale);
  if (known !== undefined) return known;
  const isComma = new Intl.NumberFormat(locale).formatToParts(0.5).some(({ type, value }) => type === 'decimal' && value === ',');
  DECIMAL_SIGNS.set(locale, isComma ? ',' : '.');
  return isComma ? ',' : '.';
}

/** Asked for at every key in every field; a locale does not change its sign. */
const DECIMAL_SIGNS = new Map<string, DecimalSign>();

/** A number of a sentence; what belongs to a name or an address, such as F163.5 or 1.2.3, is none. */
const POINT_NUMBER = /(?<![\p{L}\p{N}.,-])(\d+)\.(\d+)(?![\p{L}\p{N}]|\.\d)/gu;

/** A sentence that was computed with points, in the shop's way of writing. Not for words that people typed. */
export function inShopNumbers(sentence: string): string {
  return sentence.replace(POINT_NUMBER, `$1${shopDecimalSign()}$2`);
}

export const MM_PER_INCH = 25.4;
const SHOWN_LENGTH_DIGITS = 6;

/** What lengths outside of a machine's panel are read in: those of lenses, materials and coupons. */
export function shopLengthUnit(): 'mm' | 'in' {
  return shopStyle.unitSystem === 'inch' ? 'in' : 'mm';
}

/** A length in the shop's unit; every digit of millimetres, which somebody entered, and inches without the noise of the division. */
export const inShopLength = (mm: number): number =>
  shopLengthUnit() === 'in' ? Number((mm / MM_PER_INCH).toPrecision(SHOWN_LENGTH_DIGITS)) : mm;

/** "1.5 mm", or "0.0590551 in" in a shop that works in inches. */
export function formatLength(mm: number): string {
  return formatQuantity(inShopLength(mm), shopLengthUnit());
}

/** "81 × 72 mm", or the same in inches. */
export function formatLengths(widthMm: number, heightMm: number): string {
  return formatSize(inShopLength(widthMm), inShopLength(heightMm), shopLengthUnit());
}

/** "81 × 72 mm". */
export function formatSize(width: number, height: number, unit: string, options?: NumberFormatOptions): string {
  return `${formatNumber(width, options)} × ${formatQuantity(height, unit, options)}`;
}

/** "−26 %". */
export function formatPercentChange(fraction: number, options?: NumberFormatOptions): string {
  return formatQuantity(fraction * 100, '%', { decimals: 0, isSigned: true, ...options });
}

/** "14 May 2026" in the shop's zone. */
export function formatDate(time: string | Date, timeZone: string): string {
  const { day, month, year } = parts(time, { timeZone, day: 'numeric', month: 'short', year: 'numeric' });
  return `${day} ${month} ${year}`;
}

/** "14 May 2026" of a calendar day such as "2026-05-14", which belongs to no zone. */
export function formatDay(day: string): string {
  return formatDate(`${day}T00:00:00Z`, 'UTC');
}

/** "14 May 2026 10:12 CET": a time that somebody signed or measured at always carries its zone. */
export function formatTime(time: string | Date, timeZone: string): string {
  const { hour, minute, timeZoneName } = parts(time, {
    timeZone,
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
    timeZoneName: 'short',
  });
  return `${formatDate(time, timeZone)} ${hour}:${minute} ${timeZoneName}`;
}

/** "09:24", for today's entries beside a date or a zone. */
export function formatClock(time: string | Date, timeZone: string): string {
  const { hour, minute } = parts(time, { timeZone, hour: '2-digit', minute: '2-digit', hourCycle: 'h23' });
  return `${hour}:${minute}`;
}

/** "12 min 13 s", "1 h 5 min". */
export function formatDuration(seconds: number): string {
  const whole = Math.round(seconds);
  const pieces: [number, string][] = [
    [Math.floor(whole / 3600), 'h'],
    [Math.floor((whole % 3600) / 60), 'min'],
    [whole % 60, 's'],
  ];
  const shown = pieces.filter(([amount]) => amount > 0).slice(0, 2);
  return (shown.length === 0 ? [[0, 's'] as const] : shown).map(([amount, unit]) => `${amount}${THIN_SPACE}${unit}`).join(' ');
}

/** "1 recipe", "57 recipes". */
export function formatCount(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}

function parts(time: string | Date, options: Intl.DateTimeFormatOptions): Record<string, string> {
  // British English gives zone abbreviations of Europe and the order day, month, year.
  const formatted = new Intl.DateTimeFormat('en-GB', options).formatToParts(new Date(time));
  return Object.fromEntries(formatted.map(({ type, value }) => [type, type === 'month' ? value.replace('Sept', 'Sep') : value]));
}

/** With its full stop, where there is none yet. */
export const asSentence = (words: string): string => (/[.!?]$/.test(words) ? words : `${words}.`);
