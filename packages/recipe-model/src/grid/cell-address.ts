const LETTERS = 26;
const ADDRESS = /^([A-Z]+)([1-9]\d*)$/u;

/** The address burnt beside a cell: letters for the row, numbers for the column, both counted from 0 here ("B4" is row 1, column 3). */
export function cellAddress(row: number, column: number): string {
  if (!isIndex(row) || !isIndex(column)) throw new RangeError(`row and column must be whole numbers from 0, got ${row} and ${column}`);
  return `${rowLetters(row)}${column + 1}`;
}

/** Row and column of an address, counted from 0; undefined if the text is no address. Small letters count as well. */
export function findCell(address: string): { row: number; column: number } | undefined {
  const parts = ADDRESS.exec(address.trim().toUpperCase());
  if (parts === null) return undefined;
  const [, letters = '', digits = ''] = parts;
  const row = [...letters].reduce((sum, letter) => sum * LETTERS + (letter.charCodeAt(0) - 64), 0) - 1;
  const column = Number(digits) - 1;
  return Number.isSafeInteger(row) && Number.isSafeInteger(column) ? { row, column } : undefined;
}

/** A … Z, AA … as on a spreadsheet, turned by 90°. */
export function rowLetters(row: number): string {
  const rest = Math.floor(row / LETTERS);
  const letter = String.fromCharCode(65 + (row % LETTERS));
  return rest === 0 ? letter : `${rowLetters(rest - 1)}${letter}`;
}

function isIndex(value: number): boolean {
  return Number.isSafeInteger(value) && value >= 0;
}
