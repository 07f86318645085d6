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

  const id = '0192f3a4-0000-7000-8000-000000000001';

  it.each([
    ['id', id],
    ['day', '2026-05-14'],
    ['moment', '2026-05-14T08:30:00.123Z'],
    ['moment', '2026-05-14 08:30:00.123456+00'],
  ] as const)('gives back an %s as %s', (kind, part) => {
    expect(decodeCursor(encodeCursor([part]), [kind])).toEqual([part]);
  });

  it.each([
    ['id', 'C-0001'],
    ['day', '2026-02-30'],
    ['moment', 'yesterday'],
    ['moment', '2026-02-30T08:30:00Z'],
    ['number', 1.5],
    ['number', 2 ** 60],
  ] as const)('refuses an %s such as %s, which the database could not compare', (kind, part) => {
    expect(() => decodeCursor(encodeCursor([part]), [kind])).toThrow(InvalidError);
  });
});
