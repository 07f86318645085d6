import fc from 'fast-check';
import type { DerivedNumber } from './derived/derived-number';
import type { MarkParameters } from './derived/mark-parameters';
import { derivedNumbers } from './derived-numbers';

const pulsed: MarkParameters = {
  powerW: 20,
  speedMmPerS: 200,
  frequencyKhz: 20,
  pulseWidthNs: 100,
  lineSpacingUm: 25,
  passes: 1,
  fill: 'one direction',
  spot: { spotDiameterUm: 50, wavelengthNm: 1064, m2: 1.3 },
  focusOffsetMm: 0,
};
const { frequencyKhz: _frequency, pulseWidthNs: _width, ...continuous } = pulsed;
const PULSE_KEYS = [
  'pulseEnergy',
  'rectangularPeakPower',
  'gaussianPeakPower',
  'peakIrradiance',
  'averageFluence',
  'peakFluence',
  'pulsePitch',
  'pulseOverlap',
  'pulsesPerSpot',
  'pulsesPerSpotArea',
];
const AREA_KEYS = [
  'lineOverlap',
  'scansPerSpot',
  'coverageRipple',
  'pulsesPerSpotArea',
  'arealDose',
  'areaRate',
  'timePer100Mm2',
  'markingTime',
];

function numberOf(mark: MarkParameters, key: string): DerivedNumber {
  const found = derivedNumbers(mark).find((derived) => derived.key === key);
  if (found === undefined) throw new Error(`no derived number ${key}`);
  return found;
}
const valueFor = (mark: MarkParameters, key: string) => numberOf(mark, key).value ?? Number.NaN;
const missingKeys = (mark: MarkParameters) => derivedNumbers(mark).flatMap(({ key, value }) => (value === undefined ? [key] : []));

describe('derivedNumbers', () => {
  it('gives the reference numbers of a pulsed fill', () => {
    const expected = { pulseEnergy: 1, rectangularPeakPower: 10, gaussianPeakPower: 9.394372787, averageFluence: 50.9295817894 };
    const more = { peakFluence: 101.859163579, peakIrradiance: 0.956902954431, pulsePitch: 10, pulseOverlap: 0.8, pulsesPerSpot: 5 };
    const area = {
      lineOverlap: 0.5,
      scansPerSpot: 2,
      pulsesPerSpotArea: 7.85398163397,
      arealDose: 4,
      areaRate: 5,
      lineEnergy: 0.1,
      interactionTime: 250,
    };
    for (const [key, value] of Object.entries({ ...expected, ...more, ...area })) expect(valueFor(pulsed, key)).toBeCloseTo(value, 8);
  });

  it('states unit, formula and source of every number, and its inputs when it has a value', () => {
    for (const derived of derivedNumbers(pulsed)) {
      expect([derived.unit, derived.formula, derived.source]).not.toContain('');
      if (derived.value !== undefined) expect(Object.keys(derived.inputs).length).toBeGreaterThan(0);
    }
  });

  it('keeps the keys and their order in every mode', () => {
    const keys = derivedNumbers(pulsed).map(({ key }) => key);
    expect(new Set(keys).size).toBe(keys.length);
    for (const mark of [continuous, { ...pulsed, fill: 'outline' } as const])
      expect(derivedNumbers(mark).map(({ key }) => key)).toEqual(keys);
  });

  it('has irradiance and no pulse numbers for a continuous beam', () => {
    expect(valueFor(continuous, 'averageIrradiance')).toBeCloseTo((4 * 20) / (Math.PI * 0.05 ** 2), 6);
    expect(missingKeys(continuous)).toEqual([...PULSE_KEYS, 'markingTime']);
    expect(numberOf(continuous, 'peakFluence').missingBecause).toBe('continuous beam: there are no pulses');
    expect(missingKeys(pulsed)).toEqual(['averageIrradiance', 'markingTime']);
  });

  it('has no areal numbers for an outline', () => {
    const outline = { ...pulsed, fill: 'outline' } as const;
    expect(missingKeys(outline)).toEqual(['averageIrradiance', ...AREA_KEYS]);
    expect(numberOf(outline, 'arealDose').missingBecause).toBe('outline only: no area is filled');
  });

  it('counts two scans for each crossed pass', () => {
    const crossed = { ...pulsed, passes: 3, fill: 'crossed' } as const;
    for (const key of ['arealDose', 'pulsesPerSpotArea', 'timePer100Mm2'])
      expect(valueFor(crossed, key)).toBeCloseTo(6 * valueFor(pulsed, key), 9);
    expect(valueFor(crossed, 'areaRate')).toBe(valueFor(pulsed, 'areaRate'));
  });

  it('leaves out the numbers by scan speed when the line wobbles', () => {
    const wobbled = { ...pulsed, wobble: { diameterUm: 200, frequencyKhz: 1 } };
    const missing = missingKeys(wobbled);
    for (const key of ['pulsePitch', 'pulseOverlap', 'pulsesPerSpot', 'lineEnergy', 'interactionTime', 'lineOverlap', 'arealDose']) {
      expect(missing).toContain(key);
      expect(numberOf(wobbled, key).missingBecause).toContain('wobble');
    }
    for (const key of ['pulseEnergy', 'peakFluence', 'areaRate', 'timePer100Mm2'])
      expect(valueFor(wobbled, key)).toBe(valueFor(pulsed, key));
  });

  it('uses the spot at the focus offset, the same on both sides', () => {
    const rayleighMm = valueFor(pulsed, 'rayleighLength');
    const above = { ...pulsed, focusOffsetMm: rayleighMm };
    expect(valueFor(above, 'spotAtWork')).toBeCloseTo(50 * Math.SQRT2, 9);
    expect(valueFor(above, 'peakFluence')).toBeCloseTo(valueFor(pulsed, 'peakFluence') / 2, 9);
    expect(valueFor({ ...pulsed, focusOffsetMm: -rayleighMm }, 'spotAtWork')).toBe(valueFor(above, 'spotAtWork'));
  });

  it('needs wavelength and M² to follow a measured spot out of focus, not in it', () => {
    const bare = { ...pulsed, spot: { spotDiameterUm: 50 } };
    expect(valueFor(bare, 'spotAtWork')).toBe(50);
    const offset = numberOf({ ...bare, focusOffsetMm: 1 }, 'peakFluence');
    expect(offset.missingBecause).toBe('the wavelength is not given; the M² of the beam is not given');
  });

  it('computes the spot from the beam and flags a focus that is too short for the formula', () => {
    const beam = { wavelengthNm: 1064, focalLengthMm: 163, beamDiameterMm: 10, m2: 1.3 };
    expect(valueFor({ ...pulsed, spot: beam }, 'spotAtWork')).toBeCloseTo(28.7066624939, 8);
    const short = numberOf({ ...pulsed, spot: { ...beam, focalLengthMm: 39 } }, 'spotAtWork');
    expect(short.value).toBeGreaterThan(0);
    expect(short).toHaveProperty('outOfRange', expect.stringContaining('paraxial'));
    expect(numberOf({ ...pulsed, spot: { ...beam, focalLengthMm: 39 } }, 'peakFluence')).toHaveProperty(
      'outOfRange',
      short.value === undefined ? '' : short.outOfRange,
    );
  });

  it('flags a spot whose beam an aperture cuts, and says by how much, but does not change it', () => {
    const beam = { wavelengthNm: 1064, focalLengthMm: 163, beamDiameterMm: 10, m2: 1.3 };
    const cut = numberOf({ ...pulsed, spot: { ...beam, apertureMm: 10 } }, 'focalSpot');
    expect(cut.value).toBeCloseTo(28.7066624939, 8);
    // 1.83 over 4/π, the factors of the printed table.
    expect(cut).toHaveProperty('outOfRange', expect.stringContaining('about 1.44 times as wide'));
    expect(numberOf({ ...pulsed, spot: { ...beam, apertureMm: 10 } }, 'peakFluence')).toHaveProperty('outOfRange');
    expect(numberOf({ ...pulsed, spot: { ...beam, apertureMm: 5 } }, 'focalSpot')).toHaveProperty(
      'outOfRange',
      expect.stringContaining('far wider'),
    );
    expect(numberOf({ ...pulsed, spot: { ...beam, apertureMm: 15 } }, 'focalSpot')).not.toHaveProperty('outOfRange');
  });

  it('hands on the reason of an unknown power and never a zero', () => {
    const unknown = { ...pulsed, powerW: { unknownBecause: 'no calibration for this pulse width' } };
    for (const key of ['pulseEnergy', 'peakFluence', 'lineEnergy', 'arealDose']) {
      expect(numberOf(unknown, key)).toMatchObject({ missingBecause: 'no calibration for this pulse width' });
      expect(numberOf(unknown, key).value).toBeUndefined();
    }
    expect(valueFor(unknown, 'pulsePitch')).toBe(10);
  });

  it('tells a number that the mode rules out from one that an input would bring', () => {
    const bare = { ...continuous, spot: { unknownBecause: 'the spot was never measured' } };
    expect(numberOf(bare, 'peakFluence')).toMatchObject({ missingBecause: 'continuous beam: there are no pulses', isRuledOutByMode: true });
    expect(numberOf(bare, 'averageIrradiance')).toMatchObject({ missingBecause: 'the spot was never measured', isRuledOutByMode: false });
  });

  it('flags pulses that merge and lines that leave gaps', () => {
    expect(numberOf({ ...pulsed, frequencyKhz: 10_000 }, 'gaussianPeakPower')).toHaveProperty(
      'outOfRange',
      expect.stringContaining('run into each other'),
    );
    expect(numberOf({ ...pulsed, lineSpacingUm: 60 }, 'arealDose')).toHaveProperty('outOfRange', expect.stringContaining('gaps'));
    expect(numberOf(pulsed, 'arealDose')).not.toHaveProperty('outOfRange');
  });

  it('gives the time of the area when the overheads of the head are known', () => {
    const head = { jumpSpeedMmPerS: 5000, lineOverheadMs: 0.3, jumpSettleMs: 0.5, pauseBetweenMs: 1 };
    const mark = { ...pulsed, speedMmPerS: 1000, lineSpacingUm: 50, fill: 'both directions' } as const;
    expect(valueFor({ ...mark, area: { widthMm: 20, heightMm: 10, ...head } }, 'markingTime')).toBeCloseTo(4.1823, 9);
    const unknownHead = { ...head, jumpSpeedMmPerS: { unknownBecause: 'the jump speed is not recorded' } };
    expect(numberOf({ ...mark, area: { widthMm: 20, heightMm: 10, ...unknownHead } }, 'markingTime').missingBecause).toBe(
      'the jump speed is not recorded',
    );
  });

  it('keeps the energy: dose × 100 mm² is power × time for 100 mm²', () => {
    const positive = fc.double({ min: 0.1, max: 5000, noNaN: true });
    const fill = fc.constantFrom('one direction', 'both directions', 'crossed');
    fc.assert(
      fc.property(
        positive,
        positive,
        positive,
        fc.integer({ min: 1, max: 30 }),
        fill,
        (powerW, speedMmPerS, lineSpacingUm, passes, mode) => {
          const mark = { ...pulsed, powerW, speedMmPerS, lineSpacingUm, passes, fill: mode };
          expect(Math.abs((valueFor(mark, 'arealDose') * 100) / (powerW * valueFor(mark, 'timePer100Mm2')) - 1)).toBeLessThan(1e-12);
        },
      ),
    );
  });

  it('refuses a bad value by its name, even where the mode does not use it', () => {
    expect(() => derivedNumbers({ ...pulsed, speedMmPerS: 0 })).toThrow('speedMmPerS must be a finite number above 0, but is 0');
    expect(() => derivedNumbers({ ...pulsed, fill: 'outline', lineSpacingUm: -1 })).toThrow(
      'lineSpacingUm must be a finite number above 0, but is -1',
    );
    expect(() => derivedNumbers({ ...pulsed, passes: 1.5 })).toThrow('passes must be a whole number of at least 1, but is 1.5');
    expect(() => derivedNumbers({ ...pulsed, focusOffsetMm: Number.NaN })).toThrow('focusOffsetMm must be a finite number, but is NaN');
  });
});
