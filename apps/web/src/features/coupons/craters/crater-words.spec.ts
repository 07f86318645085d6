import { seriesWords, withError } from './crater-words';

const plain = (text: string) => text.replaceAll('\u00A0', ' ');

describe('a value with its standard error', () => {
  it.each([
    [38.4123, 0.6123, 'um', '38.41 ± 0.61 µm'],
    [0.84882, 0.00951, 'J/cm²', '0.8488 ± 0.0095 J/cm²'],
    [120.4, 12.3, 'uJ', '120 ± 12 µJ'],
    [120.4, 123.4, 'uJ', '120 ± 123 µJ'],
    [30, 0, 'um', '30.00 ± 0.00 µm'],
  ])('%p with %p %s reads %p', (value, error, unit, words) => {
    expect(plain(withError(value, error, unit))).toBe(words);
  });
});

describe('what craters share', () => {
  it('is told in words, and the source’s own pulse width is left out', () => {
    expect(plain(seriesWords({ pulses: 1, pulseWidthNs: 8, focusOffsetMm: 0 }))).toBe('single pulses of 8 ns, in focus');
    expect(plain(seriesWords({ pulses: 3, pulseWidthNs: null, focusOffsetMm: -0.5 }))).toBe('3 pulses on each place, −0.5 mm out of focus');
  });
});
