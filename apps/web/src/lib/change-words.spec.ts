import { alignedNumbers, changeShare, changeWords, kindWords, shownNumber } from './change-words';

describe('words of a change', () => {
  it('are percents of the earlier value for a quantity', () => {
    expect(changeWords({ delta: -70, symbol: 'mm/s', percent: -25.9, points: null })).toBe('−26\u00A0%');
  });

  it('are points for a value that is a percent itself', () => {
    expect(changeWords({ delta: -10, symbol: '%', percent: null, points: -10 })).toBe('−10 points');
  });

  it('are the plain difference where a percent would mean nothing', () => {
    expect(changeWords({ delta: 0.5, symbol: 'mm', percent: null, points: null })).toBe('+0.5');
  });

  it('never round a change to nothing', () => {
    expect(changeWords({ delta: 0.001, symbol: 'mm', percent: 0.12, points: null })).toBe('+0.1\u00A0%');
  });

  it('say added, removed and not comparable in words', () => {
    expect(['added', 'removed', 'not comparable', 'changed'].map(kindWords)).toEqual(['added', 'removed', 'not comparable', undefined]);
  });
});

describe('changeShare', () => {
  it('is the change over the size of the earlier value', () => {
    expect(changeShare(270, 200)).toBeCloseTo(-0.259, 3);
    expect(changeShare(-2, -1)).toBeCloseTo(0.5, 9);
  });

  it('is nothing where the earlier value is zero or not known', () => {
    expect([changeShare(0, 5), changeShare(null, 5), changeShare(5, null)]).toEqual([undefined, undefined, undefined]);
  });
});

describe('numbers side by side', () => {
  it('have three digits where they were computed', () => {
    expect([13, 0.035251, 4.8148].map(shownNumber)).toEqual(['13.0', '0.0353', '4.81']);
  });

  it('share the decimals of the finest where they were typed', () => {
    const shown = alignedNumbers([0.012, 0.01, null]);
    expect([0.012, 0.01].map(shown)).toEqual(['0.012', '0.010']);
  });
});
