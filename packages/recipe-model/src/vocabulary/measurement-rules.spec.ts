import { METHODS_OF_QUANTITY, quantityProblem } from './measurement-rules';

describe('quantityProblem()', () => {
  it('takes what a quantity can be, its limits included', () => {
    expect(quantityProblem('evenness', 0)).toBeUndefined();
    expect(quantityProblem('wipe-test', 25)).toBeUndefined();
    expect(quantityProblem('depth', -12)).toBeUndefined();
  });

  it('refuses what it cannot be, with its limits in words', () => {
    expect(quantityProblem('evenness', -3)).toBe('Evenness must be from 0 to 100 %.');
    expect(quantityProblem('wipe-test', 25.5)).toBe('Wipe test, double rubs passed must be a whole number from 0 to 1000000 ×.');
    expect(quantityProblem('lightness', Number.NaN)).toBe('Lightness must be from 0 to 100.');
  });
});

describe('METHODS_OF_QUANTITY', () => {
  it('lets what an effect usually demands be given by hand, and a code grade by a verifier only', () => {
    for (const quantity of ['lightness', 'contrast', 'evenness'] as const) expect(METHODS_OF_QUANTITY[quantity]).toContain('manual');
    expect(METHODS_OF_QUANTITY['code-grade']).toEqual(['verifier']);
  });
});
