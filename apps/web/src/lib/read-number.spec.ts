import fc from 'fast-check';
import { formatLength, formatLengths, setShopStyle } from './format';
import { conversionWords, type NumberRule, readNumber, readOptionalNumber, shownUnit, typedLength, typedNumber } from './read-number';

const distance: NumberRule = { what: 'The working distance', unit: 'mm', least: 1, most: 3000 };
const wavelength: NumberRule = { what: 'The wavelength', unit: 'nm', least: 100, most: 20_000 };

describe('readNumber', () => {
  it.each([
    ['176.5', 176.5],
    ['176,5', 176.5],
    ['176.5 mm', 176.5],
    ['176.5MM', 176.5],
    ['10 in', 254],
    ['1500', 1500],
  ])('reads %s as millimetres', (text, value) => {
    expect(readNumber(text, distance, 'en-GB')).toEqual({ value });
  });

  it('takes the field’s own unit also where no panel shows it', () => {
    expect(readNumber('1064 nm', wavelength, 'en-GB')).toEqual({ value: 1064 });
    expect(readNumber('1.06 µm', wavelength, 'en-GB')).toEqual({ value: 1060 });
    expect(readNumber('1.06 kHz', wavelength, 'en-GB')).toEqual({ message: 'The wavelength is kept in nm. Enter it in that unit.' });
  });

  it('refuses what can be read in two ways, with both readings in the order of the locale', () => {
    expect(readNumber('1,500', distance, 'en-GB')).toEqual({ message: expect.stringMatching(/1500 or 1\.5\b/) });
    expect(readNumber('1,500', distance, 'de-DE')).toEqual({ message: expect.stringMatching(/1,5 or 1500/) });
  });

  it('names the limits, a unit of another kind and an empty field', () => {
    expect(readNumber('0.5', distance, 'en-GB')).toEqual({ message: 'The working distance must be 1 to 3000 mm.' });
    expect(readNumber('30 kHz', distance, 'en-GB')).toEqual({ message: 'The working distance is kept in mm. Enter it in that unit.' });
    expect(readNumber('  ', distance, 'en-GB')).toEqual({ message: 'Enter the working distance.' });
    expect(readNumber('12', { ...distance, what: 'M²' }, 'en-GB')).toEqual({ value: 12 });
  });

  it('wants whole numbers where the field does', () => {
    const minutes: NumberRule = { what: 'The warm-up', unit: 'min', least: 0, most: 480, isWhole: true };
    expect(readNumber('2.5', minutes, 'en-GB')).toEqual({ message: 'The warm-up must be a whole number from 0 to 480 min.' });
    expect(readNumber('15 min', minutes, 'en-GB')).toEqual({ value: 15 });
  });
});

describe('readOptionalNumber', () => {
  it('leaves an empty field absent, never zero', () => {
    expect(readOptionalNumber(' ', distance, 'en-GB')).toEqual({ value: undefined });
  });
});

describe('typedNumber', () => {
  it('keeps every digit with the decimal sign of the locale', () => {
    expect(typedNumber(0.0005, 'de-DE')).toBe('0,0005');
    expect(typedNumber(12345.6789, 'en-GB')).toBe('12345.6789');
    expect(typedNumber(null, 'en-GB')).toBe('');
  });

  it.each([1.125, 12.5, 1500, -6.417, 0.025, 163])('writes %d so that it is read back as itself', (value) => {
    const wide: NumberRule = { what: 'The value', unit: 'mm', least: -1e9, most: 1e9 };
    for (const locale of ['en-GB', 'de-DE']) expect(readNumber(typedNumber(value, locale), wide, locale)).toEqual({ value });
  });
});

describe('a number with another unit', () => {
  const focal = { what: 'The focal length', unit: 'mm', least: 10, most: 2000, isShopLength: true };
  const power = { what: 'The rated power', unit: 'W', least: 0.1, most: 50_000 };

  it('is taken where it measures the same, whatever its multiple, and said in the field’s own unit', () => {
    expect(readNumber('6,4 in', focal, 'de-DE')).toEqual({ value: 162.56 });
    expect(conversionWords('6,4 in', focal, 'de-DE')).toBe('= 162,56\u00A0mm');
    expect(readNumber('20 kW', power, 'en-GB')).toEqual({ value: 20_000 });
    expect(conversionWords('20 kW', power, 'en-GB')).toBe('= 20000\u00A0W');
    expect(readNumber('20 kHz', power, 'en-GB')).toHaveProperty('message');
  });

  it('is said only where it was converted', () => {
    expect(['163', '163 mm', '20 kg', ''].map((text) => conversionWords(text, focal, 'en-GB'))).toEqual([
      undefined,
      undefined,
      undefined,
      undefined,
    ]);
  });
});

describe('a length in a shop that works in inches', () => {
  const thickness = { what: 'The thickness', unit: 'mm', least: 0.001, most: 1000, isShopLength: true };
  beforeEach(() => setShopStyle({ locale: 'en-GB', unitSystem: 'inch' }));
  afterEach(() => setShopStyle(undefined));

  it('is typed, limited and shown in inches, and in millimetres where they are written', () => {
    expect(readNumber('0.06', thickness, 'en-GB')).toEqual({ value: 1.524 });
    expect(readNumber('25.4 mm', thickness, 'en-GB')).toEqual({ value: 25.4 });
    expect(conversionWords('25.4 mm', thickness, 'en-GB')).toBe('= 1\u00A0in');
    expect(readNumber('40', thickness, 'en-GB')).toEqual({ message: 'The thickness must be 0.000039 to 39.3701 in.' });
    expect([shownUnit(thickness), formatLength(1.524), formatLengths(25.4, 50.8)]).toEqual(['in', '0.06\u00A0in', '1 × 2\u00A0in']);
  });

  it('comes back from its field as what was stored', () => {
    const lengths = fc.integer({ min: 1, max: 1_000_000 }).map((thousandths) => thousandths / 1000);
    fc.assert(fc.property(lengths, (mm) => expect(readNumber(typedLength(mm, 'en-GB'), thickness, 'en-GB')).toEqual({ value: mm })));
  });

  it('leaves what has a unit of its own alone', () => {
    expect(readNumber('45', { what: 'The spot', unit: 'µm', least: 1, most: 500 }, 'en-GB')).toEqual({ value: 45 });
  });
});
