import { InvalidError } from '../errors/domain-error';
import { decodeCursor, encodeCursor, pageOf } from './page';

describe('pageOf()', () => {
  const as = { item: (row: number) => row * 10, cursor: (row: number) => [row] };

  it('cuts the extra row off and points behind the last item kept', () => {
    const page = pageOf([1, 2, 3], 2, as);
    expect(page.items).toEqual([10, 20]);
    expect(decodeCursor(page.nextCursor ?? '', ['number'])).toEqual([2]);
  });

  it('ends when no row is left over', () => {
    expect(pageOf([1, 2], 2, as)).toEqual({ items: [10, 20], nextCursor: null });
    expect(pageOf([], 2, as)).toEqual({ items: [], nextCursor: null });
  });
});

describe('decodeCursor()', () => {
  it('gives back what was encoded', () => {
    expect(decodeCursor(encodeCursor(['ä', 7]), ['string', 'number'])).toEqual(['ä', 7]);
  });

  it.each([['not base64 ❌'], ['bm90IGpzb24'], [encodeCursor([1])], [encodeCursor(['a', 'b'])]])('refuses %s', (cursor) => {
    expect(() => decodeCursor(cursor, ['string', 'number'])).toThrow(InvalidError);
  });
});
