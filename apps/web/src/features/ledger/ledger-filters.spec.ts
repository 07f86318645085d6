import { addressWith, filtersFromAddress, readCode, withoutFilters } from './ledger-filters';

describe('the filters of the ledger in the address', () => {
  it('are read back as they were set, and leave nothing when they are taken away', () => {
    const start = new URLSearchParams('theme=dark');
    const filtered = addressWith(addressWith(start, 'subjectCode', 'R-0031'), 'fromDay', '2026-05-14');
    expect(filtersFromAddress(filtered)).toEqual({ subjectCode: 'R-0031', fromDay: '2026-05-14' });
    expect(withoutFilters(filtered).toString()).toBe('theme=dark');
  });
});

describe('readCode()', () => {
  it.each([
    [' r-0031', 'R-0031'],
    ['c-0117 b4', 'C-0117 B4'],
  ])('reads %j as %j', (typed, code) => expect(readCode(typed)).toBe(code));

  it.each(['', 'R', '0031', '%', 'R-0031; drop'])('reads no code in %j', (typed) => expect(readCode(typed)).toBeUndefined());
});
