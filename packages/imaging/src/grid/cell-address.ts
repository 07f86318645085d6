/** Rows are lettered A to Z, so a plate has at most 26 of them. */
export const MAX_ROWS = 26;
export const MAX_COLUMNS = 26;

const ADDRESS = /^([A-Z])([1-9]\d?)$/;
const CODE_OF_A = 65;

/**
 * Letter of a row.                                              0 -> A, 25 -> Z
 *
 * @param row row counted from 0 at the top, whole, 0 to 25
 * @returns one capital letter
 * @throws RangeError naming the value, if out of range
 * Source: ANSI SLAS 4-2004, well positions
 */
export function rowLetter(row: number): string {
  requireIndex('row', row, MAX_ROWS);
  return String.fromCharCode(CODE_OF_A + row);
}

/**
 * Address of a cell: row letter and column number.              (1, 3) -> B4
 *
 * @param row    row counted from 0 at the top, whole, 0 to 25
 * @param column column counted from 0 at the left, whole, 0 to 25
 * @returns the address
 * @throws RangeError naming the argument and its value, if out of range
 * Source: ANSI SLAS 4-2004, well positions
 */
export function cellAddress(row: number, column: number): string {
  requireIndex('column', column, MAX_COLUMNS);
  return `${rowLetter(row)}${column + 1}`;
}

/**
 * Row and column of an address; the inverse of cellAddress.     B4 -> (1, 3)
 *
 * @param address capital letter A to Z and a number 1 to 26 without leading zero
 * @returns row and column counted from 0
 * @throws RangeError naming the address, if it is none
 * Source: ANSI SLAS 4-2004, well positions
 */
export function parseCellAddress(address: string): { row: number; column: number } {
  const match = ADDRESS.exec(address);
  const column = Number(match?.[2]) - 1;
  if (match === null || column >= MAX_COLUMNS) {
    throw new RangeError(`address must be a letter A to Z and a number 1 to ${MAX_COLUMNS}, got ${JSON.stringify(address)}`);
  }
  return { row: address.charCodeAt(0) - CODE_OF_A, column };
}

function requireIndex(name: string, value: number, count: number): void {
  if (!Number.isInteger(value) || value < 0 || value >= count) {
    throw new RangeError(`${name} must be a whole number from 0 to ${count - 1}, got ${value}`);
  }
}
