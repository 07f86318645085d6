import { PARAMETERS, type ParameterKey } from '../vocabulary/parameters';
import type { PhysicalProfile } from '../vocabulary/profile';
import type { ParameterValues } from '../vocabulary/setting';
import type { NumberedSetting } from './mark-of-setting';
import type { SettingNumber } from './setting-number';
import { type NumbersGround, settingNumbers, stepNumbers } from './setting-numbers';

const physical: PhysicalProfile = {
  ...{ sourceKind: 'fibre-mopa', wavelengthNm: 1064, ratedPowerW: 60, m2: 1.3, beamDiameterMm: 10, jumpSpeedMmPerS: 5000 },
  maxPulseEnergyMj: [{ pulseWidthNs: 200, energyMj: 0.45 }],
  frequencyRangeKhz: { from: 1, to: 1000 },
  topSpeedMmPerS: 8000,
};
const ground: NumbersGround = { optics: { physical, focalLengthMm: 163, measuredSpotUm: 60 }, areaMm: { widthMm: 10, heightMm: 10 } };

function valuesOf(given: Partial<Record<ParameterKey, number>>): ParameterValues {
  const entries = Object.entries(given).map(([key, physicalValue]) => {
    // the keys come from the argument's own type
    const unit = PARAMETERS[key as ParameterKey].unit;
    return [key, { entered: { value: physicalValue, unit }, physical: physicalValue }];
  });
  return Object.fromEntries(entries);
}

const SET = { powerPercent: 50, speedMmPerS: 1000, frequencyKhz: 60, pulseWidthNs: 200, lineSpacingUm: 30, passes: 2 };
const setting = (given: Partial<Record<ParameterKey, number>> = {}, rest: Partial<NumberedSetting> = {}): NumberedSetting => ({
  values: valuesOf({ ...SET, ...given }),
  fill: 'both directions',
  power: { watts: 30, basis: 'calibration' },
  ...rest,
});
function without(key: ParameterKey): NumberedSetting {
  const { [key]: _, ...values } = setting().values;
  return { ...setting(), values };
}
const keyed = (step: NumberedSetting, on: NumbersGround = ground) =>
  new Map(stepNumbers(step, on).numbers.map((number) => [number.key, number]));
const missingKeys = (numbers: Map<string, SettingNumber>) =>
  [...numbers.values()].filter(({ missingBecause }) => missingBecause !== undefined).map(({ key }) => key);
/** Numbers that a pulsed beam has by no input. */
const OF_ANOTHER_MODE = ['averageIrradiance'];

describe('stepNumbers()', () => {
  it('gives the values of the formulary for the same setting', () => {
    // process-numbers 2.1 and 2.2: 30 W, 60 kHz, 200 ns, 60 µm, 1000 mm/s, 30 µm, 2 passes
    const numbers = keyed(setting());
    const expected = {
      workPower: 30,
      pulseEnergy: 0.5,
      rectangularPeakPower: 2.5,
      gaussianPeakPower: 2.3485932,
      averageFluence: 17.683883,
      peakFluence: 35.367765,
      pulsePitch: 16.666667,
      pulseOverlap: 0.72222222,
      pulsesPerSpot: 3.6,
      lineOverlap: 0.5,
      pulsesPerSpotArea: 11.309734,
      lineEnergy: 0.03,
      arealDose: 2,
      areaRate: 30,
    };
    for (const [key, value] of Object.entries(expected)) {
      const found = numbers.get(key)?.value ?? Number.NaN;
      expect([key, Math.abs(found - value) / value < 1e-7]).toEqual([key, true]);
    }
  });

  it('gives every number of a pulsed beam when nothing is missing', () => {
    expect(missingKeys(keyed(setting()))).toEqual(OF_ANOTHER_MODE);
  });

  const NEEDS_SPOT = [
    ...['averageFluence', 'peakFluence', 'peakIrradiance', 'pulseOverlap', 'pulsesPerSpot', 'interactionTime'],
    ...['lineOverlap', 'scansPerSpot', 'coverageRipple', 'pulsesPerSpotArea'],
  ];

  it('gives no number that rests on the spot where the beam diameter is missing, but the reason', () => {
    const { beamDiameterMm: _, ...beamless } = physical;
    const numbers = keyed(setting(), { ...ground, optics: { physical: beamless, focalLengthMm: 163, measuredSpotUm: null } });
    const missing = missingKeys(numbers).filter((key) => !OF_ANOTHER_MODE.includes(key));
    expect(missing.toSorted()).toEqual(['focalSpot', 'rayleighLength', 'spotAtWork', ...NEEDS_SPOT].toSorted());
    for (const key of missing) expect(numbers.get(key)?.missingBecause).toBe('the machine’s page gives no beam diameter at the lens');
  });

  it('gives no number that rests on the power where no calibration fits, but the reason', () => {
    const reason = 'No calibration fits.';
    const numbers = keyed(setting({}, { power: { watts: null, reason } }));
    const missing = missingKeys(numbers).filter((key) => !OF_ANOTHER_MODE.includes(key));
    const ofPower = [
      'workPower',
      'pulseEnergy',
      'rectangularPeakPower',
      'gaussianPeakPower',
      'peakIrradiance',
      'averageFluence',
      'peakFluence',
    ];
    expect(missing.toSorted()).toEqual([...ofPower, 'lineEnergy', 'arealDose'].toSorted());
    for (const key of missing) expect(numbers.get(key)?.missingBecause).toBe(reason);
  });

  it('gives no peak power where the pulse width is missing, but the reason', () => {
    const numbers = keyed(without('pulseWidthNs'));
    const missing = missingKeys(numbers).filter((key) => !OF_ANOTHER_MODE.includes(key));
    expect(missing).toEqual(['rectangularPeakPower', 'gaussianPeakPower', 'peakIrradiance']);
    for (const key of missing) expect(numbers.get(key)?.missingBecause).toBe('the pulse width is not given');
  });

  it('takes the reason that is given for a value that nobody knows, before any value', () => {
    const keys: (ParameterKey | 'fill')[] = [
      'powerPercent',
      'speedMmPerS',
      'frequencyKhz',
      'pulseWidthNs',
      'lineSpacingUm',
      'passes',
      'focusOffsetMm',
      'fill',
    ];
    for (const key of keys) {
      const numbers = [...keyed(setting({}, { unknownBecause: { [key]: 'it was not written down' } })).values()];
      const reasons = numbers.filter(({ missingBecause }) => missingBecause === 'it was not written down');
      expect([key, reasons.length > 0]).toEqual([key, true]);
      expect([key, reasons.every(({ value }) => value === undefined)]).toEqual([key, true]);
    }
  });

  it('knows no dose of a plate whose fill nobody recorded', () => {
    const numbers = keyed(setting({}, { unknownBecause: { fill: 'the fill was not recorded' } }));
    expect(numbers.get('arealDose')?.missingBecause).toBe('the fill was not recorded');
    expect(numbers.get('pulsePitch')?.value).toBeDefined();
  });

  it('reads no frequency as a continuous beam: irradiance, and no number of a pulse', () => {
    const numbers = keyed(without('frequencyKhz'));
    expect(numbers.get('averageIrradiance')?.value).toBeCloseTo((4 * 30) / (Math.PI * 0.06 ** 2), 6);
    expect(numbers.get('pulseEnergy')).toMatchObject({ isRuledOutByMode: true });
  });

  it('says that a speed of zero gives no number instead of dividing by it', () => {
    expect(keyed(setting({ speedMmPerS: 0 })).get('lineEnergy')?.missingBecause).toBe('the scan speed is zero');
  });

  it('marks watts that no calibration stands behind', () => {
    expect(keyed(setting()).get('workPower')?.lookAt).toEqual([]);
    const uncalibrated = keyed(setting({}, { power: { watts: 30, basis: 'not calibrated' } }));
    expect(uncalibrated.get('workPower')?.lookAt).toEqual([expect.stringContaining('Not calibrated')]);
  });

  it('says which spots and lines do not touch', () => {
    const numbers = keyed(setting({ speedMmPerS: 6000, lineSpacingUm: 90 }));
    expect(numbers.get('pulseOverlap')).toMatchObject({ lookAt: [expect.stringContaining('spots do not touch')] });
    expect(numbers.get('lineOverlap')).toMatchObject({ lookAt: [expect.stringContaining('lines do not touch')] });
  });

  it('says when the pulse energy is above the source’s at exactly this pulse width, and nothing where that limit is not known', () => {
    expect(keyed(setting()).get('pulseEnergy')?.lookAt).toEqual([expect.stringContaining('0.45 mJ')]);
    expect(keyed(setting({ frequencyKhz: 70 })).get('pulseEnergy')?.lookAt).toEqual([]);
    expect(keyed(setting({ pulseWidthNs: 100 })).get('pulseEnergy')?.lookAt).toEqual([]);
  });

  it('says when the dose is at the caution or above it, and where the caution comes from', () => {
    const doseCaution = { doseJPerMm2: 2, source: 'C-0098 A1 came out overburnt' };
    expect(keyed(setting(), { ...ground, doseCaution }).get('arealDose')?.lookAt).toEqual([
      'At or above 2 J/mm²: C-0098 A1 came out overburnt.',
    ]);
    expect(keyed(setting({ passes: 1 }), { ...ground, doseCaution }).get('arealDose')?.lookAt).toEqual([]);
  });

  it('names the values that the panel cannot show with the nearest that it can, and those outside of the machine’s ranges', () => {
    const panel = { fields: [{ parameter: 'lineSpacingUm' as const, label: 'Line spacing', unit: 'mm' as const, step: 0.01 }] };
    const { remarks } = stepNumbers(setting({ lineSpacingUm: 12, speedMmPerS: 9000 }), { ...ground, panel });
    expect(remarks).toEqual([
      { parameter: 'speedMmPerS', text: 'Scan speed 9000 mm/s lies outside of what the scan head can do, at most 8000 mm/s.' },
      { parameter: 'lineSpacingUm', text: 'This panel cannot show line spacing 0.012 mm. Nearest that it can: 0.01 mm or 0.02 mm.' },
    ]);
  });
});

describe('settingNumbers()', () => {
  const totals = (...steps: NumberedSetting[]) => new Map(settingNumbers(steps, ground).totals.map((number) => [number.key, number]));

  it('adds dose and time over the filled steps, a crossed pass counting two scans', () => {
    // 2 J/mm² over two passes, 2 J/mm² over one crossed pass
    const sum = totals(setting(), setting({ passes: 1 }, { fill: 'crossed' }));
    expect(sum.get('totalArealDose')).toMatchObject({ value: 4, inputs: { step1DoseJPerMm2: 2, step2DoseJPerMm2: 2 } });
    expect(sum.get('totalTimePer100Mm2')?.value).toBeCloseTo((100 / 30) * 4, 9);
  });

  it('leaves outlines out, and has no total of outlines alone', () => {
    expect(totals(setting(), setting({}, { fill: 'outline' })).get('totalArealDose')?.value).toBe(2);
    const none = totals(setting({}, { fill: 'outline' }), setting({}, { fill: 'outline' })).get('totalArealDose');
    expect(none).toMatchObject({ missingBecause: 'outline only: no step fills an area', isRuledOutByMode: true });
  });

  it('gives no total where one step is not known, but says which and why', () => {
    expect(totals(setting(), setting({}, { power: { watts: null, reason: 'No power is set.' } })).get('totalArealDose')).toMatchObject({
      missingBecause: 'step 2: No power is set.',
    });
  });

  it('holds the total against the caution', () => {
    const doseCaution = { doseJPerMm2: 3, source: 'entered in this plan' };
    const { steps, totals: sums } = settingNumbers([setting(), setting()], { ...ground, doseCaution });
    expect(steps[0]?.numbers.find(({ key }) => key === 'arealDose')?.lookAt).toEqual([]);
    expect(sums[0]).toMatchObject({ value: 4, lookAt: ['At or above 3 J/mm²: entered in this plan.'] });
  });

  it('repeats nothing for a single step', () => {
    expect(settingNumbers([setting()], ground).totals).toEqual([]);
  });
});
