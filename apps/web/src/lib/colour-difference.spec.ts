import { colourDifference, deltaE76, type MeasuredCell } from './colour-difference';

function cell(values: Record<string, number>): MeasuredCell {
  return { measurements: Object.entries(values).map(([quantity, value]) => ({ quantity, value })) };
}

describe('colourDifference', () => {
  it('is the distance in L*a*b* with the change of lightness in words', () => {
    const difference = colourDifference(cell({ lightness: 29.2, a: 1, b: 2 }), cell({ lightness: 25.2, a: 1, b: 5 }));
    expect(difference?.deltaE).toBeCloseTo(5, 9);
    expect(difference?.words).toBe('darker by 4.0 L*');
  });

  it('says the lightness alone where the hue was not measured', () => {
    expect(colourDifference(cell({ lightness: 25 }), cell({ lightness: 30.25 }))).toEqual({
      deltaE: undefined,
      words: 'lighter by 5.3 L*',
    });
  });

  it('says nothing where a mark was not measured', () => {
    expect(colourDifference(cell({}), cell({ lightness: 30 }))).toBeUndefined();
    expect(colourDifference(undefined, cell({ lightness: 30 }))).toBeUndefined();
  });
});

describe('deltaE76', () => {
  it('is zero for the same colour and the same in both directions', () => {
    const one = { lightness: 40, a: -3, b: 8 };
    const other = { lightness: 42, a: -1, b: 7 };
    expect(deltaE76(one, one)).toBe(0);
    expect(deltaE76(one, other)).toBeCloseTo(3, 12);
    expect(deltaE76(other, one)).toBeCloseTo(3, 12);
  });
});
