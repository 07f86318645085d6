import type { Panel } from '@proofplate/recipe-model';
import { headingOf } from './coupon-import-headings';
import { readTable } from './coupon-import-table';
import { rowsOfText } from './coupon-import-text';

const panel: Panel = {
  fields: [
    { parameter: 'powerPercent', label: 'PWR', unit: 'percentFromZero', maximum: 100, step: 1 },
    { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', maximum: 2000 },
    { parameter: 'lineSpacingUm', label: 'Line gap', unit: 'mm' },
  ],
};
const read = (text: string, decimalSign: '.' | ',' = '.') => readTable(text, { panel, decimalSign });

describe('rowsOfText()', () => {
  it.each([
    ['tabs', 'a\tb\n1,5\t2'],
    ['semicolons', 'a;b\n1,5;2'],
  ])('keeps a decimal comma between %s', (_name, text) => {
    expect(rowsOfText(text)).toEqual([
      { line: 1, cells: ['a', 'b'] },
      { line: 2, cells: ['1,5', '2'] },
    ]);
  });

  it('reads quoted fields with the delimiter, quotes and line ends inside, and counts lines as pasted', () => {
    expect(rowsOfText('\uFEFFa,b\r\n"x, ""y""\nz",1\r\n\r\n2,3')).toEqual([
      { line: 1, cells: ['a', 'b'] },
      { line: 2, cells: ['x, "y"\nz', '1'] },
      { line: 5, cells: ['2', '3'] },
    ]);
  });
});

describe('headingOf()', () => {
  it.each([
    ['Speed (mm/s)', { kind: 'value', parameter: 'speedMmPerS', unit: 'mm/s' }],
    ['hatch, mm', { kind: 'value', parameter: 'lineSpacingUm', unit: 'mm' }],
    ['pwr', { kind: 'value', parameter: 'powerPercent', unit: null }],
    ['Cell', { kind: 'address' }],
    ['Remark', { kind: 'note' }],
    ['Customer', { kind: 'ignored', text: 'Customer' }],
  ])('understands %s', (text, heading) => {
    expect(headingOf(text, panel)).toEqual(heading);
  });
});

describe('readTable()', () => {
  it('reads values with the unit of the cell, else of the heading, else of the panel', () => {
    const { cells, refusedRows } = read('cell\tspeed (m/s)\tPWR\tline gap\nB2\t0.8\t40\t30 um\nA1\t900 mm/s\t35 %\t0.025');
    expect(refusedRows).toEqual([]);
    expect(cells.map(({ row, column, values }) => [row, column, values.speedMmPerS?.physical, values.lineSpacingUm?.physical])).toEqual([
      [1, 1, 800, 30],
      [0, 0, 900, 25],
    ]);
    expect(cells[1]?.values.powerPercent?.entered).toEqual({ value: 35, unit: 'percentFromZero' });
  });

  it('lays rows without an address out ten across, and leaves what is blank unknown', () => {
    const { cells } = read(`speed;PWR\n${Array.from({ length: 11 }, (_, index) => `${100 + index};`).join('\n')}`);
    expect(cells.at(-1)).toEqual({ row: 1, column: 0, values: { speedMmPerS: expect.anything() }, note: '' });
  });

  it('takes values beyond today’s limits: the plate may have been burnt under others', () => {
    expect(read('speed\n5000').cells[0]?.values.speedMmPerS?.physical).toBe(5000);
  });

  it('names every row that it refuses, with the line and the way out, and keeps the others', () => {
    const text = [
      'cell,speed,pwr',
      'A1,800,40',
      'A1,700,40',
      'ZZ1x,1,1',
      'A2,"1,500",40',
      'A3,fast,40',
      'A4,,',
      'A5,1,2,3',
      'AA1,5,5',
    ].join('\n');
    const { cells, refusedRows } = read(text);
    expect(cells.map(({ row, column }) => [row, column])).toEqual([[0, 0]]);
    expect(refusedRows.map(({ line }) => line)).toEqual([3, 4, 5, 6, 7, 8, 9]);
    const reasons = refusedRows.map(({ reason }) => reason);
    expect(reasons[0]).toBe('A1 is there already. Each cell stands in one row.');
    expect(reasons[1]).toContain('is no cell');
    expect(reasons[2]).toMatch(/1500.*1\.5|1\.5.*1500/u);
    expect(reasons[4]).toBe('It holds no value of a setting.');
    expect(reasons[5]).toBe('It has 4 fields, the headings only 3.');
    expect(reasons[6]).toContain('off the plate');
  });

  it('reads a decimal comma where the table has one', () => {
    expect(read('line gap\n0,03', ',').cells[0]?.values.lineSpacingUm?.physical).toBe(30);
  });

  it('names headings that say nothing here', () => {
    expect(read('customer\tspeed\nx\t5').ignoredHeadings).toEqual(['customer']);
  });
});
