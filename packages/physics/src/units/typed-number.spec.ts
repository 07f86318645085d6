import fc from 'fast-check';
import { PANEL_UNITS } from './panel-unit';
import { type DecimalSign, parseTypedNumber, type TypedNumber } from './typed-number';

const SIGNS: DecimalSign[] = ['.', ','];
const number = (value: number, unit: string | null = null) => ({ kind: 'number', value, unit });

describe('parseTypedNumber', () => {
  it.each(SIGNS)('reads plain numbers, units and both decimal signs where the sign is “%s”', (decimalSign) => {
    const read = (text: string) => parseTypedNumber(text, { decimalSign });
    expect(read('850')).toEqual(number(850));
    expect(read('0.03 mm')).toEqual(number(0.03, 'mm'));
    expect(read('850 lpi')).toEqual(number(850, 'lpi'));
    expect(read('1,5')).toEqual(number(1.5));
    expect(read('1.5')).toEqual(number(1.5));
    expect(read('35%')).toEqual(number(35, '%'));
    expect(read(' −0,25 mm ')).toEqual(number(-0.25, 'mm'));
    expect(read('30 μm')).toEqual(number(30, 'um'));
    expect(read('200 lines per cm')).toEqual(number(200, 'lpcm'));
    expect(read('.5')).toEqual(number(0.5));
    expect(read('1.2500')).toEqual(number(1.25));
  });

  it.each(SIGNS)('refuses one separator with three digits behind it and offers both readings where the sign is “%s”', (decimalSign) => {
    const readings = { '1,500': [1.5, 1500], '1.500': [1.5, 1500], '12,345 mm/s': [12.345, 12_345], '-1.250 mm': [-1.25, -1250] };
    for (const [text, expected] of Object.entries(readings)) {
      const got = parseTypedNumber(text, { decimalSign });
      expect(got).toMatchObject({ kind: 'refused', reason: 'ambiguous' });
      expect(readingsOf(got)).toEqual([...expected].sort((a, b) => a - b));
    }
  });

  it('offers a way to write either reading that is then accepted', () => {
    const got = parseTypedNumber('1.125', { decimalSign: '.' });
    expect(got).toMatchObject({ message: '“1.125” can be read in two ways. Write 1.1250 or 1125, whichever you mean.' });
    expect(parseTypedNumber('1.1250', { decimalSign: '.' })).toEqual(number(1.125));
  });

  it('puts the reading of the person’s own locale first', () => {
    expect(parseTypedNumber('1,500', { decimalSign: ',' })).toMatchObject({ readings: [1.5, 1500] });
    expect(parseTypedNumber('1,500', { decimalSign: '.' })).toMatchObject({ readings: [1500, 1.5] });
  });

  it('reads a leading zero with three decimals, which no grouped number has', () => {
    expect(parseTypedNumber('0.025 mm', { decimalSign: '.' })).toEqual(number(0.025, 'mm'));
    expect(parseTypedNumber('0,025 mm', { decimalSign: '.' })).toEqual(number(0.025, 'mm'));
  });

  it.each([
    ['NaN', 'not a number'],
    ['Infinity', 'not a number'],
    ['1e309', 'too large'],
    ['1e-400', 'too small'],
    ['', 'empty'],
    ['   ', 'empty'],
    ['fast', 'not a number'],
    ['1.234,5', 'not a number'],
    ['1,234,567', 'not a number'],
    ['1 500', 'unknown unit'],
    ['850 parsecs', 'unknown unit'],
    ['0x10', 'unknown unit'],
    ['0.12345678901234567', 'too many digits'],
  ])('refuses “%s”: %s', (text, reason) => {
    const got = parseTypedNumber(text, { decimalSign: '.' });
    expect(got).toMatchObject({ kind: 'refused', reason });
    expect(got.kind === 'refused' && got.message.endsWith('.')).toBe(true);
  });

  it('reads back every number that a panel could show, in either sign', () => {
    const decimals = fc.tuple(fc.integer({ min: 0, max: 99_999 }), fc.integer({ min: 0, max: 99 }), fc.constantFrom(...SIGNS));
    fc.assert(
      fc.property(decimals, fc.constantFrom(...SIGNS), ([whole, hundredths, written], decimalSign) => {
        const text = `${whole}${written}${String(hundredths).padStart(2, '0')}`;
        expect(parseTypedNumber(text, { decimalSign })).toEqual(number(Number(text.replace(',', '.'))));
      }),
    );
  });

  it('understands the code of every unit that a panel can show', () => {
    const plain = Object.keys(PANEL_UNITS).filter((unit) => !unit.startsWith('percent') && unit !== 'count');
    for (const unit of plain) expect(parseTypedNumber(`5 ${unit}`, { decimalSign: '.' })).toEqual(number(5, unit));
  });

  it('never throws and never gives a number that is not finite', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string(), fc.stringMatching(/^[-+]?[0-9.,eE]{0,12} ?[a-zµ/%]{0,5}$/)), (text) => {
        const got = parseTypedNumber(text, { decimalSign: '.' });
        if (got.kind === 'number') expect(Number.isFinite(got.value)).toBe(true);
        else expect(got.message.length).toBeGreaterThan(10);
      }),
    );
  });
});

function readingsOf(got: TypedNumber): number[] {
  return got.kind === 'refused' ? [...(got.readings ?? [])].sort((a, b) => a - b) : [];
}
