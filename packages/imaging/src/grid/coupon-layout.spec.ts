import fc from 'fast-check';
import { type CouponLayout, couponLayout, type RectMm } from './coupon-layout';

const TOUCH_MM = 1e-3;

function places(layout: CouponLayout): [string, RectMm][] {
  return [
    ...layout.cells.map((cell): [string, RectMm] => [`cell ${cell.address}`, cell.rect]),
    ...layout.fiducials.map((mark): [string, RectMm] => [`corner ${mark.id}`, mark.quietZone]),
    ...layout.rowLetters.map((label): [string, RectMm] => [`row ${label.text}`, label.rect]),
    ...layout.columnNumbers.map((label): [string, RectMm] => [`column ${label.text}`, label.rect]),
    ['code', layout.codePlace],
    ['data matrix', layout.dataMatrixPlace],
    ['ground', layout.groundPatch],
    ['card', layout.neutralCard],
  ];
}

function overlap(a: RectMm, b: RectMm): boolean {
  return (
    a.xMm + a.widthMm > b.xMm + TOUCH_MM &&
    b.xMm + b.widthMm > a.xMm + TOUCH_MM &&
    a.yMm + a.heightMm > b.yMm + TOUCH_MM &&
    b.yMm + b.heightMm > a.yMm + TOUCH_MM
  );
}

const options = fc.record({
  rows: fc.integer({ min: 1, max: 26 }),
  columns: fc.integer({ min: 1, max: 26 }),
  cellMm: fc.double({ min: 1, max: 30, noNaN: true }),
  gapMm: fc.double({ min: 0.3, max: 10, noNaN: true }),
  reference: fc.constant('C-0117'),
});

describe('couponLayout', () => {
  it('keeps every place inside the plate', () => {
    fc.assert(
      fc.property(options, (chosen) => {
        const layout = couponLayout(chosen);
        for (const [name, rect] of places(layout)) {
          const inside =
            rect.xMm >= 0 &&
            rect.yMm >= 0 &&
            rect.xMm + rect.widthMm <= layout.plate.widthMm + TOUCH_MM &&
            rect.yMm + rect.heightMm <= layout.plate.heightMm + TOUCH_MM;
          expect({ name, inside }).toEqual({ name, inside: true });
        }
      }),
      { numRuns: 40, seed: 1 },
    );
  });

  it('lets no two places overlap', () => {
    fc.assert(
      fc.property(options, (chosen) => {
        const all = places(couponLayout(chosen));
        const clashes = all.flatMap(([name, rect], index) =>
          all.slice(index + 1).flatMap(([other, otherRect]) => (overlap(rect, otherRect) ? [`${name} on ${other}`] : [])),
        );
        expect(clashes).toEqual([]);
      }),
      { numRuns: 25, seed: 2 },
    );
  });

  it('is exact for the 8 x 8 plate of the defaults', () => {
    const layout = couponLayout({ rows: 8, columns: 8, reference: 'C-0117' });
    expect(layout.plate).toEqual({ widthMm: 72.4, heightMm: 74.8 });
    expect(layout.cells.find((cell) => cell.address === 'B4')).toEqual({
      address: 'B4',
      row: 1,
      column: 3,
      rect: { xMm: 30.6, yMm: 18.2, widthMm: 5, heightMm: 5 },
    });
    expect(layout.fiducials.map((mark) => [mark.id, mark.rect.xMm, mark.rect.yMm, mark.rect.widthMm])).toEqual([
      [0, 2.4, 2.4, 7.2],
      [1, 62.8, 2.4, 7.2],
      [2, 62.8, 65.2, 7.2],
      [3, 2.4, 65.2, 7.2],
    ]);
  });

  it('centres a grid that is narrower than the foot', () => {
    const layout = couponLayout({ rows: 1, columns: 1, reference: 'C-0001' });
    const [cell] = layout.cells;
    expect(cell.rect.xMm + cell.rect.widthMm / 2).toBeCloseTo(layout.plate.widthMm / 2, 4);
  });

  it.each([
    [{ rows: 0 }, /rows/],
    [{ rows: 27 }, /rows/],
    [{ columns: 2.5 }, /columns/],
    [{ cellMm: 0.9 }, /cellMm/],
    [{ cellMm: Number.NaN }, /cellMm/],
    [{ gapMm: 0 }, /gapMm/],
    [{ reference: '' }, /reference/],
    [{ reference: 'C 1' }, /reference/],
  ])('refuses %p', (wrong, message) => {
    expect(() => couponLayout({ rows: 2, columns: 2, reference: 'C-0001', ...wrong })).toThrow(message);
  });
});
