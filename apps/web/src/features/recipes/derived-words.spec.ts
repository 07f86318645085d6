import { derivedLabel, inputWords } from './derived-words';

describe('words of derived numbers', () => {
  it('name the inputs with their units', () => {
    expect(inputWords({ powerW: 12, speedMmPerS: 800, spotDiameterUm: 43.5, scans: 2 })).toBe(
      'From power 12\u00A0W, speed 800\u00A0mm/s, spot diameter 43.5\u00A0µm, scans 2. ',
    );
  });

  it('say nothing where no number went in', () => {
    expect(inputWords({})).toBe('');
  });

  it('fall back to the key of a number that has no words yet', () => {
    expect([derivedLabel('arealDose'), derivedLabel('somethingNew')]).toEqual(['Dose', 'somethingNew']);
  });
});
