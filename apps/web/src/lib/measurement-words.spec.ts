import { quantityWords, withSymbol } from './measurement-words';

describe('withSymbol()', () => {
  it('puts the symbol behind the label, and says nothing twice', () => {
    expect(quantityWords('evenness')).toBe('Evenness, U');
    expect(quantityWords('wipe-test')).toBe('Wipe test, double rubs passed');
    expect(withSymbol('Roughness Ra', 'roughness-ra')).toBe('Roughness Ra');
    expect(withSymbol('Depth', 'depth')).toBe('Depth d');
  });
});
