import { byMethod, quantityWords, withSymbol } from './measurement-words';

describe('withSymbol()', () => {
  it('puts the symbol behind the label, and says nothing twice', () => {
    expect(quantityWords('evenness')).toBe('Evenness, U');
    expect(quantityWords('wipe-test')).toBe('Wipe test, double rubs passed');
    expect(withSymbol('Roughness Ra', 'roughness-ra')).toBe('Roughness Ra');
    expect(withSymbol('Depth', 'depth')).toBe('Depth d');
  });
});

it('says by what or by whom a number was found, with one “by”', () => {
  expect(byMethod('profilometer')).toBe('by profilometer');
  expect(byMethod('manual')).toBe('by hand');
});
