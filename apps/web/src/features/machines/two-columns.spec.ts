import { readTwoColumns, twoColumnText } from './two-columns';

describe('readTwoColumns', () => {
  it('reads a block as a spreadsheet pastes it, with a head', () => {
    expect(readTwoColumns('percent\twatts\n5\t0.1\n10\t0.9\n\n20\t3.1\n', 'en-GB')).toEqual({
      rows: [
        [5, 0.1],
        [10, 0.9],
        [20, 3.1],
      ],
    });
  });

  it('reads pairs typed with blanks or semicolons, with or without units', () => {
    const rows = [[20, 3.1]];
    expect(readTwoColumns('20 3.1', 'en-GB')).toEqual({ rows });
    expect(readTwoColumns('20 % 3.1 W', 'en-GB')).toEqual({ rows });
    expect(readTwoColumns('20%; 3.1W', 'en-GB')).toEqual({ rows });
    expect(readTwoColumns('20;3,1', 'de-DE')).toEqual({ rows });
  });

  it('names the line that is no pair', () => {
    expect(readTwoColumns('5 0.1\n10', 'en-GB')).toEqual({ message: 'Line 2 has 1 number instead of two.' });
    expect(readTwoColumns('5 0.1\n10 0.9 1.0', 'en-GB')).toEqual({ message: 'Line 2 has 3 numbers instead of two.' });
  });

  it('refuses a number that can be read in two ways', () => {
    expect(readTwoColumns('5\t1,500', 'en-GB')).toEqual({ message: expect.stringMatching(/^Line 1: .*1500.*1\.5/) });
  });

  it('finds nothing in empty text', () => {
    expect(readTwoColumns(' \n', 'en-GB')).toEqual({ rows: [] });
  });
});

describe('twoColumnText', () => {
  it('is read back to the same pairs', () => {
    const rows = [
      [4, 1.125],
      [200, 1],
    ] as const;
    expect(readTwoColumns(twoColumnText(rows, 'de-DE'), 'de-DE')).toEqual({ rows });
  });
});
