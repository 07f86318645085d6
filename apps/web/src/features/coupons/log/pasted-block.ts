export type BlockCell = { row: number; column: number; text: string };

/**
 * Cells of a copied spreadsheet block from where it is put down. What hangs over the edge of the grid is counted, not lost silently.
 * Undefined for a single value: the browser pastes that by itself.
 */
export function pastedBlock(
  text: string,
  from: { row: number; column: number },
  size: { rows: number; columns: number },
): { cells: readonly BlockCell[]; outside: number } | undefined {
  const lines = text.replace(/\r\n?/g, '\n').replace(/\n$/, '').split('\n');
  const block = lines.map((line) => line.split('\t'));
  if (block.length === 1 && block[0]?.length === 1) return undefined;
  const all = block.flatMap((line, down) =>
    line.map((value, across) => ({ row: from.row + down, column: from.column + across, text: value.trim() })),
  );
  const cells = all.filter(({ row, column }) => row < size.rows && column < size.columns);
  return { cells, outside: all.filter(({ text: value }) => value !== '').length - cells.filter(({ text: value }) => value !== '').length };
}
