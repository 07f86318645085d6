import { cellAddress, parseCellAddress, rowLetter } from './cell-address';

describe('cellAddress', () => {
  it('is undone by parseCellAddress for every cell of the largest plate', () => {
    for (let row = 0; row < 26; row += 1) {
      for (let column = 0; column < 26; column += 1) {
        expect(parseCellAddress(cellAddress(row, column))).toEqual({ row, column });
      }
    }
  });

  it('counts letters down and numbers across', () => {
    expect(cellAddress(1, 3)).toBe('B4');
    expect(rowLetter(25)).toBe('Z');
  });

  it.each([
    [26, 0],
    [-1, 0],
    [0, 26],
    [0.5, 0],
    [0, Number.NaN],
  ])('refuses row %p, column %p', (row, column) => {
    expect(() => cellAddress(row, column)).toThrow(RangeError);
  });
});

describe('parseCellAddress', () => {
  it.each(['', 'b4', 'B', '4B', 'B0', 'B04', 'B27', 'AA1', 'B4 '])('refuses %p', (address) => {
    expect(() => parseCellAddress(address)).toThrow(/address must be/);
  });
});
