import { raw } from 'bwip-js/node';

/** Rows of a QR symbol as text, 1 = dark, without quiet zone. */
export function qrModules(text: string): string[] {
  // M: a thumb print or a crease on the sheet leaves it readable
  const [symbol] = raw('qrcode', text, 'eclevel=M');
  if (symbol === undefined || !('pixs' in symbol)) throw new Error('the code of the sheet could not be made');
  const { pixs, pixx, pixy } = symbol;
  return Array.from({ length: pixy }, (_, row) => Array.from({ length: pixx }, (__, column) => pixs[row * pixx + column]).join(''));
}
