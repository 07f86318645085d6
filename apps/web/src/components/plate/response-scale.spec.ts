import { responseScale, scalePosition, scaleTicks } from './response-scale';

describe('the scale of a response', () => {
  it('is linear up to a ratio of ten and logarithmic beyond', () => {
    expect(responseScale([1, 10])?.isLogarithmic).toBe(false);
    expect(responseScale([0.23, 10])?.isLogarithmic).toBe(true);
    expect(responseScale([0, 100])?.isLogarithmic).toBe(false);
    expect(responseScale([-1, 100])?.isLogarithmic).toBe(false);
  });

  it('is none without a number', () => {
    expect(responseScale([])).toBeUndefined();
    expect(responseScale([Number.NaN])).toBeUndefined();
  });

  it('puts the least at 0, the greatest at 1, and equal ratios at equal steps', () => {
    const scale = { min: 1, max: 100, isLogarithmic: true };
    expect([1, 10, 100].map((value) => scalePosition(scale, value))).toEqual([0, expect.closeTo(0.5, 12), 1]);
    expect(scalePosition({ min: 5, max: 5, isLogarithmic: false }, 5)).toBe(0.5);
  });

  it('has round ticks strictly inside', () => {
    expect(scaleTicks({ min: 24, max: 75, isLogarithmic: false })).toEqual([40, 60]);
    expect(scaleTicks({ min: 0.23, max: 10, isLogarithmic: true })).toEqual([0.5, 1, 2, 5]);
    expect(scaleTicks({ min: 0.02, max: 30, isLogarithmic: true })).toEqual([0.1, 1, 10]);
    expect(scaleTicks({ min: 3, max: 3, isLogarithmic: false })).toEqual([]);
  });
});
