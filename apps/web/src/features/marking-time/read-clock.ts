import { decimalSignOf, type ReadNumber, readNumber } from '../../lib/read-number';

const RULE = { what: 'The time', unit: 's', least: 0.1, most: 604_800 };
const S_PER_MIN = 60;
const CLOCK = /^(?:(\d{1,3}):)?(\d{1,3}):([0-5]\d(?:[.,]\d{1,2})?)$/;
const MINUTES = /^(\d{1,4})\s*min(?:\s*(\d{1,2}(?:[.,]\d{1,2})?)\s*s?)?$/i;

/**
 * Reads a clocked time: seconds ("130", "12,4 s"), minutes and seconds ("2:10", "2 min 10 s") or hours before them ("1:02:10").
 *
 * @returns seconds, or the words that say the way out
 */
export function readClock(text: string, locale: string): ReadNumber {
  const plain = text.trim();
  const clock = CLOCK.exec(plain) ?? MINUTES.exec(plain)?.toSpliced(1, 0, '');
  if (clock === null || clock === undefined) return readNumber(plain, RULE, locale);
  const [, hours = '', minutes = '', seconds = ''] = clock;
  const written = (seconds ?? '').replace(',', '.');
  if (written.includes('.') && (seconds ?? '').includes('.') !== (decimalSignOf(locale) === '.'))
    return { message: 'Write the tenths with the decimal sign of your shop.' };
  const value = (Number(hours || 0) * S_PER_MIN + Number(minutes)) * S_PER_MIN + Number(written || 0);
  return value >= RULE.least && value <= RULE.most
    ? { value }
    : { message: 'The time must be longer than none and no longer than a week.' };
}
