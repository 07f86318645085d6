import type { CouponCell, TestGrid } from '../coupons.api';

/** Where the choice goes after a rating. */
export type MoveAfterRating = 'run' | 'right' | 'stay';

export const MOVES_AFTER_RATING: readonly { value: MoveAfterRating; label: string }[] = [
  { value: 'run', label: 'next in run order' },
  { value: 'right', label: 'next to the right' },
  { value: 'stay', label: 'stay on the cell' },
];

const STORAGE_KEY = 'proofplate.move-after-rating';

/** Cells of a grid in the order of a walk: as they were marked, or row by row. Skipped cells hold nothing to rate. */
export function walk(cells: readonly CouponCell[], move: MoveAfterRating): readonly CouponCell[] {
  const marked = cells.filter(({ markState }) => markState !== 'skipped');
  if (move === 'run') return [...marked].sort((one, other) => one.runOrder - other.runOrder);
  return [...marked].sort((one, other) => one.rowIndex - other.rowIndex || one.columnIndex - other.columnIndex);
}

/** The cell `step` places on from one; a walk goes round, so that a pass may begin anywhere and still meets every cell. */
export function neighbour(order: readonly CouponCell[], cell: CouponCell, step: 1 | -1): CouponCell {
  const place = order.findIndex(({ id }) => id === cell.id);
  const next = place === -1 ? 0 : (place + step + order.length) % order.length;
  return order[next] ?? cell;
}

export function cellsOf(grid: TestGrid, cells: readonly CouponCell[]): readonly CouponCell[] {
  return cells.filter(({ gridId }) => gridId === grid.id);
}

export function storedMove(): MoveAfterRating {
  try {
    const stored = localStorage.getItem(STORAGE_KEY);
    return MOVES_AFTER_RATING.find(({ value }) => value === stored)?.value ?? 'run';
  } catch {
    return 'run';
  }
}

export function storeMove(move: MoveAfterRating): void {
  try {
    localStorage.setItem(STORAGE_KEY, move);
  } catch {
    // Without storage the choice holds until the page is closed.
  }
}
