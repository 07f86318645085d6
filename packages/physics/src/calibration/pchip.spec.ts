import fc from 'fast-check';
import { expectWithin, referenceRecords } from '../../test/expect-reference';
import { pchipSlopes } from './pchip-slopes';
import { pchipValue } from './pchip-value';

type Points = { readonly x: readonly number[]; readonly y: readonly number[]; readonly query: readonly number[] };

describe('pchip', () => {
  it('passes through the published example within its four decimals and the reference within 1e-6', () => {
    const [record] = referenceRecords<Points, { readonly y: readonly number[] }>('PCHIP, published example (RPN data)');
    const { x, y, query } = record.inputs;
    const curve = { x, y, slopes: pchipSlopes(x, y) };
    const values = query.map((position) => pchipValue(curve, position));
    for (const [index, value] of values.entries()) expectWithin(value, record.expected.y[index], 1e-6);
    expect(values.map((value) => value.toFixed(4))).toEqual(['0.4640', '0.9645', '0.9965', '0.9992']);
  });

  // The same table by other rules in print: 18.632812 (limiter of 1980 on mean secants), 18.682031 (Steffen), 18.6 (straight lines).
  it('uses weighted harmonic slopes and no other monotone cubic', () => {
    const x = [5, 10, 20, 40, 60, 80, 100];
    const y = [0.1, 0.9, 3.1, 8.4, 13, 16.8, 19.2];
    const curve = { x, y, slopes: pchipSlopes(x, y) };
    expect(pchipValue(curve, 95)).toBeCloseTo(18.723841, 6);
    expect(pchipValue(curve, 7.5)).toBeCloseTo(0.473707, 6);
  });

  it('gives the points themselves and a straight line for points on one', () => {
    const x = [0, 1, 3, 4];
    const y = [1, 3, 7, 9];
    const curve = { x, y, slopes: pchipSlopes(x, y) };
    expect(x.map((position) => pchipValue(curve, position))).toEqual(y);
    expect(pchipValue(curve, 2.25)).toBeCloseTo(5.5, 12);
  });

  it('is flat at a turning point and limits the end slope where the secants change sign', () => {
    expect(pchipSlopes([0, 1, 2], [0, 1, 0])).toEqual([2, 0, -2]);
    expect(pchipSlopes([0, 1, 1.1], [0, 1, -9])[0]).toBe(3);
  });

  it('never leaves the values of the interval', () => {
    const rises = fc.array(fc.double({ min: -10, max: 10, noNaN: true }), { minLength: 3, maxLength: 8 });
    fc.assert(
      fc.property(rises, fc.double({ min: 0, max: 1, noNaN: true }), (y, share) => {
        const x = y.map((_value, index) => index * (1 + index));
        const curve = { x, y, slopes: pchipSlopes(x, y) };
        for (let i = 1; i < x.length; i += 1) {
          const value = pchipValue(curve, x[i - 1] + share * (x[i] - x[i - 1]));
          expect(value).toBeGreaterThanOrEqual(Math.min(y[i - 1], y[i]) - 1e-12);
          expect(value).toBeLessThanOrEqual(Math.max(y[i - 1], y[i]) + 1e-12);
        }
      }),
    );
  });

  it('refuses points out of order, too few points and a position outside them', () => {
    expect(() => pchipSlopes([0, 2, 2], [0, 1, 2])).toThrow('x must increase strictly, but x[1] is 2 and x[2] is 2');
    expect(() => pchipSlopes([0, 1], [0, 1])).toThrow('x must have at least 3 points, but has 2');
    expect(() => pchipSlopes([0, 1, 2], [0, 1])).toThrow('y must have as many points as x (3), but has 2');
    expect(() => pchipSlopes([0, 1, 2], [0, Number.NaN, 1])).toThrow('y[1] must be a finite number, but is NaN');
    const curve = { x: [0, 1, 2], y: [0, 1, 2], slopes: [1, 1, 1] };
    expect(() => pchipValue(curve, 2.1)).toThrow('position must lie between 0 and 2, but is 2.1');
  });
});
