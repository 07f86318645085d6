import { chakra } from '@chakra-ui/react';
import { rowLetters } from '@proofplate/recipe-model';
import type { ClipboardEvent, KeyboardEvent } from 'react';
import type { CouponCell, TestGrid } from '../../coupons.api';
import { pastedBlock } from '../pasted-block';

export type MeasureGridProps = {
  grid: TestGrid;
  cells: readonly CouponCell[];
  /** What stands in each cell, by id. */
  typed: ReadonlyMap<string, string>;
  problems: ReadonlyMap<string, string>;
  /** Value that counts so far, shown pale in an empty cell. */
  earlier: ReadonlyMap<string, string>;
  unit: string;
  onType: (cellId: string, text: string) => void;
  onPaste: (texts: ReadonlyMap<string, string>, outside: number) => void;
};

const Input = chakra('input', {
  base: {
    width: 'full',
    minW: '56px',
    minHeight: { base: 'touch', lg: 'row' },
    px: '2',
    textAlign: 'right',
    bg: 'bg.panel',
    color: 'fg',
    border: 'hairline',
    borderColor: 'border.emphasized',
    borderRadius: 'sm',
    _invalid: { borderColor: 'oxide.solid', boxShadow: 'inset 0 0 0 1px var(--pp-colors-oxide-solid)' },
    _disabled: { bg: 'bg.muted', cursor: 'not-allowed' },
    _placeholder: { color: 'fg.subtle', opacity: 1, fontStyle: 'italic' },
  },
});

/** One field for each cell, in the places of the plate; a block from a spreadsheet goes in where it is put down. */
export function MeasureGrid({ grid, cells, typed, problems, earlier, unit, onType, onPaste }: MeasureGridProps) {
  const at = (row: number, column: number) => cells.find((cell) => cell.rowIndex === row && cell.columnIndex === column);
  const handlePaste = (cell: CouponCell) => (event: ClipboardEvent) => {
    const from = { row: cell.rowIndex, column: cell.columnIndex };
    const block = pastedBlock(event.clipboardData.getData('text'), from, grid);
    if (block === undefined) return;
    event.preventDefault();
    const texts = block.cells.flatMap(({ row, column, text }): [string, string][] => {
      const target = at(row, column);
      return target === undefined || target.markState === 'skipped' ? [] : [[target.id, text]];
    });
    onPaste(new Map(texts), block.outside);
  };
  const handleKey = (cell: CouponCell) => (event: KeyboardEvent<HTMLInputElement>) => {
    const step = MOVES[event.key];
    if (step === undefined) return;
    const next = at(cell.rowIndex + step.row, cell.columnIndex + step.column);
    if (next === undefined) return;
    event.preventDefault();
    event.currentTarget
      .closest('table')
      ?.querySelector<HTMLInputElement>(`[data-cell="${CSS.escape(next.address)}"]`)
      ?.focus();
  };
  return (
    <chakra.div overflowX="auto" tabIndex={-1}>
      <chakra.table borderCollapse="separate" borderSpacing="4px" fontSize="sm">
        <thead>
          <tr>
            <td />
            {Array.from({ length: grid.columns }, (_, column) => (
              <chakra.th key={`column ${column + 1}`} scope="col" fontWeight="semibold">
                {column + 1}
              </chakra.th>
            ))}
          </tr>
        </thead>
        <tbody>
          {Array.from({ length: grid.rows }, (_, row) => (
            <tr key={rowLetters(row)}>
              <chakra.th scope="row" px="1" fontWeight="semibold">
                {rowLetters(row)}
              </chakra.th>
              {Array.from({ length: grid.columns }, (__, column) => {
                const cell = at(row, column);
                if (cell === undefined) return <td key={`empty ${column}`} />;
                const problem = problems.get(cell.id);
                return (
                  <td key={cell.id}>
                    <Input
                      data-cell={cell.address}
                      inputMode="decimal"
                      autoComplete="off"
                      aria-label={`${cell.address}${unit === '' ? '' : `, ${unit}`}${problem === undefined ? '' : `: ${problem}`}`}
                      title={problem}
                      aria-invalid={problem !== undefined}
                      disabled={cell.markState === 'skipped'}
                      placeholder={earlier.get(cell.id) ?? ''}
                      value={typed.get(cell.id) ?? ''}
                      onChange={({ target }) => onType(cell.id, target.value)}
                      onPaste={handlePaste(cell)}
                      onKeyDown={handleKey(cell)}
                    />
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </chakra.table>
    </chakra.div>
  );
}

const MOVES: Readonly<Record<string, { row: number; column: number }>> = {
  Enter: { row: 1, column: 0 },
  ArrowDown: { row: 1, column: 0 },
  ArrowUp: { row: -1, column: 0 },
};
