import { axisTicks } from './axis-ticks';

describe('axisTicks', () => {
  it.each([
    [19.2, [0, 5, 10, 15, 20]],
    [0.3, [0, 0.1, 0.2, 0.3]],
    [30, [0, 10, 20, 30]],
    [8, [0, 2.5, 5, 7.5, 10]],
    [1200, [0, 250, 500, 750, 1000, 1250]],
  ])('covers %d with round numbers', (highest, ticks) => {
    expect(axisTicks(highest)).toEqual(ticks);
  });

  it('still has two numbers when nothing was measured above zero', () => {
    expect(axisTicks(0)).toEqual([0, 1]);
  });
});
