import { raw } from 'bwip-js/node';

/**
 * Modules of a square Data Matrix (ECC 200), true = dark, without quiet zone.
 *
 * @param text printable ASCII
 */
export function dataMatrixModules(text: string): boolean[][] {
  const [symbol] = raw({ bcid: 'datamatrix', text });
  if (symbol === undefined || !('pixs' in symbol)) throw new Error('the Data Matrix could not be made');
  const { pixs, pixx, pixy } = symbol;
  return Array.from({ length: pixy }, (_, row) => Array.from({ length: pixx }, (__, column) => pixs[row * pixx + column] === 1));
}
