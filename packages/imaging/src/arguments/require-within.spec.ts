import { requireWithin } from './require-within';

const NO_LIMIT = Number.POSITIVE_INFINITY;

describe('requireWithin', () => {
  it('accepts the ends of the range', () => {
    expect(() => requireWithin(0, 255, { red: 0, green: 255 })).not.toThrow();
    expect(() => requireWithin(-NO_LIMIT, NO_LIMIT, { a: -86.2 })).not.toThrow();
  });

  it('names the first bad argument, its value and what is wanted', () => {
    expect(() => requireWithin(0, 255, { red: 12, green: 256 })).toThrow(
      new RangeError('green must be a number from 0 to 255, but is 256'),
    );
    expect(() => requireWithin(0, NO_LIMIT, { darkMean: -0.1 })).toThrow('darkMean must be a finite number of at least 0, but is -0.1');
    expect(() => requireWithin(-NO_LIMIT, 1, { share: 2 })).toThrow('share must be a finite number of at most 1, but is 2');
    expect(() => requireWithin(-NO_LIMIT, NO_LIMIT, { b: Number.NaN })).toThrow('b must be a finite number, but is NaN');
    expect(() => requireWithin(0, NO_LIMIT, { b: NO_LIMIT })).toThrow('b must be a finite number of at least 0, but is Infinity');
  });
});
