import { criteriaAsStored, criteriaProblems } from './effect-criteria';

describe('criteriaProblems', () => {
  it('accepts limits with or without their unit', () => {
    expect(
      criteriaProblems([
        { quantity: 'lightness', comparison: 'at most', value: 35 },
        { quantity: 'depth', comparison: 'between', value: 5, upper: 50, unit: 'µm' },
      ]),
    ).toEqual([]);
  });

  it('refuses a limit that the quantity cannot reach', () => {
    const problems = criteriaProblems([
      { quantity: 'evenness', comparison: 'at least', value: -3 },
      { quantity: 'wipe-test', comparison: 'at least', value: 25.5 },
      { quantity: 'lightness', comparison: 'between', value: 20, upper: 120 },
    ]);
    expect(problems.map(({ pointer }) => pointer)).toEqual(['#/criteria/0/value', '#/criteria/1/value', '#/criteria/2/upper']);
  });

  it('names a wrong unit, crossed limits, a stray upper limit and a repeated demand', () => {
    const problems = criteriaProblems([
      { quantity: 'depth', comparison: 'at least', value: 5, unit: 'mm' },
      { quantity: 'evenness', comparison: 'between', value: 90, upper: 80 },
      { quantity: 'contrast', comparison: 'at least', value: 0.5, upper: 0.9 },
      { quantity: 'depth', comparison: 'at least', value: 9 },
    ]);
    expect(problems.map(({ pointer }) => pointer)).toEqual([
      '#/criteria/0/unit',
      '#/criteria/1/upper',
      '#/criteria/2/upper',
      '#/criteria/3/quantity',
    ]);
  });
});

describe('criteriaAsStored', () => {
  it('writes the quantity’s own unit beside each limit', () => {
    expect(criteriaAsStored([{ quantity: 'depth', comparison: 'between', value: 5, upper: 50 }])).toEqual([
      { quantity: 'depth', comparison: 'between', value: 5, upper: 50, unit: 'µm' },
    ]);
  });
});
