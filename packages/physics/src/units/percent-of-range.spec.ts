import fc from 'fast-check';
import { percentOfRange, rangeAsPercent } from './percent-of-range';

describe('percentOfRange', () => {
  it.each([
    { low: 20, high: 200, percent: 50, fromMinimum: 110, fromZero: 100 },
    { low: 1, high: 4000, percent: 12.5, fromMinimum: 500.875, fromZero: 500 },
  ])(
    'reads $percent % of $low to $high as $fromMinimum from the minimum and $fromZero from zero',
    ({ fromMinimum, fromZero, ...range }) => {
      expect(percentOfRange(range)).toEqual({ fromMinimum, fromZero });
    },
  );

  it('meets itself on the way back', () => {
    const range = fc.record({
      low: fc.double({ min: 0, max: 100, noNaN: true }),
      width: fc.double({ min: 100, max: 1e4, noNaN: true }),
      percent: fc.double({ min: 0.01, max: 100, noNaN: true }),
    });
    fc.assert(
      fc.property(range, ({ low, width, percent }) => {
        const high = low + width;
        const { fromMinimum, fromZero } = percentOfRange({ low, high, percent });
        expect(Math.abs(rangeAsPercent({ low, high, value: fromMinimum }).fromMinimum - percent)).toBeLessThanOrEqual(1e-9 * percent);
        expect(Math.abs(rangeAsPercent({ low, high, value: fromZero }).fromZero - percent)).toBeLessThanOrEqual(1e-9 * percent);
      }),
    );
  });

  it('refuses a range without width and a percent that is no number', () => {
    expect(() => percentOfRange({ low: 20, high: 20, percent: 50 })).toThrow('high must be above low, got 20 to 20');
    expect(() => percentOfRange({ low: 0, high: 20, percent: Number.NaN })).toThrow('percent must be a finite number, but is NaN');
    expect(() => rangeAsPercent({ low: -5, high: 0, value: -1 })).toThrow('high must not be 0');
  });
});
