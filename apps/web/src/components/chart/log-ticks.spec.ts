import { logTicks } from './log-ticks';

describe('logTicks()', () => {
  it.each([
    [3, 60, [5, 10, 20, 50]],
    [0.2, 1, [0.2, 0.5, 1]],
    [20, 20, [20]],
    [6, 9, []],
    [0, 9, []],
  ])('between %p and %p are %p', (lowest, highest, ticks) => {
    expect(logTicks(lowest, highest)).toEqual(ticks);
  });
});
