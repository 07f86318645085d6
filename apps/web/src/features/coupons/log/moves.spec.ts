import type { CouponCell } from '../coupons.api';
import { neighbour, storedMove, storeMove, walk } from './moves';

const cell = (address: string, runOrder: number, markState: CouponCell['markState'] = 'marked') => ({
  ...{ id: address, gridId: 'g', address, rowIndex: 'AB'.indexOf(address.charAt(0)), columnIndex: Number(address.charAt(1)) - 1, runOrder },
  parameters: { values: {}, fill: 'both directions' as const, assist: 'none' as const, power: { watts: 1 } },
  ...{ actualParameters: null, markState, markNote: '', markedAt: null, dose: { value: null, missingBecause: null }, version: 1 },
});
const CELLS = [cell('A1', 3), cell('A2', 4, 'skipped'), cell('B1', 2), cell('B2', 1)];
const addresses = (cells: readonly { address: string }[]) => cells.map(({ address }) => address);

describe('the way over the cells', () => {
  it('follows the run order or the rows, and leaves out what was skipped', () => {
    expect(addresses(walk(CELLS, 'run'))).toEqual(['B2', 'B1', 'A1']);
    expect(addresses(walk(CELLS, 'right'))).toEqual(['A1', 'B1', 'B2']);
  });

  it('meets every cell once, wherever it begins, in both directions', () => {
    const order = walk(CELLS, 'run');
    for (const step of [1, -1] as const) {
      let here: CouponCell = CELLS[2] ?? CELLS[0] ?? cell('A1', 1);
      const met = order.map(() => {
        here = neighbour(order, here, step);
        return here.address;
      });
      expect([...met].sort()).toEqual(['A1', 'B1', 'B2']);
      expect(here.address).toBe('B1');
    }
  });

  it('leads from a skipped cell to the first of the way', () => {
    const skipped = CELLS.find(({ address }) => address === 'A2') ?? cell('A2', 4);
    expect(neighbour(walk(CELLS, 'run'), skipped, 1).address).toBe('B2');
  });

  it('is remembered on this device', () => {
    expect(storedMove()).toBe('run');
    storeMove('stay');
    expect(storedMove()).toBe('stay');
    localStorage.clear();
  });
});
