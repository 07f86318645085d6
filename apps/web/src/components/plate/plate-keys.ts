import { cellAddress, parseCellAddress } from '@proofplate/imaging';

export type KeyPress = { key: string; isCtrl: boolean };
export type GridSize = { rows: number; columns: number };

/** Address that a key leads to from a cell, or undefined if the key moves nothing. Movement stops at the edges. */
export function addressAfterKey(address: string, { key, isCtrl }: KeyPress, { rows, columns }: GridSize): string | undefined {
  const { row, column } = parseCellAddress(address);
  const lastRow = rows - 1;
  const lastColumn = columns - 1;
  switch (key) {
    case 'ArrowLeft':
      return cellAddress(row, Math.max(0, column - 1));
    case 'ArrowRight':
      return cellAddress(row, Math.min(lastColumn, column + 1));
    case 'ArrowUp':
      return cellAddress(Math.max(0, row - 1), column);
    case 'ArrowDown':
      return cellAddress(Math.min(lastRow, row + 1), column);
    case 'Home':
      return isCtrl ? cellAddress(0, 0) : cellAddress(row, 0);
    case 'End':
      return isCtrl ? cellAddress(lastRow, lastColumn) : cellAddress(row, lastColumn);
    case 'PageUp':
      return cellAddress(0, column);
    case 'PageDown':
      return cellAddress(lastRow, column);
    default:
      return undefined;
  }
}
