import { useCallback } from 'react';
import { useSearchParams } from 'react-router';
import type { Coupon, CouponCell, TestGrid } from '../coupons.api';
import { cellsOf } from './moves';
import { PLATE_VIEWS, type PlateView } from './plate-views';

export type PlateChoice = {
  grid: TestGrid;
  cells: readonly CouponCell[];
  cell: CouponCell;
  view: PlateView;
  chooseCell: (address: string) => void;
  chooseView: (view: PlateView) => void;
  chooseGrid: (number: number) => void;
};

/** Cell, view and grid stand in the address, so that a link leads to the very cell. Undefined: the coupon has no cells. */
export function usePlateChoice(coupon: Coupon): PlateChoice | undefined {
  const [search, setSearch] = useSearchParams();
  const set = useCallback(
    (changes: Readonly<Record<string, string>>) => {
      const change = (before: URLSearchParams) => {
        const next = new URLSearchParams(before);
        for (const [key, value] of Object.entries(changes)) next.set(key, value);
        return next;
      };
      setSearch(change, { replace: true, preventScrollReset: true });
    },
    [setSearch],
  );
  const chooseCell = useCallback((address: string) => set({ cell: address }), [set]);
  const chooseView = useCallback((view: PlateView) => set({ view }), [set]);
  const chooseGrid = useCallback((number: number) => set({ grid: String(number), cell: 'A1' }), [set]);

  const grid = coupon.grids.find(({ number }) => String(number) === search.get('grid')) ?? coupon.grids[0];
  if (grid === undefined) return undefined;
  const cells = cellsOf(grid, coupon.cells);
  const address = search.get('cell')?.toUpperCase();
  const cell = cells.find((own) => own.address === address) ?? cells[0];
  if (cell === undefined) return undefined;
  const view = PLATE_VIEWS.find(({ value }) => value === search.get('view'))?.value ?? 'photo';
  return { grid, cells, cell, view, chooseCell, chooseView, chooseGrid };
}
