import { mean } from './mean';

describe('mean', () => {
  it('is the sum over the count', () => {
    expect(mean([1, 2, 6])).toBe(3);
    expect(mean([-4])).toBe(-4);
  });

  it('refuses an empty list and a value that is not a number', () => {
    expect(() => mean([])).toThrow('values must hold at least one number, but is empty');
    expect(() => mean([1, Number.NaN])).toThrow('values[1] must be a finite number, but is NaN');
  });
});
