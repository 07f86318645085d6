import type { PanelUnit } from '@proofplate/physics';
import fc from 'fast-check';
import type { ParameterSet, SetValue } from '../vocabulary/setting';
import { cellAddress, findCell } from './cell-address';
import { cellsOfGrid } from './cells-of-grid';
import { runOrder } from './run-order';

const value = (number: number, unit: PanelUnit): SetValue => ({ entered: { value: number, unit }, physical: number });
const BASE: ParameterSet = {
  values: { frequencyKhz: value(60, 'kHz'), passes: value(1, 'count'), speedMmPerS: value(100, 'mm/s') },
  fill: 'crossed',
  assist: 'air',
  power: { watts: null, reason: 'No power is set.' },
};
const SPEEDS = [200, 400, 800].map((speed) => value(speed, 'mm/s'));
const POWERS = [20, 40].map((power) => value(power, 'percentFromZero'));

describe('cellAddress', () => {
  it('counts rows by letters and columns by numbers', () => {
    expect(cellAddress(1, 3)).toBe('B4');
    expect(cellAddress(25, 0)).toBe('Z1');
    expect(cellAddress(26, 9)).toBe('AA10');
    expect(() => cellAddress(-1, 0)).toThrow('row and column must be whole numbers from 0, got -1 and 0');
  });

  it('is found again for every cell', () => {
    fc.assert(
      fc.property(fc.nat(2000), fc.nat(2000), (row, column) => {
        expect(findCell(cellAddress(row, column))).toEqual({ row, column });
      }),
    );
    expect(findCell(' b4 ')).toEqual({ row: 1, column: 3 });
    for (const text of ['', '4B', 'B0', 'B', '4', 'B-1', 'B4 C5']) expect(findCell(text)).toBeUndefined();
  });
});

describe('cellsOfGrid', () => {
  const cells = cellsOfGrid(
    { columns: { parameter: 'speedMmPerS', levels: SPEEDS }, rows: { parameter: 'powerPercent', levels: POWERS }, base: BASE },
    (values) => ({ watts: (values.powerPercent?.physical ?? 0) / 5, basis: 'calibration' }),
  );

  it('crosses the factors row by row', () => {
    expect(cells.map((cell) => cell.address)).toEqual(['A1', 'A2', 'A3', 'B1', 'B2', 'B3']);
  });

  it('gives each cell everything that was set, with its own watts', () => {
    expect(cells[4].parameters).toEqual({
      values: { ...BASE.values, speedMmPerS: SPEEDS[1], powerPercent: POWERS[1] },
      fill: 'crossed',
      assist: 'air',
      power: { watts: 8, basis: 'calibration' },
    });
    expect(BASE.values.speedMmPerS).toEqual(value(100, 'mm/s'));
  });

  it('makes a single row without a row factor', () => {
    const row = cellsOfGrid({ columns: { parameter: 'speedMmPerS', levels: SPEEDS }, base: BASE }, () => BASE.power);
    expect(row.map((cell) => cell.address)).toEqual(['A1', 'A2', 'A3']);
  });

  it('refuses the same parameter twice and factors without levels', () => {
    const factor = { parameter: 'speedMmPerS' as const, levels: SPEEDS };
    expect(() => cellsOfGrid({ columns: factor, rows: factor, base: BASE }, () => BASE.power)).toThrow('different parameters');
    expect(() => cellsOfGrid({ columns: { ...factor, levels: [] }, base: BASE }, () => BASE.power)).toThrow('at least one level');
  });
});

describe('runOrder', () => {
  it('holds every cell once and is the same for the same seed', () => {
    fc.assert(
      fc.property(fc.nat(200), fc.integer(), (count, seed) => {
        const order = runOrder(count, seed);
        expect([...order].sort((a, b) => a - b)).toEqual(Array.from({ length: count }, (_, index) => index));
        expect(runOrder(count, seed)).toEqual(order);
      }),
    );
  });

  it('keeps its orders over versions: a coupon planned earlier can still be proved', () => {
    expect(runOrder(6, 42)).toEqual([1, 3, 2, 4, 5, 0]);
  });

  it('puts each cell in each place about equally often', () => {
    const counts = Array.from({ length: 4 }, () => [0, 0, 0, 0]);
    for (let seed = 0; seed < 8000; seed += 1) for (const [place, cell] of runOrder(4, seed).entries()) counts[place][cell] += 1;
    // 2000 expected, standard deviation 39: 200 is more than five of them, and the seeds are fixed.
    for (const count of counts.flat()) expect(Math.abs(count - 2000)).toBeLessThan(200);
  });

  it('refuses counts and seeds that are not whole', () => {
    expect(() => runOrder(-1, 0)).toThrow('count must be a whole number from 0, got -1');
    expect(() => runOrder(3, 0.5)).toThrow('seed must be a whole number, got 0.5');
  });
});
