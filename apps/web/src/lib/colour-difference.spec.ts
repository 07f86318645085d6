import { colourDifference, cssColour, type MeasuredCell } from './colour-difference';

function cell(values: Record<string, number>): MeasuredCell {
  return { measurements: Object.entries(values).map(([quantity, value]) => ({ quantity, value })) };
}

describe('colourDifference', () => {
  // Marked steel against its ground: 35.240 by CIEDE2000 in 50-digit arithmetic, 37.663 by the plain distance.
  it('is ΔE00 with the change of lightness in words', () => {
    const difference = colourDifference(cell({ lightness: 62.3, a: 1.2, b: 6.8 }), cell({ lightness: 28.4, a: 3.1, b: -9.5 }));
    expect(difference?.deltaE).toBeCloseTo(35.240076762, 6);
    expect(difference?.words).toBe('darker by 33.9 L*');
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

describe('cssColour', () => {
  it('shows a grey without colour and white as white', () => {
    expect(cssColour({ lightness: 53.585, a: 0, b: 0 })).toBe('#808080');
    expect(cssColour({ lightness: 100, a: 0, b: 0 })).toBe('#ffffff');
  });

  it('stays within the screen’s range', () => {
    expect(cssColour({ lightness: 60, a: 120, b: -120 })).toMatch(/^#[0-9a-f]{6}$/);
  });
});
