import { parseTypedNumber } from '@proofplate/physics';
import { decimalSignOf, typedNumber } from '../../lib/read-number';

export type TwoColumns = { rows: readonly (readonly [number, number])[] } | { message: string };

const FIRST_NUMBER = /\d/;
/** A tab or a semicolon always parts columns; blanks do when nothing stronger is there. */
const PARTERS = [/\t+/, /\s*;\s*/, /\s+/];

/**
 * Two columns of numbers, one pair a line, typed or pasted from a spreadsheet. Lines without a digit, such as a head, are left out;
 * so are units behind the numbers.
 */
export function readTwoColumns(text: string, locale: string): TwoColumns {
  const rows: [number, number][] = [];
  for (const [index, line] of text.split(/\r?\n/).entries()) {
    if (!FIRST_NUMBER.test(line)) continue;
    const cells = cellsOf(line);
    if (cells.length !== 2)
      return { message: `Line ${index + 1} has ${cells.length} ${cells.length === 1 ? 'number' : 'numbers'} instead of two.` };
    const numbers = cells.map((cell) => parseTypedNumber(cell, { decimalSign: decimalSignOf(locale) }));
    const [first, second] = numbers;
    if (first?.kind !== 'number' || second?.kind !== 'number') {
      const refused = numbers.find((read) => read.kind === 'refused');
      return { message: `Line ${index + 1}: ${refused?.message ?? 'this is not a pair of numbers.'}` };
    }
    rows.push([first.value, second.value]);
  }
  return { rows };
}

/** The pair as text, as it is shown again in a field. */
export const twoColumnText = (rows: readonly (readonly [number, number])[], locale: string) =>
  rows.map((row) => row.map((value) => typedNumber(value, locale)).join('   ')).join('\n');

function cellsOf(line: string): string[] {
  // A lone unit is part of the number before it: "20 % 3.1 W" are two cells.
  const plain = line.trim().replace(/(\d)\s+(?=%|[wW]\b|ns\b|mJ\b)/g, '$1');
  const parter = PARTERS.find((candidate) => candidate.test(plain)) ?? /\s+/;
  return plain
    .split(parter)
    .map((cell) => cell.replace(/(?:%|w|watts?|ns|mj)$/i, '').trim())
    .filter((cell) => cell !== '');
}
