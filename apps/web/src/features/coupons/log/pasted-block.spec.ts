import { pastedBlock } from './pasted-block';

const SIZE = { rows: 5, columns: 5 };

describe('a pasted block', () => {
  it('of five by five fills 25 cells', () => {
    const text = Array.from({ length: 5 }, (_, row) => Array.from({ length: 5 }, (__, column) => `${row}${column}`).join('\t')).join(
      '\r\n',
    );
    const block = pastedBlock(`${text}\r\n`, { row: 0, column: 0 }, SIZE);
    expect(block?.cells).toHaveLength(25);
    expect(block?.cells.at(-1)).toEqual({ row: 4, column: 4, text: '44' });
    expect(block?.outside).toBe(0);
  });

  it('counts what hangs over the edge and keeps gaps empty', () => {
    const block = pastedBlock('1\t2\n\t4', { row: 4, column: 3 }, SIZE);
    expect(block).toEqual({
      cells: [
        { row: 4, column: 3, text: '1' },
        { row: 4, column: 4, text: '2' },
      ],
      outside: 1,
    });
  });

  it('of one value is left to the browser', () => {
    expect(pastedBlock('25,7', { row: 0, column: 0 }, SIZE)).toBeUndefined();
    expect(pastedBlock('25,7\n', { row: 0, column: 0 }, SIZE)).toBeUndefined();
  });
});
